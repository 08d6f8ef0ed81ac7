/** The filled lines of a sheet as they stand: texts, nothing interpreted, no header chosen yet. */
export interface Grid {
  /** Cells of every line that is not blank; a line may hold fewer than the next. */
  readonly rows: readonly (readonly string[])[];
  /** Line of the file or sheet that each row begins on, ascending, the first being 1. */
  readonly lines: readonly number[];
  /** Whether a formula wrote the cell; absent where none did. `row` and `column` count from 0. */
  readonly isFormula?: (row: number, column: number) => boolean;
}
