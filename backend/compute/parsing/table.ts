/** A text table as it stands in the file: nothing is interpreted yet. */
export interface Table {
  /** Trimmed and made different from each other: a blank header becomes `column 3`, a second `x` becomes `x (2)`. */
  readonly header: readonly string[];
  /** Header texts that stand in the file more than once. */
  readonly repeatedHeaders: readonly string[];
  /** Cells of every row that is not blank, as many as the header has. */
  readonly rows: readonly (readonly string[])[];
  /** Line of the file that each row begins on, the header being line 1. */
  readonly lines: readonly number[];
  readonly delimiter: Delimiter;
}

export type Delimiter = ',' | ';' | '\t';

/** How large a table may be. */
export interface TableLimits {
  readonly rows: number;
  readonly columns: number;
  /** Rows times columns. */
  readonly cells: number;
  /** Longest field, in characters. */
  readonly fieldLength: number;
}

export const tableLimits: TableLimits = {
  rows: 200_000,
  columns: 200,
  cells: 4_000_000,
  fieldLength: 65_536,
};
