import ExcelJS from 'exceljs';
import type { TableReading } from '../../file-recipe';
import { FileRefusal } from '../file-refusal';
import { type FileTable, readFile } from '../read-file';
import { placeOfCell } from '../table';

function ofText(lines: readonly string[], reading: TableReading | null = null): Promise<FileTable> {
  return readFile(new TextEncoder().encode(lines.join('\n')), 'peers.csv', reading);
}

type Cells = readonly (readonly (string | number | null | ExcelJS.CellFormulaValue)[])[];

async function ofSheets(
  sheets: Readonly<Record<string, Cells>>,
  reading: TableReading | null = null,
): Promise<FileTable> {
  const workbook = new ExcelJS.Workbook();
  for (const [name, rows] of Object.entries(sheets))
    workbook.addWorksheet(name).addRows(rows.map((cells) => [...cells]));
  return readFile(new Uint8Array(await workbook.xlsx.writeBuffer()), 'peers.xlsx', reading);
}

describe('years in columns', () => {
  const wide = [
    'Company,Country,Market value 2019,Market value 2020,capex_2019,capex_2020,Rating 2021E',
    'Alder,DE,10,11,1,2,A',
    'Birch,FR,20,,3,,B',
  ];

  it('become a row a company and year, what describes a company beside it', async () => {
    const { table, reading } = await ofText(wide);
    expect(reading.layout).toEqual({ kind: 'years-in-columns', item: null });
    expect(table.header).toEqual([
      'Company',
      'Year',
      'Country',
      'Rating 2021E',
      'Market value',
      'capex',
    ]);
    expect(table.rows).toEqual([
      ['Alder', '2019', 'DE', 'A', '10', '1'],
      ['Alder', '2020', 'DE', 'A', '11', '2'],
      ['Birch', '2019', 'FR', 'B', '20', '3'],
    ]);
    expect(table.lines).toEqual([2, 2, 3]);
  });

  it('name the cell of the file that each figure stands in', async () => {
    const { table } = await ofText(wide);
    expect(placeOfCell(table, 1, 5)).toEqual({ line: 2, header: 'capex_2020' });
    expect(placeOfCell(table, 2, 4)).toEqual({ line: 3, header: 'Market value 2019' });
    expect(placeOfCell(table, 2, 0)).toEqual({ line: 3, header: 'Company' });
  });

  it('keep a gap within the years of a company and drop what is outside', async () => {
    const { table } = await ofText([
      'Company,MV 2018,MV 2019,MV 2020,MV 2021,MV 2022',
      'Alder,,1,NA,3,',
      'Birch,1,,,,',
      'Cedar,,,,,',
    ]);
    expect(table.rows).toEqual([
      ['Alder', '2019', '1'],
      ['Alder', '2020', 'NA'],
      ['Alder', '2021', '3'],
      ['Birch', '2018', '1'],
    ]);
  });

  it('stand in order of time, whatever their order in the file', async () => {
    const { table } = await ofText(['Company,MV FY2020,MV FY2019', 'Alder,2,1']);
    expect(table.rows).toEqual([
      ['Alder', 'FY2019', '1'],
      ['Alder', 'FY2020', '2'],
    ]);
  });

  it('take the variable from the row above, its merged cells filled forward', async () => {
    const { table, reading, topLines } = await ofSheets({
      Data: [
        ['Peer figures in EUR m'],
        [],
        [null, null, 'Market value', null, 'Capex', null],
        ['Company', 'ISIN', 2019, 2020, 2019, 2020],
        ['Alder', 'X1', 10, 11, 1, 2],
      ],
    });
    expect(reading).toEqual({
      sheet: 'Data',
      headerRow: 4,
      layout: { kind: 'years-in-columns', item: null },
      decimalSign: '.',
    });
    expect(table.header).toEqual(['Company', 'Year', 'ISIN', 'Market value', 'Capex']);
    expect(table.rows).toEqual([
      ['Alder', '2019', 'X1', '10', '1'],
      ['Alder', '2020', 'X1', '11', '2'],
    ]);
    expect(placeOfCell(table, 1, 4)).toEqual({ line: 5, header: 'Capex 2020' });
    expect(topLines.map(({ row }) => row)).toEqual([1, 3, 4, 5]);
  });

  it('take the year from the row above where variables repeat under it', async () => {
    const { table } = await ofText([
      ',2019,,2020,,',
      'Company,Market value,Capex,Market value,Capex,Industry',
      'Alder,10,1,11,2,wood',
    ]);
    expect(table.header).toEqual(['Company', 'Year', 'Industry', 'Market value', 'Capex']);
    expect(table.rows[1]).toEqual(['Alder', '2020', 'wood', '11', '2']);
  });

  it('hold one variable, named by the sheet, where no header names one', async () => {
    const { table } = await ofSheets({
      Capex: [
        ['Company', 2019, 2020],
        ['Alder', 1, 2],
      ],
    });
    expect(table.header).toEqual(['Company', 'Year', 'Capex']);
  });

  it('mark cells that a formula wrote', async () => {
    const { table, formulaCells } = await ofSheets({
      Data: [
        ['Company', 'Capex 2019', 'Capex 2020'],
        ['Alder', 1, { formula: 'B2*2', result: 2 }],
      ],
    });
    expect(table.rows[1]).toEqual(['Alder', '2020', '2']);
    expect([table.isFormula?.(0, 2), table.isFormula?.(1, 2), formulaCells]).toEqual([
      false,
      true,
      1,
    ]);
  });

  it('tell a second column of one variable and year apart', async () => {
    const { table } = await ofText(['Company,MV 2019,MV 2019,MV 2020', 'Alder,1,2,3']);
    expect(table.header).toEqual(['Company', 'Year', 'MV', 'MV (2)']);
    expect(table.repeatedHeaders).toEqual(['MV']);
  });

  it('are not taken for wide where a column holds the year of each row', async () => {
    const { reading, table } = await ofText([
      'Company,Year,Index 2015,Index 2020',
      'Alder,2019,1,2',
      'Alder,2020,3,4',
    ]);
    expect(reading.layout).toEqual({ kind: 'long' });
    expect(table.header).toEqual(['Company', 'Year', 'Index 2015', 'Index 2020']);
  });

  it('become too many rows only within the limit of rows', async () => {
    const years = Array.from({ length: 150 }, (_, index) => String(1850 + index));
    const lines = Array.from({ length: 1400 }, (_, row) => `C${row},${years.join(',')}`);
    await expectAsync(ofText([`Company,${years.join(',')}`, ...lines])).toBeRejectedWith(
      jasmine.objectContaining({ code: 'sheet_limit' }),
    );
  });
});

describe('a row a company and variable', () => {
  const lines = [
    'Company;Item;2019;2020',
    'Alder;Market value;10;11',
    ';Capex;1;2',
    'Birch;Market value;20;21',
    'Birch;Capex;3;',
  ];

  it('becomes a column a variable, a blank company being the one above', async () => {
    const { table, reading } = await ofText(lines);
    expect(reading.layout).toEqual({ kind: 'years-in-columns', item: 'Item' });
    expect(table.header).toEqual(['Company', 'Year', 'Market value', 'Capex']);
    expect(table.rows).toEqual([
      ['Alder', '2019', '10', '1'],
      ['Alder', '2020', '11', '2'],
      ['Birch', '2019', '20', '3'],
      ['Birch', '2020', '21', ''],
    ]);
    expect(placeOfCell(table, 1, 3)).toEqual({ line: 3, header: '2020' });
    expect(placeOfCell(table, 1, 0)).toEqual({ line: 2, header: 'Company' });
  });

  it('keeps a variable that comes twice as rows of their own, to be found as such', async () => {
    const reading = (await ofText(lines)).reading;
    const { table } = await ofText([...lines, 'Alder;Capex;7;8'], reading);
    expect(table.rows.filter(([company]) => company === 'Alder')).toEqual([
      ['Alder', '2019', '10', '1'],
      ['Alder', '2020', '11', '2'],
      ['Alder', '2019', '', '7'],
      ['Alder', '2020', '', '8'],
    ]);
  });

  it('can be read by another column', async () => {
    const layout = { kind: 'years-in-columns', item: 'Konto' } as const;
    const text = ['Firma,Konto,Land,2019,2020', 'Alder,4711,DE,1,2', 'Alder,4712,DE,3,4'];
    const { table } = await ofText(text, { ...(await ofText(lines)).reading, layout });
    expect(table.header).toEqual(['Firma', 'Year', 'Land', '4711', '4712']);
  });

  it('is refused where the column is not there', async () => {
    const reading = { ...(await ofText(lines)).reading };
    const layout = { kind: 'years-in-columns', item: 'Measure' } as const;
    await expectAsync(ofText(lines, { ...reading, layout })).toBeRejectedWithError(
      FileRefusal,
      /column “Measure”.*Company, Item/,
    );
  });
});

describe('a sheet a variable', () => {
  const sheets: Readonly<Record<string, Cells>> = {
    Notes: [['Figures are in EUR m.'], ['Ask finance.']],
    'Market value': [
      ['Company', 'Country', 2019, 2020],
      ['Alder', 'DE', 10, 11],
      ['Birch', 'FR', 20, 21],
    ],
    Capex: [['Capital expenditure'], ['Company', 2020, 2019], ['Birch', 4, 3], ['Alder', 2, 1]],
    Equity: [
      ['Company', 2019, 2020, 2021],
      ['Alder', 5, 6, 7],
    ],
    Totals: [
      ['Region', 2019, 2020],
      ['North', 9, 9],
    ],
  };

  it('joins the sheets by company and year', async () => {
    const { table, reading, sheets: listed } = await ofSheets(sheets);
    expect(reading.sheet).toBe('Market value');
    expect(reading.layout).toEqual({
      kind: 'sheet-a-variable',
      sheets: ['Market value', 'Capex', 'Equity'],
    });
    expect(table.header).toEqual(['Company', 'Year', 'Country', 'Market value', 'Capex', 'Equity']);
    expect(table.rows).toEqual([
      ['Alder', '2019', 'DE', '10', '1', '5'],
      ['Alder', '2020', 'DE', '11', '2', '6'],
      ['Alder', '2021', 'DE', '', '', '7'],
      ['Birch', '2019', 'FR', '20', '3', ''],
      ['Birch', '2020', 'FR', '21', '4', ''],
    ]);
    expect(listed.map(({ name, rows }) => [name, rows])).toEqual([
      ['Notes', 2],
      ['Market value', 3],
      ['Capex', 4],
      ['Equity', 2],
      ['Totals', 2],
    ]);
  });

  it('is read the same again by the reading that was recognised', async () => {
    const first = await ofSheets(sheets);
    const again = await ofSheets(sheets, first.reading);
    expect(again.reading).toEqual(first.reading);
    expect(again.table.header).toEqual(first.table.header);
    expect(again.table.rows).toEqual(first.table.rows);
  });

  it('names a cell by its sheet, line and header', async () => {
    const { table } = await ofSheets(sheets);
    expect(placeOfCell(table, 4, 4)).toEqual({ line: 3, header: 'Capex 2020' });
    expect(placeOfCell(table, 0, 3)).toEqual({ line: 2, header: 'Market value 2019' });
  });

  it('is read from the sheets that are chosen', async () => {
    const { reading } = await ofSheets(sheets);
    const layout = { kind: 'sheet-a-variable', sheets: ['Capex', 'Market value'] } as const;
    const { table } = await ofSheets(sheets, { ...reading, headerRow: 2, layout });
    expect(table.header).toEqual(['Company', 'Year', 'Capex', 'Market value']);
    const unknown = { kind: 'sheet-a-variable', sheets: ['Capex', 'Sales'] } as const;
    await expectAsync(
      ofSheets(sheets, { ...reading, headerRow: 2, layout: unknown }),
    ).toBeRejectedWithError(FileRefusal, /“Sales”/);
  });
});
