import { monthOfName } from './month-names';

/** Which of two numbers before a year is the day: `31/03/2024` or `03/31/2024`. */
export type DateOrder = 'day-first' | 'month-first';

export interface YearAndMonth {
  readonly year: number;
  /** 1 to 12. */
  readonly month: number;
}

const time =
  '(?:[T ]\\d{1,2}:\\d{2}(?::\\d{2}(?:[.,]\\d+)?)?(?: ?[AaPp][Mm])?(?:Z|[+-]\\d{2}:?\\d{2})?)?';
const yearFirst = new RegExp(`^(\\d{4})([-/.])(\\d{1,2})\\2(\\d{1,2})${time}$`, 'u');
const yearLast = new RegExp(`^(\\d{1,2})([./-])(\\d{1,2})\\2(\\d{4}|\\d{2})${time}$`, 'u');
const dayAndName = /^(\d{1,2})(?:\.|st|nd|rd|th)?[\s-]*(\p{L}+)\.?[\s,-]*(\d{4}|\d{2})$/u;
const nameAndDay = /^(\p{L}+)\.?\s*(\d{1,2})(?:st|nd|rd|th)?,?\s+(\d{4})$/u;
const nameAlone = /^(\p{L}+)\.?[\s,'’-]*(\d{4}|\d{2})$/u;

/**
 * Year and month of a date as it is written, whatever the time zone: `2024-03-31`, `2024-03-31T00:00:00Z`,
 * `31.03.2024`, `31/03/2024`, `31 March 2024`, `31. März 2024`, `March 31, 2024`, `Mar 2024`.
 *
 * @param order  how `03/04/2024` is read; with dots the day always comes first.
 * @returns undefined for any other text, and for a day that its month does not have.
 */
export function parseDate(text: string, order: DateOrder): YearAndMonth | undefined {
  const iso = yearFirst.exec(text);
  if (iso !== null) return dateOf(iso[1], Number(iso[3]), iso[4]);
  const numeric = yearLast.exec(text);
  if (numeric !== null) {
    const [, first, separator, second, year] = numeric;
    return order === 'day-first' || separator === '.'
      ? dateOf(year, Number(second), first)
      : dateOf(year, Number(first), second);
  }
  const words = text.normalize('NFC');
  const withDay = dayAndName.exec(words);
  if (withDay !== null) return dateOf(withDay[3], monthOfName(withDay[2]), withDay[1]);
  const american = nameAndDay.exec(words);
  if (american !== null) return dateOf(american[3], monthOfName(american[1]), american[2]);
  const named = nameAlone.exec(words);
  return named === null ? undefined : dateOf(named[2], monthOfName(named[1]), '1');
}

/** What a date says of the order of its column: nothing where both are possible or only one is at all. */
export function orderIn(text: string): DateOrder | 'either' | undefined {
  const numeric = yearLast.exec(text);
  if (numeric === null || numeric[2] === '.') return undefined;
  const isDayFirst = parseDate(text, 'day-first') !== undefined;
  const isMonthFirst = parseDate(text, 'month-first') !== undefined;
  if (isDayFirst && isMonthFirst) {
    return Number(numeric[1]) === Number(numeric[3]) ? undefined : 'either';
  }
  if (isDayFirst) return 'day-first';
  return isMonthFirst ? 'month-first' : undefined;
}

/** Two digits stand for 1980 to 2079. */
export function fullYear(digits: string): number {
  const year = Number(digits);
  if (digits.length !== 2) return year;
  return year < 80 ? 2000 + year : 1900 + year;
}

function dateOf(
  yearDigits: string,
  month: number | undefined,
  dayDigits: string,
): YearAndMonth | undefined {
  if (month === undefined || month < 1 || month > 12) return undefined;
  const year = fullYear(yearDigits);
  const day = Number(dayDigits);
  const lastDay = new Date(Date.UTC(year, month, 0)).getUTCDate();
  return day < 1 || day > lastDay ? undefined : { year, month };
}
