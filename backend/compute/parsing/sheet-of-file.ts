import type { Grid } from './grid';

/** One sheet of a workbook, or the only one of a CSV file, which has no name. */
export interface SheetOfFile {
  readonly name: string | null;
  readonly isHidden: boolean;
  readonly grid: Grid;
}
