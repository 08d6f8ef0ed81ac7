import { utf16Of } from './utf16';
import { FileRefusal } from './file-refusal';

export type FileKind = 'csv' | 'xlsx';

/**
 * What a file is, by the ending of its name and by its first bytes, which have to agree.
 *
 * @throws {FileRefusal} 'type_not_allowed', or 'xlsx_active_content' for a workbook behind a password.
 */
export function fileKind(bytes: Uint8Array, name: string): FileKind {
  const ending = /\.([^.]*)$/u.exec(name)?.[1].toLowerCase() ?? '';
  const found = formats.find(({ magic }) => magic.every((byte, index) => bytes[index] === byte));
  if (ending === 'xlsx') {
    if (found?.isWorkbook === true) return 'xlsx';
    if (found?.mayBeEncrypted === true)
      throw new FileRefusal(
        'xlsx_active_content',
        'expected a workbook without a password; found an encrypted or older one. Save a copy as .xlsx without a password and choose that file',
      );
    throw refused(
      `expected a workbook, as ${name} says it is; found ${found?.words ?? 'no workbook'}`,
    );
  }
  if (!['csv', 'txt', 'tsv'].includes(ending))
    throw refused(`expected a .csv or .xlsx file; found “${name}”`);
  if (found !== undefined)
    throw refused(`expected text, as ${name} says it is; found ${found.words}`);
  if (bytes.includes(0) && utf16Of(bytes) === undefined)
    throw refused(`expected a text file; found a NUL character in ${name}`);
  return 'csv';
}

const formats: readonly {
  readonly magic: readonly number[];
  readonly words: string;
  readonly isWorkbook?: boolean;
  readonly mayBeEncrypted?: boolean;
}[] = [
  { magic: [0x50, 0x4b, 0x03, 0x04], words: 'a workbook or another zip', isWorkbook: true },
  { magic: [0x50, 0x4b, 0x05, 0x06], words: 'an empty zip' },
  {
    magic: [0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1],
    words: 'an older or encrypted office file',
    mayBeEncrypted: true,
  },
  { magic: [0x25, 0x50, 0x44, 0x46], words: 'a PDF' },
  { magic: [0x1f, 0x8b], words: 'a packed file' },
];

function refused(message: string): FileRefusal {
  return new FileRefusal('type_not_allowed', message);
}
