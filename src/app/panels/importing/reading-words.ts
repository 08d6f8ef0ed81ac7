import type { ImportReply, TableLayout, TableReading, TextEncoding } from '@contract';
import { counted } from '../../ui/phrases';

/** How a table can stand in a file, in the words of the choice. */
export const layoutWords: Readonly<Record<TableLayout['kind'], string>> = {
  long: 'A row for each company and year',
  'years-in-columns': 'Years in columns',
  'sheet-a-variable': 'Years in columns, a sheet for each variable',
};

/** How the text of a file can be written, in the words of the choice. */
export const encodingWords: Readonly<Record<TextEncoding, string>> = {
  'utf-8': 'UTF-8',
  'windows-1252': 'Windows-1252',
  'utf-16': 'UTF-16',
};

/** `Read from sheet “Figures”, its columns named in line 3, years in columns: 246 rows of a company and year.` */
export function readingWords({ reading, rowCount }: ImportReply): string {
  const { sheet, headerRow, layout, encoding } = reading;
  const place =
    layout.kind === 'sheet-a-variable'
      ? `${counted(layout.sheets.length, 'sheet')}, a variable each,`
      : sheet === null
        ? `the file${encoding === undefined || encoding === 'utf-8' ? '' : `, its text in ${encodingWords[encoding]},`}`
        : `sheet “${sheet}”`;
  const run = layout.kind === 'years-in-columns' ? ', years in columns' : '';
  const rows = counted(rowCount, 'row');
  return `Read from ${place} with the columns named in line ${headerRow}${run}: ${rows} of a company and year.`;
}

export function isSameReading(left: TableReading, right: TableReading): boolean {
  return textOf(left) === textOf(right);
}

function textOf({ sheet, headerRow, layout, decimalSign, encoding }: TableReading): string {
  const { kind } = layout;
  return JSON.stringify([
    sheet,
    headerRow,
    decimalSign,
    encoding,
    kind,
    kind === 'years-in-columns' ? layout.item : null,
    kind === 'sheet-a-variable' ? layout.sheets : null,
  ]);
}
