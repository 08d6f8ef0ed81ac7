import ExcelJS from 'exceljs';
import type { TableReading } from '../file-recipe';
import { FileRefusal } from './file-refusal';
import { type FileTable, readFile } from './read-file';
import { plainParts, zipOf } from './testing/craft-workbook';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);
const text = 'Company,Year,Börsenwert\nAlder,2020,1.5\nBirch,2020,2.5\n';

async function codeOf(content: Uint8Array, name: string): Promise<string> {
  try {
    await readFile(content, name, null);
  } catch (error) {
    if (error instanceof FileRefusal) return error.code;
    throw error;
  }
  return 'none';
}

function swapped(little: Buffer): Buffer {
  return Buffer.from(little).swap16();
}

describe('a text file', () => {
  const little = Buffer.from(text, 'utf16le');
  const mark = Buffer.from('\ufeff', 'utf16le');
  for (const [encoding, content] of [
    ['UTF-8', bytes(text)],
    ['UTF-8 with its mark', bytes(`\ufeff${text}`)],
    ['UTF-16, low byte first', little],
    ['UTF-16, low byte first, with its mark', Buffer.concat([mark, little])],
    ['UTF-16, high byte first', swapped(little)],
    ['UTF-16, high byte first, with its mark', swapped(Buffer.concat([mark, little]))],
  ] as const) {
    it(`is read in ${encoding}`, async () => {
      const { table, reading, sheets } = await readFile(content, 'peers.csv', null);
      expect(table.header).toEqual(['Company', 'Year', 'Börsenwert']);
      expect(table.rows[1]).toEqual(['Birch', '2020', '2.5']);
      expect(reading.sheet).toBeNull();
      expect(reading.encoding).toBe(encoding.startsWith('UTF-8') ? 'utf-8' : 'utf-16');
      expect(sheets).toEqual([]);
    });
  }

  it('is read in Windows-1252 where it is no UTF-8, signs of money and quotes too', async () => {
    const content = Buffer.from(
      'Firma,Jahr,B\xf6rsenwert\nM\xfcller \x93A\x94,2020,\x805\n',
      'latin1',
    );
    const { table, reading } = await readFile(content, 'peers.csv', null);
    expect(table.header[2]).toBe('Börsenwert');
    expect(table.rows[0]).toEqual(['Müller “A”', '2020', '€5']);
    expect(reading.encoding).toBe('windows-1252');
  });

  it('is read in the encoding that is chosen, and refused where it is not in that', async () => {
    const { reading } = await readFile(bytes(text), 'peers.csv', null);
    const asWindows = await readFile(bytes(text), 'peers.csv', {
      ...reading,
      encoding: 'windows-1252',
    });
    expect(asWindows.table.header[2]).toBe('BÃ¶rsenwert');
    const older = Buffer.from(text, 'latin1');
    await expectAsync(
      readFile(older, 'peers.csv', { ...reading, encoding: 'utf-8' }),
    ).toBeRejectedWith(jasmine.objectContaining({ code: 'csv_invalid' }));
    const { encoding, ...unsaid } = reading;
    expect(encoding).toBe('utf-8');
    expect((await readFile(older, 'peers.csv', unsaid)).table.header[2]).toBe('Börsenwert');
  });

  it('is read below its titles, lines being those of the file', async () => {
    const { table, reading, topLines } = await readFile(
      bytes(`Peers,,\n\nin EUR m,,\n${text}`),
      'peers.csv',
      null,
    );
    expect(reading.headerRow).toBe(4);
    expect(table.lines).toEqual([5, 6]);
    expect(topLines.map(({ row }) => row)).toEqual([1, 3, 4, 5, 6]);
    expect(topLines[0].cells).toEqual(['Peers', '', '']);
  });

  it('shows no more than 15 lines of its top', async () => {
    const { topLines } = await readFile(bytes(text + 'Cedar,2020,1\n'.repeat(30)), 'a.csv', null);
    expect(topLines.length).toBe(15);
  });

  it('is read from the header that is chosen', async () => {
    const reading: TableReading = {
      sheet: null,
      headerRow: 3,
      layout: { kind: 'long' },
      decimalSign: ',',
      encoding: 'utf-8',
    };
    const file = await readFile(bytes(text), 'peers.csv', reading);
    expect(file.table.header).toEqual(['Birch', '2020', '2.5']);
    expect(file.reading).toEqual(reading);
    await expectAsync(
      readFile(bytes(text), 'peers.csv', { ...reading, headerRow: 9 }),
    ).toBeRejectedWith(jasmine.objectContaining({ code: 'reading_invalid' }));
    await expectAsync(
      readFile(bytes(text), 'peers.csv', { ...reading, sheet: 'Data' }),
    ).toBeRejectedWith(jasmine.objectContaining({ code: 'reading_invalid' }));
  });

  it('is refused for a NUL, a name or a content that is none of a table', async () => {
    expect(await codeOf(bytes(text.replace('1.5', '1\0')), 'peers.csv')).toBe('type_not_allowed');
    expect(await codeOf(bytes(text), 'peers.pdf')).toBe('type_not_allowed');
    expect(await codeOf(bytes(text), 'peers')).toBe('type_not_allowed');
    expect(await codeOf(bytes('%PDF-1.7 a,b'), 'peers.csv')).toBe('type_not_allowed');
    expect(await codeOf(await zipOf(plainParts()), 'peers.csv')).toBe('type_not_allowed');
    expect(await codeOf(Buffer.concat([mark, Buffer.from('a,b\n1,\0', 'utf16le')]), 'a.csv')).toBe(
      'csv_invalid',
    );
  });

  it('is refused for one line of 10 MB, a long field and another encoding', async () => {
    expect(await codeOf(Buffer.alloc(10_000_000, 'a'), 'a.csv')).toBe('csv_invalid');
    expect(await codeOf(Buffer.alloc(10_000_000, 'a,'), 'a.csv')).toBe('csv_invalid');
    expect(await codeOf(bytes(`a,b\n1,${'x'.repeat(65_537)}\n`), 'a.csv')).toBe('csv_invalid');
    expect(await codeOf(Buffer.from('B\x90rse,b\n1,2\n', 'latin1'), 'a.csv')).toBe('csv_invalid');
    expect(await codeOf(Buffer.from('\xef\xbb\xbfB\xf6rse,b\n', 'latin1'), 'a.csv')).toBe(
      'csv_invalid',
    );
    expect(await codeOf(bytes(''), 'a.csv')).toBe('csv_invalid');
  });

  it('is refused for too many columns, rows, and headers that are none', async () => {
    const row = (cells: number): string => Array.from({ length: cells }, () => '1').join(',');
    expect(await codeOf(bytes(`${row(201)}\n`), 'a.csv')).toBe('sheet_limit');
    expect(await codeOf(bytes(`a,b\n${'1,2\n'.repeat(200_001)}`), 'a.csv')).toBe('sheet_limit');
    expect(await codeOf(bytes(`a,${'b'.repeat(501)}\n1,2\n`), 'a.csv')).toBe('sheet_limit');
  });
});

describe('a workbook', () => {
  async function written(fill: (workbook: ExcelJS.Workbook) => void): Promise<Uint8Array> {
    const workbook = new ExcelJS.Workbook();
    fill(workbook);
    return new Uint8Array(await workbook.xlsx.writeBuffer());
  }

  const twoSheets = (): Promise<Uint8Array> =>
    written((workbook) => {
      workbook.addWorksheet('Read me').addRow(['Figures of peers']);
      workbook.addWorksheet('Kept', { state: 'hidden' }).addRows([
        ['Company', 'Year', 'Capex'],
        ['Elm', 2019, 9],
      ]);
      const data = workbook.addWorksheet('Data');
      data.addRows([['Peers'], [], ['Company', 'Year', 'Capex', 'Sum']]);
      data.addRow(['Alder', 2020, 1.234, { formula: 'C4*2', result: 2.468 }, 'see note']);
    });

  it('is read from its first sheet on show that has a table', async () => {
    const { table, reading, sheets, formulaCells }: FileTable = await readFile(
      await twoSheets(),
      'peers.xlsx',
      null,
    );
    expect(reading).toEqual({
      sheet: 'Data',
      headerRow: 3,
      layout: { kind: 'long' },
      decimalSign: '.',
    });
    expect(table.header).toEqual(['Company', 'Year', 'Capex', 'Sum', 'column 5']);
    expect(table.rows).toEqual([['Alder', '2020', '1.234', '2.468', 'see note']]);
    expect(table.lines).toEqual([4]);
    expect([formulaCells, table.isFormula?.(0, 3), table.isFormula?.(0, 2)]).toEqual([
      1,
      true,
      false,
    ]);
    expect(sheets).toEqual([
      { name: 'Read me', rows: 1, columns: 1 },
      { name: 'Kept', rows: 2, columns: 3 },
      { name: 'Data', rows: 3, columns: 5 },
    ]);
  });

  it('is read from the sheet that is chosen, a hidden one too', async () => {
    const reading: TableReading = {
      sheet: 'Kept',
      headerRow: 1,
      layout: { kind: 'long' },
      decimalSign: 'as-found',
    };
    const { table } = await readFile(await twoSheets(), 'peers.xlsx', reading);
    expect(table.rows).toEqual([['Elm', '2019', '9']]);
    await expectAsync(
      readFile(await twoSheets(), 'peers.xlsx', { ...reading, sheet: 'Lost' }),
    ).toBeRejectedWithError(FileRefusal, /“Lost”.*Read me, Kept, Data/);
  });

  it('leaves the decimal sign open where numbers are typed as text', async () => {
    const content = await written((workbook) => {
      workbook.addWorksheet('Data').addRows([
        ['Company', 'Year', 'Capex'],
        ['Alder', 2020, '1,5'],
      ]);
    });
    expect((await readFile(content, 'a.xlsx', null)).reading.decimalSign).toBe('as-found');
  });

  it('is refused where its table begins too far down to be chosen', async () => {
    const content = await written((workbook) => {
      const sheet = workbook.addWorksheet('Data');
      sheet.getRow(1001).values = ['Company', 'Year', 'Capex'];
      sheet.getRow(1002).values = ['Alder', 2020, 1];
    });
    expect(await codeOf(content, 'peers.xlsx')).toBe('reading_invalid');
  });

  it('is refused under another name, behind a password, or empty', async () => {
    expect(await codeOf(await twoSheets(), 'peers.xls')).toBe('type_not_allowed');
    expect(await codeOf(await twoSheets(), 'peers.xlsm')).toBe('type_not_allowed');
    expect(await codeOf(bytes(text), 'peers.xlsx')).toBe('type_not_allowed');
    const compound = Uint8Array.of(0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1, 0, 0);
    expect(await codeOf(compound, 'peers.xlsx')).toBe('xlsx_active_content');
    const empty = await written((workbook) => workbook.addWorksheet('Data'));
    expect(await codeOf(empty, 'peers.xlsx')).toBe('reading_invalid');
  });
});
