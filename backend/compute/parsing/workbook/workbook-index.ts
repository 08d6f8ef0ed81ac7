import { posix } from 'node:path';
import { attributeNamed, type XmlHandler } from './read-xml';

export interface SheetEntry {
  readonly name: string;
  readonly isHidden: boolean;
  readonly relationId: string;
}

/** Reads xl/workbook.xml: the sheets in their order, and which calendar days are counted by. */
export class WorkbookIndex implements XmlHandler {
  readonly sheets: SheetEntry[] = [];
  isFrom1904 = false;

  readonly open = (name: string, attributes: Readonly<Record<string, string>>): void => {
    if (name === 'workbookPr') {
      this.isFrom1904 = ['1', 'true'].includes(attributeNamed(attributes, 'date1904') ?? '');
    } else if (name === 'sheet') {
      this.sheets.push({
        name: attributeNamed(attributes, 'name') ?? '',
        isHidden: (attributeNamed(attributes, 'state') ?? 'visible') !== 'visible',
        relationId: attributeNamed(attributes, 'id') ?? '',
      });
    }
  };
}

/** Reads xl/_rels/workbook.xml.rels: where the parts stand, by relation. */
export class WorkbookRelations implements XmlHandler {
  /** Paths of sheets of cells; chart sheets are none. */
  readonly sheetPaths = new Map<string, string>();
  stylesPath: string | undefined;
  sharedStringsPath: string | undefined;

  readonly open = (name: string, attributes: Readonly<Record<string, string>>): void => {
    if (name !== 'Relationship') return;
    const type = attributeNamed(attributes, 'Type') ?? '';
    const path = pathOf(attributeNamed(attributes, 'Target') ?? '');
    if (type.endsWith('/worksheet'))
      this.sheetPaths.set(attributeNamed(attributes, 'Id') ?? '', path);
    else if (type.endsWith('/styles')) this.stylesPath = path;
    else if (type.endsWith('/sharedStrings')) this.sharedStringsPath = path;
  };
}

/** Targets stand relative to the workbook or, with a slash, to the whole file. */
function pathOf(target: string): string {
  return posix.join('/xl', target.startsWith('/') ? posix.join('..', target) : target).slice(1);
}
