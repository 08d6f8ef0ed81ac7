import ExcelJS from 'exceljs';
import type { GivenFile } from './import-page';
import type { InventedRow } from './invented-figures';

const variables = [
  ['Market value', ({ marketValue }: InventedRow) => marketValue],
  ['Capex', ({ capex }: InventedRow) => capex],
  ['Book equity', ({ bookEquity }: InventedRow) => bookEquity],
] as const;

/** A workbook with a title above its table, a row for each company and variable, a column for each year. */
export async function wideWorkbook(
  name: string,
  rows: readonly InventedRow[],
  currencyOf: (company: string) => string,
): Promise<GivenFile> {
  const companies = [...new Set(rows.map(({ company }) => company))];
  const years = [...new Set(rows.map(({ year }) => year))].sort();
  const workbook = new ExcelJS.Workbook();
  const sheet = workbook.addWorksheet('Figures');
  sheet.addRow(['Figures of the annual reports, in millions of each company’s currency']);
  sheet.addRow([]);
  sheet.addRow(['Company', 'Item', 'Currency', ...years]);
  for (const company of companies)
    for (const [item, figureOf] of variables)
      sheet.addRow([
        company,
        item,
        currencyOf(company),
        ...years.map((year) => {
          const row = rows.find((each) => each.company === company && each.year === year);
          return row === undefined ? null : figureOf(row);
        }),
      ]);
  workbook.addWorksheet('Sources').addRow(['Annual reports']);
  return {
    name,
    mimeType: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
    buffer: Buffer.from(await workbook.xlsx.writeBuffer()),
  };
}
