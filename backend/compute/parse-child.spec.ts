import { fileURLToPath } from 'node:url';
import type { FileRecipe } from './file-recipe';
import { ParseProcess, ParseRefused } from './parse-process';
import { plainParts, sheetXml, zipOf } from './parsing/testing/craft-workbook';

const reader = (): ParseProcess =>
  new ParseProcess(fileURLToPath(new URL('parse-child.ts', import.meta.url)));
const text = [
  'Company,Year,Market value,Capex,Book equity',
  'Alder,2019,10,1,5',
  'Alder,2020,11,2,6',
  'Birch,2020,20,3,7',
].join('\n');
const bytes = new TextEncoder().encode(text);
const peers = { owner: 'one', bytes, name: 'peers.csv' };

async function codeOf(content: Uint8Array, name: string): Promise<string> {
  try {
    await reader().preview({ owner: 'one', bytes: content, name }, null);
  } catch (error) {
    if (error instanceof ParseRefused) return error.code;
    throw error;
  }
  return 'none';
}

describe('a file read in its process', () => {
  it('is shown in part without half a character', async () => {
    const long = `${'x'.repeat(199)}😀 and more`;
    const bytes = Buffer.from(`company,year,note\nAlder,2019,${long}\n`);
    const preview = await reader().preview({ owner: 'one', bytes, name: 'long.csv' }, null);
    expect(preview.firstRows[0].cells[2]).toBe(`${'x'.repeat(199)} …`);
  });

  it('is previewed, checked and read by the same reading', async () => {
    const preview = await reader().preview(peers, null);
    expect(preview.headers).toEqual(['Company', 'Year', 'Market value', 'Capex', 'Book equity']);
    expect(preview.firstRows[0]).toEqual({ row: 2, cells: ['Alder', '2019', '10', '1', '5'] });
    expect([preview.rowCount, preview.topLines.length]).toEqual([3, 4]);
    const recipe: FileRecipe = {
      company: 'Company',
      year: 'Year',
      marketValue: 'Market value',
      capex: 'Capex',
      bookEquity: 'Book equity',
      others: [],
      attributes: [],
      currency: 'EUR',
      unit: 'millions',
      reading: preview.reading,
      conversion: {
        columns: [],
        currencies: null,
        prices: null,
        fiscalYears: { rule: 'year-of-end', usualEndMonth: 12, companies: [] },
      },
      mending: { cells: [], excludedRows: [], renames: [] },
    };
    const check = await reader().check(peers, recipe, null);
    expect([check.rows, check.companies, check.blockingCount]).toEqual([3, 2, 0]);
    const panel = await reader().read(peers, recipe);
    expect(panel.values.map((values) => [...values])).toEqual([
      [10, 11, 20],
      [1, 2, 3],
      [5, 6, 7],
    ]);
  });

  it('shows a long text by its beginning', async () => {
    const long = `${text}\n${'x'.repeat(60_000)},2020,1,1,1`;
    const { firstRows } = await reader().preview(
      { ...peers, bytes: new TextEncoder().encode(long) },
      null,
    );
    expect(firstRows[3].cells[0].length).toBe(202);
  });

  it('is refused with its code while another is read', async () => {
    const cells = Array.from({ length: 200_002 }, (_, row) => `<row><c><v>${row}</v></c></row>`);
    const hostile = {
      bomb: await zipOf(plainParts({ 'xl/media/a.png': Buffer.alloc(4_000_000) })),
      macros: await zipOf(plainParts({ 'xl/vbaProject.bin': 'x' })),
      long: await zipOf(plainParts({ 'xl/worksheets/sheet1.xml': sheetXml(cells.join('')) })),
      line: Buffer.alloc(10_000_000, 'a'),
    };
    const shared = reader();
    const codes = Promise.all([
      codeOf(hostile.bomb, 'a.xlsx'),
      codeOf(hostile.macros, 'a.xlsx'),
      codeOf(hostile.long, 'a.xlsx'),
      codeOf(hostile.line, 'a.csv'),
    ]);
    expect((await shared.preview(peers, null)).rowCount).toBe(3);
    expect(await codes).toEqual(['zip_limit', 'xlsx_active_content', 'sheet_limit', 'csv_invalid']);
  });
});
