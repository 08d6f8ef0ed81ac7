import * as fc from 'fast-check';
import { checkFile } from './check-file';
import { filePanel } from './file-panel';
import { previewOf } from './file-preview';
import type { FileRecipe, TableLayout, TableReading } from './file-recipe';
import { type FileTable, readFile } from './parsing/read-file';
import {
  plainParts,
  relationship,
  relationships,
  sheetXml,
  workbookXml,
  zipOf,
} from './parsing/testing/craft-workbook';
import { plainHeader, plainRecipe } from './testing/tables';

type Cells = readonly (readonly (string | number)[])[];

/** A workbook of sheets whose numbers are typed and whose texts are texts. */
async function workbook(sheets: Readonly<Record<string, Cells>>): Promise<Uint8Array> {
  const names = Object.keys(sheets);
  return zipOf(
    plainParts({
      'xl/workbook.xml': workbookXml(names),
      'xl/_rels/workbook.xml.rels': relationships(
        ...names.map((_, index) =>
          relationship(`rId${index + 1}`, 'worksheet', `worksheets/sheet${index + 1}.xml`),
        ),
      ),
      ...Object.fromEntries(
        Object.values(sheets).map((rows, index) => [
          `xl/worksheets/sheet${index + 1}.xml`,
          sheetXml(rows.map((cells) => `<row>${cells.map(cellXml).join('')}</row>`).join('')),
        ]),
      ),
    }),
  );
}

function cellXml(content: string | number): string {
  if (typeof content === 'string') return `<c t="inlineStr"><is><t>${content}</t></is></c>`;
  return `<c><v>${Object.is(content, -0) ? '-0' : String(content)}</v></c>`;
}

const signs = ['as-found', '.', ','] as const;

function recipeOf(reading: TableReading, recipe: Partial<FileRecipe> = {}): FileRecipe {
  return { ...plainRecipe, ...recipe, reading };
}

async function panelValues(
  bytes: Uint8Array,
  reading: Partial<TableReading>,
  recipe: Partial<FileRecipe> = {},
): Promise<(readonly number[])[]> {
  const whole = { ...plainRecipe.reading, sheet: 'Data', ...reading };
  const { table } = await readFile(bytes, 'peers.xlsx', whole);
  return filePanel(table, recipeOf(whole, recipe)).values.map((column) => [...column]);
}

describe('a workbook with typed numbers and numbers typed as text in one column', () => {
  const rows: Cells = [
    plainHeader,
    ['Alder', 2019, 1.234, 1, 5],
    ['Alder', 2020, '1.234,5', 2, 6],
    ['Birch', 2020, 12345.678, 3, 7],
    ['Birch', 2021, '9.876', 4, 8.125],
  ];

  const file = async (): Promise<FileTable> =>
    readFile(await workbook({ Data: rows }), 'peers.xlsx', null);

  it('takes each typed number as it is and the texts as the column writes them', async () => {
    const { table, reading } = await file();
    expect(reading.decimalSign).toBe('as-found');
    for (const decimalSign of ['as-found', ','] as const) {
      const recipe = recipeOf({ ...reading, decimalSign });
      const [marketValue] = filePanel(table, recipe).values;
      expect([...marketValue])
        .withContext(decimalSign)
        .toEqual([1.234, 1234.5, 12345.678, 9876]);
      expect(checkFile({ table, formulaCells: 0 }, recipe, null).findings).toEqual([]);
    }
  });

  it('finds the texts that the chosen sign does not fit, never a typed number', async () => {
    const { table, reading } = await file();
    const recipe = recipeOf({ ...reading, decimalSign: '.' });
    const { findings } = checkFile({ table, formulaCells: 0 }, recipe, null);
    expect(findings.map(({ row, found, code }) => [row, found, code])).toEqual([
      [3, '1.234,5', 'not-a-number'],
    ]);
  });

  it('calls a text ambiguous where only typed numbers stand beside it', async () => {
    const bytes = await workbook({
      Data: [plainHeader, ['Alder', 2019, 1.5, 1, 5], ['Alder', 2020, '1.234', 2, 6]],
    });
    const { table, reading } = await readFile(bytes, 'peers.xlsx', null);
    const { findings } = checkFile({ table, formulaCells: 0 }, recipeOf(reading), null);
    expect(findings.map(({ row, found, code }) => [row, found, code])).toEqual([
      [3, '1.234', 'ambiguous-number'],
    ]);
  });

  it('reads what a person mends as text', async () => {
    const { table, reading } = await file();
    const mending = { ...plainRecipe.mending, cells: [{ row: 2, column: 'mv', text: '2.345' }] };
    const [marketValue] = filePanel(table, recipeOf(reading, { mending })).values;
    expect(marketValue[0]).toBe(2345);
    const excludedRows = [2];
    const shortened = recipeOf(reading, { mending: { ...plainRecipe.mending, excludedRows } });
    expect([...filePanel(table, shortened).values[0]]).toEqual([1234.5, 12345.678, 9876]);
  });

  it('guesses the columns whatever sign the texts have', async () => {
    const bytes = await workbook({
      Data: [
        ['Company', 'Year', 'Market value'],
        ...[1.5, 2.25, '1,5', '1,25', '7,5'].map((worth, row) => ['Alder', 2019 + row, worth]),
      ],
    });
    const { guess } = previewOf(await readFile(bytes, 'peers.xlsx', null));
    expect(guess.marketValue).toBe('Market value');
  });
});

describe('a typed number', () => {
  const figures = fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }), { minLength: 1 });

  it('comes back bit for bit whatever the decimal sign', async () => {
    await fc.assert(
      fc.asyncProperty(figures, fc.constantFrom(...signs), async (values, decimalSign) => {
        const rows = values.map((value, row) => ['Alder', 1900 + row, value, '1.234,5', '0,5']);
        const bytes = await workbook({ Data: [plainHeader, ...rows] });
        const [marketValue] = await panelValues(bytes, { decimalSign });
        expect(marketValue).toEqual(values);
      }),
      { numRuns: 40 },
    );
  });

  const inWide: readonly (readonly [string, TableLayout, (values: readonly number[]) => object])[] =
    [
      [
        'years in columns',
        { kind: 'years-in-columns', item: null },
        ([first, second, third]) => ({
          Data: [
            ['company', 'others', 'mv 2019', 'mv 2020', 'capex 2019', 'capex 2020', 'be 2019'],
            ['Alder', third, first, second, '1,5', 2, 3],
          ],
        }),
      ],
      [
        'a row a variable',
        { kind: 'years-in-columns', item: 'item' },
        ([first, second, third]) => ({
          Data: [
            ['company', 'item', 'others', 2019, 2020],
            ['Alder', 'mv', third, first, second],
            ['Alder', 'capex', 9, '1,5', 2],
            ['Alder', 'be', 9, 3, ''],
          ],
        }),
      ],
      [
        'a sheet a variable',
        { kind: 'sheet-a-variable', sheets: ['mv', 'capex', 'be'] },
        ([first, second, third]) => ({
          mv: [
            ['company', 'others', 2019, 2020],
            ['Alder', third, first, second],
          ],
          capex: [
            ['company', 2019, 2020],
            ['Alder', '1,5', 2],
          ],
          be: [
            ['company', 2019],
            ['Alder', 3],
          ],
        }),
      ],
    ];
  for (const [name, layout, sheetsOf] of inWide) {
    it(`comes back bit for bit from ${name}, also from a column that describes`, async () => {
      const figure = fc.double({ noNaN: true, noDefaultInfinity: true });
      await fc.assert(
        fc.asyncProperty(fc.tuple(figure, figure, figure), async (values) => {
          const bytes = await workbook(sheetsOf(values) as Record<string, Cells>);
          const sheet = layout.kind === 'sheet-a-variable' ? 'mv' : 'Data';
          const others = ['others'];
          const recipe = { year: 'Year', others };
          const found = await panelValues(bytes, { sheet, layout, decimalSign: ',' }, recipe);
          const [first, second, third] = values;
          expect(found).toEqual([
            [first, second],
            [1.5, 2],
            [3, NaN],
            [third, third],
          ]);
        }),
        { numRuns: 20 },
      );
    });
  }
});
