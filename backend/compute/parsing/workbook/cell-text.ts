/** What a cell of a sheet holds as XML says it. */
export interface CellSource {
  /** The attribute `t`; a number where it is absent. */
  readonly type: string | undefined;
  readonly value: string;
  readonly isDate: boolean;
}

export interface CellContext {
  readonly sharedTexts: readonly string[];
  /** Whether the workbook counts its days from 1904. */
  readonly isFrom1904: boolean;
}

/** What a cell says. */
export interface CellContent {
  readonly text: string;
  /** Whether the text is a number that is stored as one and shows no date. */
  readonly isNumber: boolean;
}

/**
 * The text of a cell, never a formatted one: numbers with all their digits and a decimal point, dates as yyyy-mm-dd,
 * errors as they show.
 */
export function cellContent(
  { type, value, isDate }: CellSource,
  context: CellContext,
): CellContent {
  switch (type) {
    case 's':
      return plainText(context.sharedTexts[Number(value)] ?? '');
    case 'b':
      return plainText(value.trim() === '1' ? 'TRUE' : 'FALSE');
    case 'd':
      return plainText(value.slice(0, 10));
    case undefined:
    case 'n':
      return numberContent(value, isDate, context.isFrom1904);
    default:
      return plainText(value);
  }
}

function plainText(text: string): CellContent {
  return { text, isNumber: false };
}

function numberContent(value: string, isDate: boolean, isFrom1904: boolean): CellContent {
  const number = Number(value);
  if (value.trim() === '' || !Number.isFinite(number)) return plainText(value.trim());
  const date = isDate ? dateText(number, isFrom1904) : undefined;
  if (date !== undefined) return plainText(date);
  return { text: Object.is(number, -0) ? '-0' : String(number), isNumber: true };
}

const msPerDay = 86_400_000;

/** Day 1 is 1 January 1900 or 2 January 1904; the first calendar has a 29 February 1900, day 60, that never was. */
function dateText(serial: number, isFrom1904: boolean): string | undefined {
  const day = Math.floor(serial);
  if (day < 1 || day > 2_958_465) return undefined;
  const start = isFrom1904 ? Date.UTC(1904, 0, 1) : Date.UTC(1899, 11, day < 60 ? 31 : 30);
  return new Date(start + day * msPerDay).toISOString().slice(0, 10);
}
