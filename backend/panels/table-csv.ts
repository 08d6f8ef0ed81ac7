import { stringify } from 'csv-stringify/sync';
import { spreadsheetText } from '../files/spreadsheet-text';
import type { PanelTable, TableCell } from './panel-table';

export type DecimalSign = '.' | ',';

const byteOrderMark = '\uFEFF';

/**
 * A table as CSV (RFC 4180, UTF-8 with byte order mark): numbers in their shortest form that reads back the same, texts
 * that no spreadsheet computes. With a comma as the decimal sign, a semicolon separates the columns.
 *
 * @returns parts, each made when it is asked for.
 */
export async function* tableCsv(
  { headers, parts }: PanelTable,
  decimalSign: DecimalSign = '.',
): AsyncGenerator<Buffer> {
  const write = (lines: readonly (readonly string[])[]): Buffer =>
    // The package quotes the line end of its own records alone.
    Buffer.from(
      stringify([...lines], {
        record_delimiter: '\r\n',
        delimiter: decimalSign === ',' ? ';' : ',',
        quoted_match: /[\r\n]/u,
      }),
    );
  yield Buffer.concat([Buffer.from(byteOrderMark), write([headers.map(spreadsheetText)])]);
  for await (const rows of parts)
    yield write(rows.map((row) => row.map((cell) => textOf(cell, decimalSign))));
}

function textOf(cell: TableCell, decimalSign: DecimalSign): string {
  if (cell === null) return '';
  return typeof cell === 'number' ? String(cell).replace('.', decimalSign) : spreadsheetText(cell);
}
