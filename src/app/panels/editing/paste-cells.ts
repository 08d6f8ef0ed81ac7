import { leadingColumns } from '../grid-places';
import { type PanelRow, columnTitle } from '../panel-rows';
import type { ShownProblem } from '../../ui/problem';
import { counted } from '../../ui/phrases';
import { readBlockText } from '../../ui/block-text';
import { readFigures } from '../../ui/read-figures';
import { shifted } from '../../ui/shifted';
import type { CellRange } from './cell-block';
import type { ShownGrid } from './copy-cells';
import type { CellChange } from './panel-edits';
import { misfitOf } from './misfit';
import { shiftOf } from './shown-figure';

export type PasteOutcome =
  | {
      readonly kind: 'fits';
      readonly changes: readonly CellChange[];
      /** Where the cells land. */
      readonly range: CellRange;
    }
  | { readonly kind: 'refused'; readonly problem: ShownProblem };

const mostPlaces = 8;

/**
 * What a text from a spreadsheet would change: a single cell fills the range, a block lands with its first cell at the
 * range's. All of it or nothing: what does not fit, or is no number, refuses the whole.
 */
export function pastedCells(text: string, range: CellRange, grid: ShownGrid): PasteOutcome {
  const block = readBlockText(text);
  const isOne = block.length === 1 && block[0].length === 1;
  const width = block.reduce((most, cells) => Math.max(most, cells.length), 0);
  const target = isOne
    ? range
    : {
        firstRow: range.firstRow,
        lastRow: range.firstRow + block.length - 1,
        firstColumn: range.firstColumn,
        lastColumn: range.firstColumn + width - 1,
      };
  const misfits = misfitsOf(target, grid);
  if (misfits.length > 0) return refused('Nothing is pasted: the block does not fit', misfits);
  const figures = readFigures(block);
  const changes: CellChange[] = [];
  const faults: string[] = [];
  for (let at = target.firstRow; at <= target.lastRow; at++) {
    const row = grid.rowAt(at);
    if (row === undefined) continue;
    for (let position = target.firstColumn; position <= target.lastColumn; position++) {
      const [line, cell] = isOne ? [0, 0] : [at - target.firstRow, position - target.firstColumn];
      const column = position - leadingColumns;
      // A line of the block that is shorter than the others says nothing about its last cells.
      if (cell >= block[line].length) continue;
      const figure = figures[line][cell];
      const text = block[line][cell];
      const misfit = misfitOf(text, grid.columns[column]);
      if (figure === undefined || misfit !== undefined)
        faults.push(faultWords(text, misfit, placeWords(row, column, grid)));
      else
        changes.push({
          place: { company: row.company, year: row.year, column },
          value: panelValue(figure, row, column, grid),
        });
    }
  }
  if (faults.length === 0) return { kind: 'fits', changes, range: target };
  const title = `Nothing is pasted: ${counted(faults.length, 'cell')} of the block ${
    faults.length === 1 ? 'is no number' : 'are no numbers'
  } of ${faults.length === 1 ? 'its column' : 'their columns'}`;
  return refused(title, faults);
}

/**
 * A figure in the unit that is shown, in the panel's. Where the cell shows this very figure already it keeps its value
 * to the last bit.
 */
function panelValue(
  figure: number | null,
  row: PanelRow,
  column: number,
  grid: ShownGrid,
): number | null {
  if (figure === null) return null;
  const shift = shiftOf(grid.columns[column], grid.factor);
  const before = row.values[column];
  return before !== null && shifted(before, shift) === figure ? before : shifted(figure, -shift);
}

/** The change that a text typed into a cell makes, or why it makes none. */
export function typedFigure(
  text: string,
  row: PanelRow,
  column: number,
  grid: ShownGrid,
): CellChange | { readonly problem: ShownProblem } {
  const [[figure]] = readFigures([[text]]);
  const misfit = misfitOf(text, grid.columns[column]);
  if (figure === undefined || misfit !== undefined)
    return {
      problem: {
        title: `Not taken: ${misfit ?? 'a cell holds a number, or nothing'}`,
        places: [faultWords(text, undefined, placeWords(row, column, grid))],
      },
    };
  const place = { company: row.company, year: row.year, column };
  return { place, value: panelValue(figure, row, column, grid) };
}

/** `Kesdrin 2021, Capex: found “about 4”`, and why that is not taken where it is a number. */
function faultWords(text: string, misfit: string | undefined, place: string): string {
  return `${place}: found “${text.trim()}”${misfit === undefined ? '' : `, ${misfit}`}`;
}

/** `Kesdrin 2021, Capex`. */
function placeWords(row: PanelRow, column: number, grid: ShownGrid): string {
  return `${row.company} ${row.year}, ${columnTitle(grid.columns[column])}`;
}

function misfitsOf(target: CellRange, grid: ShownGrid): readonly string[] {
  const misfits: string[] = [];
  if (target.firstColumn < leadingColumns)
    misfits.push('It would land in company or year; rows are added and removed, not pasted over.');
  const beyond = target.lastRow + 1 - grid.rowCount;
  if (beyond > 0) misfits.push(`${counted(beyond, 'row')} would be below the last row.`);
  const past = target.lastColumn + 1 - leadingColumns - grid.columns.length;
  if (past > 0) {
    const last = grid.columns.at(-1);
    const words = last === undefined ? 'the last column' : columnTitle(last);
    misfits.push(`${counted(past, 'column')} would be to the right of ${words}, the last figure.`);
  }
  return misfits;
}

function refused(title: string, places: readonly string[]): PasteOutcome {
  const more = places.length - mostPlaces;
  return {
    kind: 'refused',
    problem: {
      title,
      places: more > 0 ? [...places.slice(0, mostPlaces), `and ${more} more`] : places,
    },
  };
}
