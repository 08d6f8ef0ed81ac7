import type { TableLayout } from '../../file-recipe';
import { findHeaderRow } from '../header-row';
import { isMissing } from '../../../panel-data/numbers/missing-cell';
import { parseYear } from '../parse-year';
import type { SheetOfFile } from '../sheet-of-file';
import type { PlainColumn } from './wide-header';
import { companyOf, type WideSheet, wideSheet } from './wide-sheet';

/** Recognises which way the years of a sheet run. */
export function recogniseLayout(
  sheets: readonly SheetOfFile[],
  chosen: SheetOfFile,
  headerIndex: number,
): TableLayout {
  const wide = wideSheet(chosen.grid, headerIndex);
  if (wide === undefined || !hasYearsInColumns(wide)) return { kind: 'long' };
  if (wide.header.years.some(({ label }) => label.variable !== ''))
    return { kind: 'years-in-columns', item: null };
  const item = itemColumn(wide);
  if (item !== undefined) return { kind: 'years-in-columns', item: item.header };
  const alike = sheets.filter((sheet) => sheet === chosen || isAnotherVariable(sheet, wide));
  if (alike.length < 2) return { kind: 'years-in-columns', item: null };
  return { kind: 'sheet-a-variable', sheets: alike.map(({ name }) => name ?? '') };
}

/** Two years at least, and no column that holds the year of each row. */
function hasYearsInColumns({ grid, headerIndex, header }: WideSheet): boolean {
  const years = new Set(header.years.map(({ label }) => label.year));
  if (years.size < 2) return false;
  return !header.plain.some(({ column }) => {
    const cells = cellsOf(grid.rows.slice(headerIndex + 1), column);
    const inRange = cells.filter((cell) => isYear(cell));
    return cells.length > 0 && inRange.length >= 0.8 * cells.length;
  });
}

const itemWords =
  /^(items?|line items?|variables?|measures?|metrics?|indicators?|figures?|concepts?|accounts?|positions?|kennzahl(en)?|größe|groesse|posten|variablen?)$/iu;
const mostItems = 50;

/**
 * The column that names the variable of each row: companies come in several rows, and no company has one of its texts
 * twice.
 */
function itemColumn(sheet: WideSheet): PlainColumn | undefined {
  const { grid, headerIndex, header, companyColumn } = sheet;
  const rows = grid.rows.slice(headerIndex + 1);
  let last = '';
  const companies = rows.map((_, row) => (last = companyOf(sheet, headerIndex + 1 + row) || last));
  if (new Set(companies).size === companies.length) return undefined;
  const suited = header.plain.filter(({ column }) => {
    if (column === companyColumn) return false;
    const items = rows.map((cells) => (cells[column] ?? '').trim());
    if (items.some((item) => item === '') || new Set(items).size > mostItems) return false;
    return new Set(items.map((text, row) => `${companies[row]}\n${text}`)).size === items.length;
  });
  return suited.find((plain) => itemWords.test(plain.header)) ?? suited[0];
}

const leastShareShared = 0.5;

/** Whether a sheet has years in columns for the same companies. */
function isAnotherVariable(sheet: SheetOfFile, first: WideSheet): boolean {
  if (sheet.isHidden) return false;
  const headerIndex = findHeaderRow(sheet.grid);
  const wide = headerIndex === undefined ? undefined : wideSheet(sheet.grid, headerIndex);
  if (wide === undefined || !hasYearsInColumns(wide)) return false;
  if (wide.header.years.some(({ label }) => label.variable !== '')) return false;
  const known = new Set(companiesOf(first));
  const companies = companiesOf(wide);
  const shared = companies.filter((company) => known.has(company));
  return shared.length > 0 && shared.length >= leastShareShared * companies.length;
}

function companiesOf(sheet: WideSheet): string[] {
  return sheet.grid.rows
    .slice(sheet.headerIndex + 1)
    .map((_, row) => companyOf(sheet, sheet.headerIndex + 1 + row))
    .filter((company) => company !== '');
}

function cellsOf(rows: readonly (readonly string[])[], column: number): string[] {
  return rows.map((cells) => cells[column] ?? '').filter((cell) => !isMissing(cell));
}

function isYear(cell: string): boolean {
  const year = parseYear(cell);
  return year !== undefined && year >= 1800 && year <= 2200;
}
