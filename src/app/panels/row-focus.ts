import type { PanelRow } from './panel-rows';

/** Which row is asked for, and where in it: company and year tell rows apart, which lines of a file need not. */
export interface RowFocus {
  readonly company: string;
  readonly year: number;
  /** Position among the panel's columns; the row as a whole without it. */
  readonly column?: number;
}

/** A row as an address names it: by company and fiscal year, or by the line of the imported file. */
export interface RowAddress {
  readonly company: string | undefined;
  readonly year: number | null;
  readonly line: number | null;
}

export function isAsked(row: PanelRow, focus: RowFocus | null): boolean {
  return focus !== null && row.company === focus.company && row.year === focus.year;
}

/** The row that an address names; the first of its line where several came from one. */
export function rowAt(
  rows: readonly PanelRow[],
  { company = '', year, line }: RowAddress,
): PanelRow | undefined {
  return company !== '' && year !== null
    ? rows.find((row) => isAsked(row, { company, year }))
    : rows.find(({ fileRow }) => fileRow === line);
}

/** What an address names, behind `no row`: `for Kesdrin FY2016`, `from line 77 of its file`; empty for nothing. */
export function addressWords({ company = '', year, line }: RowAddress): string {
  if (company !== '' && year !== null) return `for ${company} FY${year}`;
  return line === null ? '' : `from line ${line} of its file`;
}
