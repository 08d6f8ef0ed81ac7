import { FileRefusal } from '../file-refusal';
import { attributeNamed, type XmlHandler } from './read-xml';

/** Parts by path, lower case, that run or fetch something. */
const activeParts: readonly (readonly [RegExp, string])[] = [
  [/(^|\/)vbaproject[^/]*\.bin$/u, 'macros'],
  [/^xl\/(macrosheets|dialogsheets|intlmacrosheets)\//u, 'macro sheets'],
  [/^xl\/externallinks\//u, 'links to other workbooks'],
  [/^xl\/(embeddings|activex)\//u, 'embedded objects'],
  [/(^|\/)oleobject[^/]*\.bin$/u, 'embedded objects'],
];

/** @throws {FileRefusal} 'xlsx_active_content' for macros, links to other workbooks and embedded objects, by path. */
export function refuseActiveParts(paths: readonly string[]): void {
  for (const path of paths) {
    const part = activeParts.find(([pattern]) => pattern.test(path.toLowerCase()));
    if (part !== undefined) throw refusal(part[1]);
  }
}

const activeTypes: readonly (readonly [RegExp, string])[] = [
  [/macroenabled|vbaproject|macrosheet|dialogsheet/iu, 'macros'],
  [/externallink/iu, 'links to other workbooks'],
  [/oleobject|activex/iu, 'embedded objects'],
];

/** Reads [Content_Types].xml: a part may be active by its type whatever its path. */
export const contentTypesGuard: XmlHandler = {
  open: (_, attributes) => {
    const contentType = attributeNamed(attributes, 'ContentType') ?? '';
    const type = activeTypes.find(([pattern]) => pattern.test(contentType));
    if (type !== undefined) throw refusal(type[1]);
  },
};

/** Reads relationships: of what stands outside the file only addresses to click on are let through. */
export const relationshipsGuard: XmlHandler = {
  open: (name, attributes) => {
    if (name !== 'Relationship') return;
    const type = attributeNamed(attributes, 'Type') ?? '';
    const active = activeTypes.find(([pattern]) => pattern.test(type));
    if (active !== undefined) throw refusal(active[1]);
    const isOutside = attributeNamed(attributes, 'TargetMode')?.toLowerCase() === 'external';
    if (isOutside && !type.endsWith('/hyperlink')) throw refusal('links to other files');
  },
};

function refusal(what: string): FileRefusal {
  return new FileRefusal(
    'xlsx_active_content',
    `expected a workbook of plain cells; found ${what}. Save a copy that holds values only and choose that file`,
  );
}
