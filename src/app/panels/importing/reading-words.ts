import type { ImportReply, TableLayout, TableReading } from '@contract';
import { counted } from '../../ui/phrases';

/** How a table can stand in a file, in the words of the choice. */
export const layoutWords: Readonly<Record<TableLayout['kind'], string>> = {
  long: 'A row for each company and year',
  'years-in-columns': 'Years in columns',
  'sheet-a-variable': 'Years in columns, a sheet for each variable',
};

/** `Read from sheet “Figures”, its columns named in line 3, years in columns: 246 rows of a company and year.` */
export function readingWords({ reading, rowCount }: ImportReply): string {
  const { sheet, headerRow, layout } = reading;
  const place =
    layout.kind === 'sheet-a-variable'
      ? `${counted(layout.sheets.length, 'sheet')}, a variable each,`
      : sheet === null
        ? 'the file'
        : `sheet “${sheet}”`;
  const run = layout.kind === 'years-in-columns' ? ', years in columns' : '';
  const rows = counted(rowCount, 'row');
  return `Read from ${place} with the columns named in line ${headerRow}${run}: ${rows} of a company and year.`;
}

export function isSameReading(left: TableReading, right: TableReading): boolean {
  return textOf(left) === textOf(right);
}

function textOf({ sheet, headerRow, layout, decimalSign }: TableReading): string {
  const { kind } = layout;
  return JSON.stringify([
    sheet,
    headerRow,
    decimalSign,
    kind,
    kind === 'years-in-columns' ? layout.item : null,
    kind === 'sheet-a-variable' ? layout.sheets : null,
  ]);
}
