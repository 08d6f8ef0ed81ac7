import type { Grid } from './grid';
import { isMissing } from './missing-cell';
import { parseNumber } from './parse-number';
import { parseYear } from './parse-year';

const rowsLookedAt = 30;
const rowsBelow = 20;
/** Of the cells of the widest row below, so many have a header. */
const leastShareFilled = 0.6;
const leastShareLabels = 0.7;

/**
 * Row of the grid that holds the column headers: the first that is about as wide as the rows below, consists of labels
 * or of years in columns, and has numbers under it. Titles and notes above a table are narrower.
 *
 * @returns undefined where no row looks like one.
 */
export function findHeaderRow(grid: Grid): number | undefined {
  const last = Math.min(rowsLookedAt, grid.rows.length - 1);
  for (let row = 0; row < last; row += 1) if (isHeader(grid, row)) return row;
  return undefined;
}

function isHeader(grid: Grid, row: number): boolean {
  const filled = filledCells(grid.rows[row]);
  const below = grid.rows.slice(row + 1, row + 1 + rowsBelow);
  const widest = Math.max(...below.map((cells) => filledCells(cells).length));
  if (filled.length < Math.max(2, leastShareFilled * widest)) return false;
  const years = new Set(
    filled.map(({ text }) => yearIn(text)).filter((year) => year !== undefined),
  );
  const labels = filled.filter(
    ({ text }) => !isNumber(text) || (years.size > 1 && yearIn(text) !== undefined),
  );
  if (labels.length < leastShareLabels * filled.length) return false;
  const columns = labels.map(({ column }) => column);
  return below.some((cells) => columns.some((column) => isNumber(cells[column] ?? '')));
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
