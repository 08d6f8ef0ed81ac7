import { stringify } from 'csv-stringify/sync';
import type { RowUsed } from './rows-used';
import { spreadsheetText } from '../../files/spreadsheet-text';

/** Names of the columns as the panel has them. */
export interface RowsHeader {
  readonly company: string;
  readonly year: string;
  readonly outcome: string;
  readonly regressors: readonly string[];
  readonly lag: 0 | 1;
}

/** Rows that are written in one go: some milliseconds of work. */
const rowsInPart = 5000;

/**
 * The rows as CSV (RFC 4180): company, year, outcome, regressors, `file row`, `used`. Numbers in their shortest form
 * that reads back the same.
 *
 * @returns the text in parts, each made when it is asked for; joined, they are the file.
 */
export function* rowsCsv(header: RowsHeader, rows: Iterable<RowUsed>): Generator<string> {
  const ofYearBefore = header.lag === 1 ? ' (year before)' : '';
  const titles = [
    ...[header.company, header.year, header.outcome],
    ...header.regressors.map((name) => name + ofYearBefore),
    'file row',
    'used',
  ];
  yield csv([titles.map(spreadsheetText)]);
  let part: string[][] = [];
  for (const row of rows) {
    part.push(cells(row));
    if (part.length < rowsInPart) continue;
    yield csv(part);
    part = [];
  }
  if (part.length > 0) yield csv(part);
}

function cells(row: RowUsed): string[] {
  return [
    spreadsheetText(row.company),
    String(row.year),
    String(row.outcome),
    ...row.regressors.map(String),
    String(row.fileRow),
    row.isUsed ? 'yes' : 'no',
  ];
}

function csv(lines: readonly (readonly string[])[]): string {
  // The package quotes the line end of its own records alone.
  return stringify([...lines], { record_delimiter: '\r\n', quoted_match: /[\r\n]/u });
}
