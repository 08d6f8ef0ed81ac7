import { parseFiscalYear } from '../parse-year';

/** A header of a wide table: a fiscal year, and the variable where it names one. */
export interface YearLabel {
  /** The year as it is written, without `A` for an actual figure: `2023`, `FY23`, `2023/24`, `2023-12-31`. */
  readonly text: string;
  /** Calendar year that the fiscal year ends in. */
  readonly year: number;
  /** 1 to 12; null where the header does not say. */
  readonly month: number | null;
  /** What stands beside the year; empty for a year alone. */
  readonly variable: string;
}

/** A longer text names no column. */
const longestHeader = 500;

const span = '(?:\\s?[/–-]\\s?(?:\\d{4}|\\d{2}))?';
const tokens = [
  '\\d{4}[-/.]\\d{1,2}[-/.]\\d{1,2}',
  '\\d{1,2}[-/.]\\d{1,2}[-/.]\\d{4}',
  `(?:FY|GJ)[\\s_-]*['’]?(?:\\d{4}|\\d{2})${span}`,
  `\\d{4}${span}(?:[.,]0+)?`,
].join('|');
/** A letter behind the digits makes it another thing, as 2023E, an estimate; A stands for an actual figure. */
const apart = new RegExp(`(?<![\\p{L}\\p{N}])(${tokens})A?(?![\\p{L}\\p{N}])`, 'giu');
const behindLetters = /(?<=\p{L}{2})(\d{4})A?(?![\p{L}\p{N}])/gu;

const notActual =
  /(?<!\p{L})(e|est|estimates?|estimated|f|fc|fcst|forecast|p|proj|projected|projection|plan|planned|budget|prognose|erwartet|geplant|ytd|ltm|ttm)(?!\p{L})/iu;
const partOfYear = /(?<![\p{L}\p{N}])([QH][1-4]|[1-4][QH])(?![\p{L}\p{N}])/iu;

/**
 * Reads a header that holds one fiscal year from 1800 to 2200, with a variable on either side or alone.
 *
 * @returns undefined for any other header: without a year, with two, of an estimate or of a part of a year.
 */
export function yearLabel(header: string): YearLabel | undefined {
  if (header.length > longestHeader) return undefined;
  const found = [...header.matchAll(apart)];
  const matches = found.length > 0 ? found : [...header.matchAll(behindLetters)];
  if (matches.length !== 1) return undefined;
  const [whole, text] = matches[0];
  const fiscalYear = parseFiscalYear(text);
  if (fiscalYear === undefined || fiscalYear === null) return undefined;
  const { endYear, endMonth } = fiscalYear;
  if (endYear < 1800 || endYear > 2200) return undefined;
  const before = header.slice(0, matches[0].index);
  const after = header.slice(matches[0].index + whole.length);
  if (notActual.test(after) || partOfYear.test(`${before} ${after}`)) return undefined;
  const variable = tidied(`${before} ${after}`);
  if (variable !== '' && !/\p{L}/u.test(variable)) return undefined;
  return { text, year: endYear, month: endMonth, variable };
}

/** Without empty brackets and without separators at either end. */
function tidied(text: string): string {
  return text
    .replace(/\(\s*\)|\[\s*\]/gu, ' ')
    .replace(/\s+/gu, ' ')
    .replace(/^[\s_\-–—:,;/|.]+|[\s_\-–—:,;/|.]+$/gu, '');
}
