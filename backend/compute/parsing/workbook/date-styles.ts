import { attributeNamed, type XmlHandler } from './read-xml';

/** Formats of the standard (ECMA-376 part 1, 18.8.30) that show a day, month or year. */
const builtInDates = new Set([
  14, 15, 16, 17, 22, 27, 28, 29, 30, 31, 36, 50, 51, 52, 53, 54, 57, 58,
]);

/** Reads styles.xml: which cell styles show a number as a date. */
export class DateStyles implements XmlHandler {
  /** Indices of cell formats, as the attribute `s` of a cell gives them. */
  readonly indices = new Set<number>();
  readonly #customDates = new Map<number, boolean>();
  #isInCellFormats = false;
  #count = 0;

  readonly open = (name: string, attributes: Readonly<Record<string, string>>): void => {
    if (name === 'numFmt') {
      const code = attributeNamed(attributes, 'formatCode') ?? '';
      this.#customDates.set(Number(attributeNamed(attributes, 'numFmtId')), isDateFormat(code));
    } else if (name === 'cellXfs') {
      this.#isInCellFormats = true;
    } else if (name === 'xf' && this.#isInCellFormats) {
      const id = Number(attributeNamed(attributes, 'numFmtId') ?? 0);
      if (this.#customDates.get(id) ?? builtInDates.has(id)) this.indices.add(this.#count);
      this.#count += 1;
    }
  };

  readonly close = (name: string): void => {
    if (name === 'cellXfs') this.#isInCellFormats = false;
  };
}

/** Whether a number format shows a year or a day: its letters outside quotes, brackets and escapes say so. */
export function isDateFormat(code: string): boolean {
  const [positive] = code.replace(/"[^"]*"|\[[^\]]*\]|[\\_*]./gu, '').split(';');
  return /[yd]/iu.test(positive) || /^[^hs]*m{3,}[^hs]*$/iu.test(positive);
}
