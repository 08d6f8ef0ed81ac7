import type { IsCell } from './grid';

/** A long text table: nothing is interpreted yet. Of a wide sheet, the long table that it is read as. */
export interface Table {
  /** Trimmed and made different from each other: a blank header becomes `column 3`, a second `x` becomes `x (2)`. */
  readonly header: readonly string[];
  /** Header texts that stand in the file more than once. */
  readonly repeatedHeaders: readonly string[];
  /** Cells of every row that is not blank, as many as the header has. */
  readonly rows: readonly (readonly string[])[];
  /** Line of the file or sheet that each row begins on, the first being 1; rows of a wide sheet share theirs. */
  readonly lines: readonly number[];
  /** Null for a workbook. */
  readonly delimiter: Delimiter | null;
  /**
   * Where a cell stands in the file, if line and header do not say it: of a wide sheet, the line of its company and the
   * header of its year. Together they name one cell of the file; `row` and `column` count from 0.
   */
  readonly placeOf?: (row: number, column: number) => CellPlace;
  /** Whether a formula wrote the cell; absent where none did. */
  readonly isFormula?: IsCell;
  /**
   * Whether the cell holds a number as a workbook stores one; absent where none does. Its text is the number as the
   * language prints it, with a decimal point, however the texts of its column are written.
   */
  readonly isNumber?: IsCell;
}

export interface CellPlace {
  readonly line: number;
  readonly header: string;
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

/** Where a cell of the table stands in the file. */
export function placeOfCell(table: Table, row: number, column: number): CellPlace {
  return table.placeOf?.(row, column) ?? { line: table.lines[row], header: table.header[column] };
}
