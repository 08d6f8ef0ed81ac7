import { FileRefusal } from '../file-refusal';
import type { Table } from '../table';
import { LongTableBuilder } from './long-table-builder';
import type { PlainColumn } from './wide-header';
import { companyOf, type WideSheet } from './wide-sheet';

/**
 * The long table of a sheet whose year columns name their variables.
 *
 * @param unnamed  name of the variable of headers that are a year alone.
 */
export function yearsInColumns(sheet: WideSheet, unnamed: string): Omit<Table, 'delimiter'> {
  const describing = describingColumns(sheet);
  const builder = new LongTableBuilder(companyHeader(sheet), headersOf(describing));
  const columns = builder.columnsByVariable(sheet, unnamed);
  const places = describing.map(({ column }) => column);
  for (let row = sheet.headerIndex + 1; row < sheet.grid.rows.length; row += 1)
    builder.addRow({ sheet, row }, places, columns);
  return builder.finish();
}

/**
 * The long table of a sheet in which each row is one variable of one company. Below a company's name the next rows may
 * leave it out, as merged cells do.
 *
 * @param item  header of the column that names the variable.
 * @throws {FileRefusal} 'reading_invalid' where there is no such column.
 */
export function variablesInRows(sheet: WideSheet, item: string): Omit<Table, 'delimiter'> {
  const itemColumn = sheet.header.plain.find(({ header }) => header === item)?.column;
  if (itemColumn === undefined)
    throw new FileRefusal(
      'reading_invalid',
      `expected a column “${item}” that names the variables; the sheet has ${headersOf(sheet.header.plain).join(', ')}`,
    );
  const describing = describingColumns(sheet).filter(({ column }) => column !== itemColumn);
  const builder = new LongTableBuilder(companyHeader(sheet), headersOf(describing));
  const columns = builder.columnsByYear(sheet);
  const places = describing.map(({ column }) => column);
  let company = '';
  for (let row = sheet.headerIndex + 1; row < sheet.grid.rows.length; row += 1) {
    company = companyOf(sheet, row) || company;
    const variable = (sheet.grid.rows[row][itemColumn] ?? '').trim();
    if (variable === '') continue;
    builder.addVariable({ sheet, row }, { company, variable }, places, columns);
  }
  return builder.finish();
}

/** The long table of several sheets, each with the years of one variable in columns. */
export function sheetAVariable(
  sheets: readonly (WideSheet & { readonly variable: string })[],
): Omit<Table, 'delimiter'> {
  const [first] = sheets;
  const described = headersOf(describingColumns(first));
  const builder = new LongTableBuilder(companyHeader(first), described);
  for (const sheet of sheets) {
    const columns = builder.columnsByYear(sheet);
    const describing = describingColumns(sheet);
    const places = described.map(
      (name) => describing.find(({ header }) => header === name)?.column,
    );
    for (let row = sheet.headerIndex + 1; row < sheet.grid.rows.length; row += 1) {
      const company = companyOf(sheet, row);
      if (company === '') continue;
      builder.addVariable({ sheet, row }, { company, variable: sheet.variable }, places, columns);
    }
  }
  return builder.finish();
}

function describingColumns({ header, companyColumn }: WideSheet): readonly PlainColumn[] {
  return header.plain.filter(({ column }) => column !== companyColumn);
}

function companyHeader({ header, companyColumn }: WideSheet): string {
  return header.plain.find(({ column }) => column === companyColumn)?.header ?? 'Company';
}

function headersOf(columns: readonly PlainColumn[]): readonly string[] {
  return columns.map(({ header }) => header);
}
