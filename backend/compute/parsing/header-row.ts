import type { Grid } from './grid';

/** Row of the grid that holds the column headers: the first. */
export function findHeaderRow(grid: Grid): number {
  return Math.min(0, grid.rows.length);
}
