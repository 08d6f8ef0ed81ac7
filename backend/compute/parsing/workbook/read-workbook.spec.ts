import ExcelJS from 'exceljs';
import {
  plainParts,
  relationship,
  relationships,
  sheetXml,
  workbookXml,
  zipOf,
} from '../testing/craft-workbook';
import { readWorkbook, type Sheet } from './read-workbook';

async function written(fill: (workbook: ExcelJS.Workbook) => void): Promise<Sheet[]> {
  const workbook = new ExcelJS.Workbook();
  fill(workbook);
  return readWorkbook(new Uint8Array(await workbook.xlsx.writeBuffer()));
}

async function cellsOf(fill: (sheet: ExcelJS.Worksheet) => void): Promise<Sheet['grid']> {
  const [{ grid }] = await written((workbook) => {
    fill(workbook.addWorksheet('Data'));
  });
  return grid;
}

async function crafted(rows: string): Promise<Sheet['grid']> {
  const parts = plainParts({ 'xl/worksheets/sheet1.xml': sheetXml(rows) });
  const [{ grid }] = await readWorkbook(await zipOf(parts));
  return grid;
}

describe('a workbook read as texts', () => {
  it('keeps every digit of a number, whatever its format', async () => {
    const numbers = [0.1 + 0.2, 1 / 3, 123456789.123, -4e-7, 1e21, 1234.5, 2 ** 53];
    const { rows } = await cellsOf((sheet) => {
      sheet.addRow(numbers).numFmt = '#,##0';
    });
    expect(rows[0].map(Number)).toEqual(numbers);
    expect(rows[0][5]).toBe('1234.5');
  });

  it('reads a percentage as the number it stores', async () => {
    const { rows } = await cellsOf((sheet) => {
      sheet.addRow([0.125]).numFmt = '0.0%';
    });
    expect(rows).toEqual([['0.125']]);
  });

  it('reads dates as days, and times and durations as numbers', async () => {
    const { rows } = await cellsOf((sheet) => {
      sheet.addRow([new Date('2019-12-31T00:00:00Z'), new Date('2020-02-29T18:30:00Z'), 0.5, 7]);
      sheet.getCell('A1').numFmt = 'dd.mm.yyyy';
      sheet.getCell('B1').numFmt = '[$-407]d. mmmm yyyy;@';
      sheet.getCell('C1').numFmt = 'hh:mm:ss';
      sheet.getCell('D1').numFmt = '#,##0 "days"';
    });
    expect(rows).toEqual([['2019-12-31', '2020-02-29', '0.5', '7']]);
  });

  it('counts days from 1904 where the workbook does', async () => {
    const [{ grid }] = await written((workbook) => {
      workbook.properties.date1904 = true;
      workbook.addWorksheet('Data').addRow([new Date('2019-12-31T00:00:00Z')]);
    });
    expect(grid.rows).toEqual([['2019-12-31']]);
  });

  it('joins formatted runs, writes yes and no out, and shows errors as they stand', async () => {
    const { rows } = await cellsOf((sheet) => {
      sheet.addRow([
        { richText: [{ text: 'Market ' }, { text: 'value', font: { bold: true } }] },
        true,
        false,
        { error: '#N/A' },
        { text: 'a page', hyperlink: 'https://example.org/' },
      ]);
    });
    expect(rows).toEqual([['Market value', 'TRUE', 'FALSE', '#N/A', 'a page']]);
  });

  it('takes the stored value of a formula and marks the cell', async () => {
    const grid = await cellsOf((sheet) => {
      sheet.addRow(['Company', 'Sum', 'Text', 'Error']);
      sheet.addRow([
        'Alder',
        { formula: 'B9*2', result: 12.5 },
        { formula: 'A9', result: 'found' },
        { formula: '1/0', result: { error: '#DIV/0!' } },
      ]);
    });
    expect(grid.rows[1]).toEqual(['Alder', '12.5', 'found', '#DIV/0!']);
    const marks = grid.rows.map((cells, row) =>
      cells.map((_, column) => grid.isFormula?.(row, column)),
    );
    expect(marks).toEqual([
      [false, false, false, false],
      [false, true, true, true],
    ]);
  });

  it('leaves a formula without a stored value empty', async () => {
    const grid = await crafted('<row r="1"><c r="A1"><f>1+1</f></c><c r="B1"><v>3</v></c></row>');
    expect(grid.rows).toEqual([['', '3']]);
    expect(grid.isFormula?.(0, 0)).toBeTrue();
  });

  it('gives merged cells one text, rows their numbers, and skips blank ones', async () => {
    const { rows, lines } = await cellsOf((sheet) => {
      sheet.getCell('A2').value = 'block';
      sheet.mergeCells('A2:C2');
      sheet.getCell('B5').value = 7;
    });
    expect(rows).toEqual([['block'], ['', '7']]);
    expect(lines).toEqual([2, 5]);
  });

  it('lists sheets in their order, hidden ones too', async () => {
    const sheets = await written((workbook) => {
      workbook.addWorksheet('Zeta').addRow(['a']);
      workbook.addWorksheet('Hidden', { state: 'veryHidden' }).addRow(['b']);
      workbook.addWorksheet('Alpha').addRow(['c']);
    });
    expect(sheets.map(({ name, isHidden }) => ({ name, isHidden }))).toEqual([
      { name: 'Zeta', isHidden: false },
      { name: 'Hidden', isHidden: true },
      { name: 'Alpha', isHidden: false },
    ]);
  });

  it('finds parts by their relations, with absolute targets and prefixed names', async () => {
    const sheet =
      '<x:worksheet xmlns:x="http://schemas.openxmlformats.org/spreadsheetml/2006/main"><x:sheetData><x:row><x:c t="s"><x:v>1</x:v></x:c><x:c><x:v>2</x:v></x:c></x:row></x:sheetData></x:worksheet>';
    const parts = plainParts({
      'xl/workbook.xml': workbookXml(['Chart', 'Cells']),
      'xl/_rels/workbook.xml.rels': relationships(
        relationship('rId1', 'chartsheet', '/xl/chartsheets/sheet1.xml'),
        relationship('rId2', 'worksheet', '/xl/pages/first.xml'),
        relationship('rId3', 'sharedStrings', '/xl/texts.xml'),
      ),
      'xl/pages/first.xml': sheet,
      'xl/texts.xml':
        '<sst xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main"><si><t>none</t></si><si><r><t>Al</t></r><r><t>der_x000A_AG</t></r><rPh sb="0" eb="1"><t>reading aid</t></rPh></si></sst>',
    });
    const [{ name, grid }] = await readWorkbook(await zipOf(parts));
    expect(name).toBe('Cells');
    expect(grid.rows).toEqual([['Alder\nAG', '2']]);
  });
});
