import { randomBytes } from 'node:crypto';
import { FileRefusal } from '../file-refusal';
import {
  contentTypes,
  declaringSize,
  plainParts,
  relationship,
  relationships,
  sheetXml,
  workbookXml,
  zipOf,
} from '../testing/craft-workbook';
import { readWorkbook, workbookLimits } from './read-workbook';

async function codeOf(
  bytes: Uint8Array,
  limits: Partial<typeof workbookLimits> = {},
): Promise<string> {
  try {
    await readWorkbook(bytes, { ...workbookLimits, ...limits });
  } catch (error) {
    if (error instanceof FileRefusal) return error.code;
    throw error;
  }
  return 'none';
}

const hyperlink = relationships(
  relationship('rId1', 'hyperlink', 'https://example.org/', 'External'),
);

describe('a workbook that is refused', () => {
  it('is none of these', async () => {
    const parts = plainParts({ 'xl/worksheets/_rels/sheet1.xml.rels': hyperlink });
    expect(await codeOf(await zipOf(parts))).toBe('none');
  });

  it('has more than 200 parts', async () => {
    const media = Object.fromEntries(
      Array.from({ length: 197 }, (_, index) => [`xl/media/${index}.png`, 'x']),
    );
    expect(await codeOf(await zipOf(plainParts(media)))).toBe('zip_limit');
  });

  it('declares too large a part, or too much in all', async () => {
    const zip = await zipOf(
      plainParts({ 'xl/a.bin': randomBytes(900_000), 'xl/b.bin': randomBytes(900_000) }),
    );
    const one = declaringSize(zip, 'xl/a.bin', 61 * 1024 * 1024);
    expect(await codeOf(one)).toBe('zip_limit');
    const both = declaringSize(
      declaringSize(zip, 'xl/a.bin', 51 * 1024 * 1024),
      'xl/b.bin',
      51 * 1024 * 1024,
    );
    expect(await codeOf(both)).toBe('zip_limit');
  });

  it('is a bomb of zeros, whatever size it declares', async () => {
    const zip = await zipOf(plainParts({ 'xl/media/a.png': Buffer.alloc(8 * 1024 * 1024) }));
    expect(await codeOf(zip)).toBe('zip_limit');
    expect(await codeOf(declaringSize(zip, 'xl/media/a.png', 100))).toBe('zip_limit');
  });

  it('unpacks to more than 60 MB a part though it declares little', async () => {
    const noise = Buffer.alloc(61 * 1024 * 1024, randomBytes(1000));
    const zip = await zipOf(plainParts({ 'xl/media/a.png': noise }), { compress: false });
    expect(await codeOf(declaringSize(zip, 'xl/media/a.png', 1000))).toBe('zip_limit');
  });

  for (const [what, others] of [
    ['macros', { 'xl/vbaProject.bin': 'x' }],
    ['macros in an unusual place', { 'custom/VBAProject1.bin': 'x' }],
    [
      'macros by its type',
      {
        '[Content_Types].xml': contentTypes('application/vnd.ms-excel.sheet.macroEnabled.main+xml'),
      },
    ],
    ['macro sheets', { 'xl/macrosheets/sheet1.xml': sheetXml('') }],
    ['links to other workbooks', { 'xl/externalLinks/externalLink1.xml': '<externalLink/>' }],
    [
      'pictures from elsewhere',
      {
        'xl/drawings/_rels/drawing1.xml.rels': relationships(
          relationship('rId1', 'image', 'https://example.org/a.png', 'External'),
        ),
      },
    ],
    ['embedded objects', { 'xl/embeddings/oleObject1.bin': 'x' }],
    ['controls', { 'xl/activeX/activeX1.xml': '<ocx/>' }],
    [
      'a document type definition',
      {
        'xl/worksheets/sheet1.xml': `<!DOCTYPE worksheet [<!ENTITY a "aaaa">]>${sheetXml('').replace('<?xml version="1.0"?>', '')}`,
      },
    ],
    [
      'a document type definition in a part without cells, in UTF-16',
      {
        'docProps/app.xml': Buffer.from(
          '\ufeff<!DOCTYPE p SYSTEM "file:///etc/hostname"><p/>',
          'utf16le',
        ),
      },
    ],
  ] as const) {
    it(`holds ${what}`, async () => {
      expect(await codeOf(await zipOf(plainParts(others)))).toBe('xlsx_active_content');
    });
  }

  it('resolves no entity of its own', async () => {
    const rows = '<row r="1"><c t="inlineStr"><is><t>&a;</t></is></c></row>';
    const zip = await zipOf(plainParts({ 'xl/worksheets/sheet1.xml': sheetXml(rows) }));
    expect(await codeOf(zip)).toBe('type_not_allowed');
  });

  it('has encrypted parts', async () => {
    const zip = await zipOf(plainParts());
    const header = zip.indexOf(Buffer.from([0x50, 0x4b, 0x01, 0x02]));
    zip.writeUInt16LE(zip.readUInt16LE(header + 8) | 1, header + 8);
    expect(await codeOf(zip)).toBe('xlsx_active_content');
  });

  it('is another zip, a damaged one, or has no sheet of cells', async () => {
    expect(await codeOf(await zipOf({ 'word/document.xml': '<p/>' }))).toBe('type_not_allowed');
    const whole = await zipOf(plainParts());
    expect(await codeOf(whole.subarray(0, whole.length - 40))).toBe('type_not_allowed');
    const spoilt = Buffer.from(whole);
    spoilt.fill(0xff, 60, 200);
    expect(await codeOf(spoilt)).toBe('type_not_allowed');
    const parts = plainParts({ 'xl/_rels/workbook.xml.rels': relationships() });
    expect(await codeOf(await zipOf(parts))).toBe('type_not_allowed');
    const broken = plainParts({ 'xl/worksheets/sheet1.xml': '<worksheet><sheetData>' });
    expect(await codeOf(await zipOf(broken))).toBe('type_not_allowed');
  });

  it('has more than 20 sheets', async () => {
    const names = Array.from({ length: 21 }, (_, index) => `S${index}`);
    const parts = plainParts({
      'xl/workbook.xml': workbookXml(names),
      'xl/_rels/workbook.xml.rels': relationships(
        ...names.map((_, index) =>
          relationship(`rId${index + 1}`, 'worksheet', 'worksheets/sheet1.xml'),
        ),
      ),
    });
    expect(await codeOf(await zipOf(parts))).toBe('sheet_limit');
  });

  it('has too many columns, rows or cells', async () => {
    const row = (r: number): string => `<row r="${r}"><c><v>1</v></c><c><v>2</v></c></row>`;
    const rows = [1, 2, 3, 4].map(row).join('');
    const zip = await zipOf(plainParts({ 'xl/worksheets/sheet1.xml': sheetXml(rows) }));
    expect(await codeOf(zip, { cells: 8, rows: 3, columns: 2 })).toBe('none');
    expect(await codeOf(zip, { cells: 7 })).toBe('sheet_limit');
    expect(await codeOf(zip, { rows: 2 })).toBe('sheet_limit');
    expect(await codeOf(zip, { columns: 1 })).toBe('sheet_limit');
    const far = '<row r="1"><c r="XFD1"><v>1</v></c></row>';
    const wide = await zipOf(plainParts({ 'xl/worksheets/sheet1.xml': sheetXml(far) }));
    expect(await codeOf(wide)).toBe('sheet_limit');
  });
});
