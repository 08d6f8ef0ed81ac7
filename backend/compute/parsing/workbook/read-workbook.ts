import { FileRefusal } from '../file-refusal';
import type { Grid } from '../grid';
import { type TableLimits, tableLimits } from '../table';
import { contentTypesGuard, refuseActiveParts, relationshipsGuard } from './active-content';
import { DateStyles } from './date-styles';
import { readXml, type XmlHandler } from './read-xml';
import { SharedStrings } from './shared-strings';
import { CellBudget, SheetBuilder } from './sheet-builder';
import { SheetHandler } from './sheet-handler';
import { WorkbookIndex, WorkbookRelations } from './workbook-index';
import { ZipPackage } from './zip-package';

export interface Sheet {
  readonly name: string;
  readonly isHidden: boolean;
  readonly grid: Grid;
}

export const workbookLimits: TableLimits & { readonly sheets: number } = {
  ...tableLimits,
  cells: 1_000_000,
  sheets: 20,
};

const contentTypesPath = '[Content_Types].xml';
const workbookPath = 'xl/workbook.xml';
const relationsPath = 'xl/_rels/workbook.xml.rels';

/**
 * Reads the sheets of an .xlsx workbook as texts. Every XML part is unpacked and looked through, also those that hold
 * no cells; nothing in it is evaluated or fetched.
 *
 * @returns sheets in the workbook's order, hidden ones too; of merged cells only the first holds the text.
 * @throws {FileRefusal} 'type_not_allowed', 'zip_limit', 'xlsx_active_content' or 'sheet_limit'.
 */
export async function readWorkbook(bytes: Uint8Array, limits = workbookLimits): Promise<Sheet[]> {
  const parts = await ZipPackage.open(bytes);
  for (const path of [contentTypesPath, workbookPath, relationsPath])
    if (!parts.has(path))
      throw new FileRefusal(
        'type_not_allowed',
        `expected an .xlsx workbook; found a zip without ${path}`,
      );
  refuseActiveParts(parts.paths);
  const read = new Set<string>();
  const readPart = async (path: string, handler?: XmlHandler): Promise<void> => {
    read.add(path);
    await readXml(path, parts.unpack(path), handler);
  };
  await readPart(contentTypesPath, contentTypesGuard);
  for (const path of parts.paths.filter((it) => it.endsWith('.rels') && it !== relationsPath))
    await readPart(path, relationshipsGuard);
  const relations = new WorkbookRelations();
  await readPart(relationsPath, both(relationshipsGuard, relations));
  const index = new WorkbookIndex();
  await readPart(workbookPath, index);
  const entries = index.sheets.flatMap((sheet) => {
    const path = relations.sheetPaths.get(sheet.relationId);
    return path === undefined ? [] : [{ ...sheet, path }];
  });
  refuseSheetCount(entries.length, limits.sheets);

  const styles = new DateStyles();
  if (relations.stylesPath !== undefined) await readPart(relations.stylesPath, styles);
  const strings = new SharedStrings();
  if (relations.sharedStringsPath !== undefined)
    await readPart(relations.sharedStringsPath, strings);
  const context = {
    sharedTexts: strings.texts,
    isFrom1904: index.isFrom1904,
    dateStyles: styles.indices,
  };
  const budget = new CellBudget(limits);
  const sheets: Sheet[] = [];
  for (const { name, isHidden, path } of entries) {
    const builder = new SheetBuilder(name, budget);
    await readPart(path, new SheetHandler(builder, context));
    sheets.push({ name, isHidden, grid: builder.finish() });
  }
  for (const path of parts.paths) if (!read.has(path)) await lookThrough(parts, path);
  return sheets;
}

/** Parts without cells: XML is read for what it must not hold, anything else unpacked for its size. */
async function lookThrough(parts: ZipPackage, path: string): Promise<void> {
  const chunks = parts.unpack(path);
  if (path.toLowerCase().endsWith('.xml')) return readXml(path, chunks);
  let chunk = await chunks.next();
  while (chunk.done !== true) chunk = await chunks.next();
}

function both(first: XmlHandler, second: XmlHandler): XmlHandler {
  return {
    open: (name, attributes) => {
      first.open?.(name, attributes);
      second.open?.(name, attributes);
    },
  };
}

function refuseSheetCount(count: number, most: number): void {
  if (count > most)
    throw new FileRefusal(
      'sheet_limit',
      `expected a workbook of at most ${most} sheets; found ${count}`,
    );
  if (count === 0)
    throw new FileRefusal(
      'type_not_allowed',
      'expected a workbook with a sheet of cells; found none',
    );
}
