import type { Grid } from './grid';
import { isMissing } from '../../panel-data/numbers/missing-cell';
import { parseNumber } from '../../panel-data/numbers/parse-number';
import { parseYear } from './parse-year';

const rowsLookedAt = 30;
const rowsBelow = 20;
/** Of the cells of the widest row below, so many have a header: at least, and where titles are in doubt. */
const leastShareFilled = 0.6;
const sureShareFilled = 0.9;
const leastShareLabels = 0.7;

/**
 * Row of the grid that holds the column headers: the first that is about as wide as the rows below, consists of labels
 * or of years in columns, and has numbers under it. Titles and notes above a table are narrower.
 *
 * @returns undefined where no row looks like one.
 */
export function findHeaderRow(grid: Grid): number | undefined {
  const last = Math.min(rowsLookedAt, grid.rows.length - 1);
  let likely: number | undefined;
  for (let row = 0; row < last; row += 1) {
    const share = shareFilled(grid, row);
    if (share < leastShareFilled || !hasLabelsAboveNumbers(grid, row)) continue;
    if (share >= sureShareFilled) return row;
    likely ??= row;
  }
  return likely;
}

/** Filled cells of a row for each one of the widest row below; 0 for a single cell. */
function shareFilled(grid: Grid, row: number): number {
  const filled = filledCells(grid.rows[row]).length;
  const widest = Math.max(...rowsUnder(grid, row).map((cells) => filledCells(cells).length));
  return filled < 2 ? 0 : filled / widest;
}

function hasLabelsAboveNumbers(grid: Grid, row: number): boolean {
  const filled = filledCells(grid.rows[row]);
  const years = new Set(
    filled.map(({ text }) => yearIn(text)).filter((year) => year !== undefined),
  );
  const labels = filled.filter(({ text }) =>
    isNumber(text) ? years.size > 1 && yearIn(text) !== undefined : !isMissing(text),
  );
  if (labels.length < leastShareLabels * filled.length) return false;
  return rowsUnder(grid, row).some((cells) =>
    labels.some(({ column }) => isNumber(cells[column] ?? '')),
  );
}

function rowsUnder(grid: Grid, row: number): Grid['rows'] {
  return grid.rows.slice(row + 1, row + 1 + rowsBelow);
}

function filledCells(
  cells: readonly string[],
): { readonly text: string; readonly column: number }[] {
  return cells.map((text, column) => ({ text, column })).filter(({ text }) => text.trim() !== '');
}

export function isNumber(text: string): boolean {
  if (isMissing(text)) return false;
  return parseNumber(text, '.') !== undefined || parseNumber(text, ',') !== undefined;
}

function yearIn(text: string): number | undefined {
  const year = parseYear(text);
  return year !== undefined && year >= 1800 && year <= 2200 ? year : undefined;
}
