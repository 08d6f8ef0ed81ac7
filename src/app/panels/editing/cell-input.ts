import type { CellEditRequestEvent } from 'ag-grid-community';
import type { ShownProblem } from '../../ui/problem';
import { figureAt, leadingColumns } from '../grid-places';
import type { PanelRow } from '../panel-rows';
import { blockCommand } from './block-keys';
import { type CellBlock, rangeOf } from './cell-block';
import { type ShownGrid, copiedText } from './copy-cells';
import type { GridBlock } from './grid-block';
import { type GivenCells, emptiedCells, sizeWords } from './grid-selection';
import { pastedCells, typedFigure } from './paste-cells';

export interface CellInputGround {
  readonly block: () => GridBlock | null;
  readonly columnIds: () => readonly string[];
  readonly shown: () => ShownGrid;
  readonly mayChange: () => boolean;
  /** `EUR m`. */
  readonly moneyUnit: () => string;
  readonly given: (cells: GivenCells) => void;
  /** Something that was typed or pasted is not taken. */
  readonly refused: (problem: ShownProblem) => void;
  readonly copied: (words: string) => void;
}

/** What keys, the clipboard and a cell's field ask of the selected cells. */
export class CellInput {
  constructor(private readonly ground: CellInputGround) {}

  take({ data, column, newValue }: CellEditRequestEvent<PanelRow, unknown>): void {
    const { columnIds, shown, given, refused } = this.ground;
    const figure = figureAt(columnIds().indexOf(column.getColId()), shown().columns);
    if (figure === undefined || typeof newValue !== 'string') return;
    const outcome = typedFigure(newValue, data, figure, shown());
    if ('problem' in outcome) refused(outcome.problem);
    else given({ changes: [outcome], done: outcome.value === null ? 'emptied' : 'typed' });
  }

  copy(event: ClipboardEvent): void {
    const { shown, copied, moneyUnit } = this.ground;
    const block = this.#blockAt(event);
    if (block === null || event.clipboardData === null) return;
    const range = rangeOf(block);
    event.clipboardData.setData('text/plain', copiedText(range, shown()));
    event.preventDefault();
    copied(`${sizeWords(range)} copied at full precision, money in ${moneyUnit()}`);
  }

  cut(event: ClipboardEvent): void {
    this.copy(event);
    if (event.defaultPrevented) this.#empty('cut');
  }

  paste(event: ClipboardEvent): void {
    const { shown, mayChange, given, refused, block: blockOf } = this.ground;
    const block = this.#blockAt(event);
    const text = event.clipboardData?.getData('text/plain') ?? '';
    if (block === null || text === '' || !mayChange()) return;
    event.preventDefault();
    const outcome = pastedCells(text, rangeOf(block), shown());
    if (outcome.kind === 'refused') {
      refused(outcome.problem);
      return;
    }
    given({ changes: outcome.changes, done: 'pasted' });
    blockOf()?.select(outcome.range);
  }

  readKey(event: KeyboardEvent): void {
    const command = isAtCell(event) ? blockCommand(event) : undefined;
    const block = this.ground.block();
    if (command === undefined || block === null) return;
    if (command.kind === 'collapse' && block.drawnRange === null) return;
    event.preventDefault();
    event.stopPropagation();
    block.followFocus();
    if (command.kind === 'draw') block.draw(command.direction, command.far);
    else if (command.kind === 'collapse') block.collapse();
    else if (command.kind === 'empty') this.#empty('emptied');
    else this.#selectFigures(block);
  }

  #selectFigures(block: GridBlock): void {
    const figures = this.ground.shown().columns.length;
    const { rows } = block.extent;
    if (figures === 0 || rows === 0) return;
    block.select({
      ...{ firstRow: 0, lastRow: rows - 1 },
      ...{ firstColumn: leadingColumns, lastColumn: leadingColumns + figures - 1 },
    });
  }

  #empty(done: 'emptied' | 'cut'): void {
    const { block: blockOf, shown, mayChange, given } = this.ground;
    const block = blockOf()?.block() ?? null;
    if (block === null || !mayChange()) return;
    given({ changes: emptiedCells(rangeOf(block), shown()), done });
  }

  #blockAt(event: Event): CellBlock | null {
    const block = this.ground.block();
    if (block === null || !isAtCell(event)) return null;
    // The grid tells of its focus a moment late: a quick hand is ahead of it.
    block.followFocus();
    return block.block();
  }
}

/** Not in the field of a cell that is being edited, nor in the header. */
function isAtCell({ target }: Event): boolean {
  return target instanceof Element && target.matches('.ag-cell');
}
