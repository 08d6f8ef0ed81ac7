/** The filled lines of a sheet as they stand: texts, nothing interpreted, no header chosen yet. */
export interface Grid {
  /** Cells of every line that is not blank; a line may hold fewer than the next. */
  readonly rows: readonly (readonly string[])[];
  /** Line of the file or sheet that each row begins on, ascending, the first being 1. */
  readonly lines: readonly number[];
  /** Whether a formula wrote the cell; absent where none did. */
  readonly isFormula?: IsCell;
  /** Whether the cell holds a number as a workbook stores one, not a text; absent where none does. */
  readonly isNumber?: IsCell;
}

/** A question about one cell; `row` and `column` count from 0. */
export type IsCell = (row: number, column: number) => boolean;
