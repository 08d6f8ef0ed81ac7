import { figureAt } from '../grid-places';
import type { PanelRow } from '../panel-rows';
import { type CellBlock, type CellRange, rangeOf } from './cell-block';
import type { ShownGrid } from './copy-cells';
import type { CellChange } from './panel-edits';

/** The cells that are selected. */
export interface GridSelection {
  readonly rows: number;
  readonly columns: number;
  /** The row of the cell that has the focus. */
  readonly company: string;
  readonly year: number;
  /** Its position among the panel's columns; undefined at company, year and line. */
  readonly column: number | undefined;
}

/** Figures that a person gave the cells. */
export interface GivenCells {
  readonly changes: readonly CellChange[];
  /** What was done, as `pasted`. */
  readonly done: 'typed' | 'pasted' | 'emptied' | 'cut';
}

export function selectionOf(block: CellBlock | null, grid: ShownGrid): GridSelection | null {
  const row = block === null ? undefined : grid.rowAt(block.head.row);
  if (block === null || row === undefined) return null;
  const { firstRow, lastRow, firstColumn, lastColumn } = rangeOf(block);
  return {
    rows: lastRow - firstRow + 1,
    columns: lastColumn - firstColumn + 1,
    company: row.company,
    year: row.year,
    column: figureAt(block.head.column, grid.columns),
  };
}

/** `1 cell`, `50 × 20 cells`. */
export function sizeWords(range: CellRange): string {
  return cellsWords(range.lastRow - range.firstRow + 1, range.lastColumn - range.firstColumn + 1);
}

/** `50 × 20 cells selected`; empty for one cell. */
export function sizeOf({ rows, columns }: GridSelection): string {
  return rows * columns === 1 ? '' : `${cellsWords(rows, columns)} selected`;
}

function cellsWords(rows: number, columns: number): string {
  return rows * columns === 1 ? '1 cell' : `${rows.toLocaleString('en')} × ${columns} cells`;
}

/** The rows that a range touches. */
export function rowsIn({ firstRow, lastRow }: CellRange, grid: ShownGrid): readonly PanelRow[] {
  const rows = Array.from({ length: lastRow - firstRow + 1 }, (_, at) => grid.rowAt(firstRow + at));
  return rows.filter((row) => row !== undefined);
}

/** Every figure of the range made missing. */
export function emptiedCells(range: CellRange, grid: ShownGrid): readonly CellChange[] {
  const changes: CellChange[] = [];
  for (const { company, year } of rowsIn(range, grid))
    for (let position = range.firstColumn; position <= range.lastColumn; position++) {
      const column = figureAt(position, grid.columns);
      if (column !== undefined) changes.push({ place: { company, year, column }, value: null });
    }
  return changes;
}
