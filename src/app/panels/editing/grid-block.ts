import { signal } from '@angular/core';
import type { CellPosition, GridApi } from 'ag-grid-community';
import type { PanelRow } from '../panel-rows';
import {
  type CellBlock,
  type CellRange,
  type Direction,
  type GridExtent,
  type GridPlace,
  changedCells,
  drawn,
  isOneCell,
  oneCell,
  rangeOf,
} from './cell-block';

/** The block of cells selected in a grid. The grid's focus is always its head, from which it is drawn further. */
export class GridBlock {
  readonly #block = signal<CellBlock | null>(null);
  /** What the cells' classes are made by; null where no more than one cell is selected. */
  #drawnRange: CellRange | null = null;

  readonly block = this.#block.asReadonly();

  constructor(
    private readonly api: GridApi<PanelRow>,
    private readonly columnIds: () => readonly string[],
  ) {}

  get drawnRange(): CellRange | null {
    return this.#drawnRange;
  }

  get extent(): GridExtent {
    return { rows: this.api.getDisplayedRowCount(), columns: this.columnIds().length };
  }

  /** Takes over where the grid's focus went by itself: a block of one cell. */
  followFocus(): void {
    const focused = this.#focused();
    const head = this.#block()?.head;
    if (focused === null) this.#set(null);
    else if (head?.row !== focused.row || head.column !== focused.column)
      this.#set(oneCell(focused));
  }

  /** One cell that the grid is about to focus. */
  begin(place: GridPlace): void {
    this.#set(oneCell(place));
  }

  /** One cell, which gets the focus. */
  goTo(place: GridPlace): void {
    this.#set(oneCell(place));
    this.#focusHead();
  }

  /** From where the block was begun to this cell. */
  drawTo(head: GridPlace): void {
    const block = this.#block();
    this.#set(block === null ? oneCell(head) : { anchor: block.anchor, head });
    this.#focusHead();
  }

  draw(direction: Direction, far: 'one' | 'all'): void {
    this.followFocus();
    const block = this.#block();
    if (block === null) return;
    this.#set(drawn(block, direction, far, this.extent));
    this.#focusHead();
  }

  /** From the first row to the last one; the focus stays in view where it is. */
  select({ firstRow, lastRow, firstColumn, lastColumn }: CellRange): void {
    this.#set({
      anchor: { row: lastRow, column: lastColumn },
      head: { row: firstRow, column: firstColumn },
    });
    this.#focusHead();
  }

  /** Back to the cell that has the focus. */
  collapse(): void {
    const focused = this.#focused();
    this.#set(focused === null ? null : oneCell(focused));
  }

  #set(block: CellBlock | null): void {
    const before = this.#drawnRange;
    this.#block.set(block);
    this.#drawnRange = block === null || isOneCell(block) ? null : rangeOf(block);
    const changed = changedCells(before, this.#drawnRange);
    const columns = this.columnIds().filter((_, column) => changed.columns(column));
    const rowNodes = this.api
      .getRenderedNodes()
      .filter(({ rowIndex }) => rowIndex !== null && changed.rows(rowIndex));
    if (columns.length > 0 && rowNodes.length > 0)
      this.api.refreshCells({ rowNodes, columns, force: true, suppressFlash: true });
  }

  #focused(): GridPlace | null {
    // The grid says undefined, too, where nothing has the focus, whatever its types say.
    const cell = this.api.getFocusedCell() as CellPosition | null | undefined;
    if (cell == null) return null;
    const column = this.columnIds().indexOf(cell.column.getColId());
    return column === -1 ? null : { row: cell.rowIndex, column };
  }

  #focusHead(): void {
    const head = this.#block()?.head;
    if (head === undefined) return;
    const id = this.columnIds()[head.column];
    this.api.ensureIndexVisible(head.row);
    this.api.ensureColumnVisible(id);
    this.api.setFocusedCell(head.row, id);
  }
}
