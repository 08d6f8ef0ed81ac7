import { readBlockText } from '../../ui/block-text';

type Rows = readonly (readonly string[])[];

/** Rows of a block from the clipboard, or of a small CSV file; rows without any text are left aside. */
export function tableOfText(text: string): Rows {
  const plain = text.replace(/^\ufeff/, '');
  const [firstLine] = plain.split(/\r\n?|\n/, 1);
  const block = firstLine.includes('\t')
    ? plain
    : withTabs(plain, firstLine.includes(';') ? ';' : ',');
  return readBlockText(block)
    .map((cells) => cells.map((cell) => cell.trim()))
    .filter((cells) => cells.some((cell) => cell !== ''));
}

/** Tabs in the place of the delimiters outside quotes: then a CSV text is a block of the clipboard. */
function withTabs(text: string, delimiter: string): string {
  let isQuoted = false;
  return Array.from(text, (sign) => {
    if (sign === '"') isQuoted = !isQuoted;
    return sign === delimiter && !isQuoted ? '\t' : sign;
  }).join('');
}
