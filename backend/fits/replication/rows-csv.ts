import { stringify } from 'csv-stringify/sync';
import type { RowUsed } from './rows-used';
import { spreadsheetText } from './spreadsheet-text';

/** Names of the columns as the panel has them. */
export interface RowsHeader {
  readonly company: string;
  readonly year: string;
  readonly outcome: string;
  readonly regressors: readonly string[];
  readonly lag: 0 | 1;
}

/**
 * The rows as CSV (RFC 4180): company, year, outcome, regressors, `file row`, `used`. Numbers in their shortest form
 * that reads back the same.
 */
export function rowsCsv(header: RowsHeader, rows: readonly RowUsed[]): string {
  const ofYearBefore = header.lag === 1 ? ' (year before)' : '';
  const titles = [
    ...[header.company, header.year, header.outcome],
    ...header.regressors.map((name) => name + ofYearBefore),
    'file row',
    'used',
  ].map(spreadsheetText);
  const lines = rows.map((row) => [
    spreadsheetText(row.company),
    String(row.year),
    String(row.outcome),
    ...row.regressors.map(String),
    String(row.fileRow),
    row.isUsed ? 'yes' : 'no',
  ]);
  // The package quotes the line end of its own records alone.
  return stringify([titles, ...lines], { record_delimiter: '\r\n', quoted_match: /[\r\n]/u });
}
