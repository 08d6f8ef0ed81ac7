import { buffer } from 'node:stream/consumers';
import { ZipFile } from 'yazl';

export type Parts = Readonly<Record<string, string | Buffer>>;

const main = 'application/vnd.openxmlformats-officedocument.spreadsheetml';
const officeRelations = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';

export const contentTypes = (sheetType = `${main}.sheet.main+xml`): string =>
  `<?xml version="1.0" encoding="UTF-8"?><Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types"><Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/><Default Extension="xml" ContentType="application/xml"/><Override PartName="/xl/workbook.xml" ContentType="${sheetType}"/></Types>`;

export const relationships = (...items: readonly string[]): string =>
  `<?xml version="1.0"?><Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships">${items.join('')}</Relationships>`;

export const relationship = (id: string, type: string, target: string, mode?: 'External'): string =>
  `<Relationship Id="${id}" Type="${officeRelations}/${type}" Target="${target}"${mode === undefined ? '' : ` TargetMode="${mode}"`}/>`;

/** A sheet's XML around its rows. */
export const sheetXml = (rows: string): string =>
  `<?xml version="1.0"?><worksheet xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main"><sheetData>${rows}</sheetData></worksheet>`;

export const workbookXml = (names: readonly string[], properties = ''): string =>
  `<?xml version="1.0"?><workbook xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main" xmlns:r="${officeRelations}">${properties}<sheets>${names.map((name, index) => `<sheet name="${name}" sheetId="${index + 1}" r:id="rId${index + 1}"/>`).join('')}</sheets></workbook>`;

const plainRows =
  '<row r="1"><c r="A1" t="inlineStr"><is><t>Company</t></is></c><c r="B1" t="inlineStr"><is><t>Year</t></is></c><c r="C1" t="inlineStr"><is><t>Capex</t></is></c></row>' +
  '<row r="2"><c r="A2" t="inlineStr"><is><t>Alder</t></is></c><c r="B2"><v>2020</v></c><c r="C2"><v>12.5</v></c></row>';

/** The parts of a small workbook of one sheet; parts given replace or join them. */
export function plainParts(others: Parts = {}): Parts {
  return {
    '[Content_Types].xml': contentTypes(),
    'xl/workbook.xml': workbookXml(['Data']),
    'xl/_rels/workbook.xml.rels': relationships(
      relationship('rId1', 'worksheet', 'worksheets/sheet1.xml'),
    ),
    'xl/worksheets/sheet1.xml': sheetXml(plainRows),
    ...others,
  };
}

/** Zips parts as they are given, so that a workbook can be made that no program would write. */
export async function zipOf(parts: Parts, options = { compress: true }): Promise<Buffer> {
  const zip = new ZipFile();
  for (const [path, content] of Object.entries(parts))
    zip.addBuffer(Buffer.from(content as string), path, options);
  zip.end();
  return buffer(zip.outputStream);
}

/** A copy of a zip in which a part declares another unpacked size than it has. */
export function declaringSize(zip: Buffer, path: string, bytes: number): Buffer {
  const copy = Buffer.from(zip);
  const centralHeader = Buffer.from([0x50, 0x4b, 0x01, 0x02]);
  for (let at = copy.indexOf(centralHeader); at !== -1; at = copy.indexOf(centralHeader, at + 4)) {
    const nameLength = copy.readUInt16LE(at + 28);
    const name = copy.toString('utf8', at + 46, at + 46 + nameLength);
    if (name === path) copy.writeUInt32LE(bytes, at + 24);
  }
  return copy;
}
