import { isMissing } from '../../panel-data/numbers/missing-cell';
import { type DateOrder, fullYear, parseDate } from './parse-date';

/** A company's fiscal year by when it ends. */
export interface FiscalYear {
  readonly endYear: number;
  /** 1 to 12; null where the text does not say. */
  readonly endMonth: number | null;
}

const prefix = "(?:(FY|GJ)[\\s_-]*['’]?)";
const label = new RegExp(`^${prefix}?(\\d{1,4})(?:[.,]0+)?$`, 'iu');
const span = new RegExp(`^${prefix}?(\\d{4})\\s?[/–-]\\s?(\\d{4}|\\d{2})$`, 'iu');
const shortSpan = new RegExp(`^${prefix}(\\d{2})\\s?[/–-]\\s?(\\d{2})$`, 'iu');

/**
 * Reads a fiscal year: `2023`, `2023.0`, `FY2023`, `GJ 2023`; `FY23` with two digits for 1980 to 2079 and only behind
 * such a prefix; `2023/24`, `2023-24`, `2023/2024` for the one that ends in 2024; and the date of its end, as in
 * `parseDate`.
 *
 * @param order  how `03/04/2024` is read.
 * @returns null where it is missing, undefined for any other text.
 */
export function parseFiscalYear(
  text: string,
  order: DateOrder = 'day-first',
): FiscalYear | null | undefined {
  if (isMissing(text)) return null;
  const trimmed = text.trim();
  const named = label.exec(trimmed);
  if (named !== null) {
    const [, isPrefixed, digits] = named;
    return {
      endYear: isPrefixed === undefined ? Number(digits) : fullYear(digits),
      endMonth: null,
    };
  }
  const twoYears = span.exec(trimmed) ?? shortSpan.exec(trimmed);
  if (twoYears !== null) return endOfSpan(twoYears[2], twoYears[3]);
  const date = parseDate(trimmed, order);
  return date === undefined ? undefined : { endYear: date.year, endMonth: date.month };
}

/**
 * The calendar year in which a fiscal year ends.
 *
 * @returns the year, NaN where it is missing, undefined for any other text.
 */
export function parseYear(text: string): number | undefined {
  const fiscalYear = parseFiscalYear(text);
  return fiscalYear === null ? NaN : fiscalYear?.endYear;
}

/** Only of two years that follow each other. */
function endOfSpan(first: string, second: string): FiscalYear | undefined {
  const endYear = fullYear(first) + 1;
  const isNext =
    second.length === 4 ? Number(second) === endYear : Number(second) === endYear % 100;
  return isNext ? { endYear, endMonth: null } : undefined;
}
