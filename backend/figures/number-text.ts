/** How a person wants negative numbers in columns. */
export type NegativeStyle = 'minus' | 'parentheses';

export type MoneyUnit = 'units' | 'thousands' | 'millions' | 'billions';

/** How many units of the currency one of each is. */
export const unitFactors: Readonly<Record<MoneyUnit, number>> = {
  units: 1,
  thousands: 1e3,
  millions: 1e6,
  billions: 1e9,
};

const unitMarks: Readonly<Record<MoneyUnit, string>> = {
  units: '',
  thousands: ' k',
  millions: ' m',
  billions: ' bn',
};

export const missingText = 'n/a';
export const zeroText = '–';
const minus = '\u2212';
const mostDigits = 12;

/** The unit as it stands once in a header: `EUR m`. */
export function unitText(currency: string, unit: MoneyUnit): string {
  return currency + unitMarks[unit];
}

/** What an amount in `from` has to be multiplied by to be shown in `to`. */
export function unitRatio(from: MoneyUnit, to: MoneyUnit): number {
  return unitFactors[from] / unitFactors[to];
}

/**
 * Digits after the point that show `value` at so many significant digits; negative when it is to be rounded to
 * tens, hundreds and so on: 2407 at 3 gives −1. Zero and what is not finite give 0.
 */
export function digitsFor(value: number, significant: number): number {
  if (value === 0 || !Number.isFinite(value)) return 0;
  const exponent = Number(
    Math.abs(value)
      .toExponential(significant - 1)
      .split('e')[1],
  );
  return Math.min(mostDigits, significant - 1 - exponent);
}

/**
 * One number of digits for a column, so that its decimals align: the largest magnitude keeps `significant` digits,
 * and no whole number is rounded away.
 */
export function columnDigits(values: readonly (number | null)[], significant: number): number {
  let largest = 0;
  for (const value of values)
    if (value !== null && Number.isFinite(value)) largest = Math.max(largest, Math.abs(value));
  return Math.max(0, digitsFor(largest, significant));
}

/**
 * Digits for an estimate with its bounds: the estimate keeps `significant` digits, unless its interval is so wide
 * that they would say nothing; then the interval decides.
 */
export function intervalDigits(
  estimate: number,
  low: number | null,
  high: number | null,
  significant: number,
): number {
  const halfWidth = low === null || high === null ? 0 : (high - low) / 2;
  return digitsFor(Math.max(Math.abs(estimate), halfWidth / 10), significant);
}

const formats = new Map<string, Intl.NumberFormat>();

function formatOf(locale: string, digits: number): Intl.NumberFormat {
  const key = `${locale} ${digits}`;
  let format = formats.get(key);
  if (format === undefined) {
    format = new Intl.NumberFormat(locale, {
      minimumFractionDigits: digits,
      maximumFractionDigits: digits,
    });
    formats.set(key, format);
  }
  return format;
}

function magnitudeText(value: number, digits: number, locale: string): string {
  const magnitude = Math.abs(value);
  if (digits >= 0) return formatOf(locale, digits).format(magnitude);
  const step = 10 ** -digits;
  return formatOf(locale, 0).format(Math.round(magnitude / step) * step);
}

function isShownAsZero(text: string): boolean {
  return !/[1-9]/.test(text);
}

/** A signed number with thousands separated and U+2212 before a negative; zero is `0`. For axes, bounds and prose. */
export function fixedText(value: number, digits: number, locale = 'en'): string {
  if (!Number.isFinite(value)) return missingText;
  const text = magnitudeText(value, digits, locale);
  return value < 0 && !isShownAsZero(text) ? minus + text : text;
}

/** A number of a column: negatives as the person wants them, exact zero `–`, missing `n/a`. */
export function columnText(
  value: number | null | undefined,
  digits: number,
  negatives: NegativeStyle,
  locale = 'en',
): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return missingText;
  if (value === 0) return zeroText;
  const text = fixedText(value, digits, locale);
  return text.startsWith(minus) && negatives === 'parentheses' ? `(${text.slice(1)})` : text;
}

/** `2,407 (1,275 to 3,539)`. Prose always writes the minus sign: parentheses stand for the interval here. */
export function intervalText(
  estimate: number,
  low: number | null,
  high: number | null,
  digits: number,
  locale = 'en',
): string {
  const text = fixedText(estimate, digits, locale);
  if (low === null || high === null) return `${text} (no interval)`;
  return `${text} (${boundsText(low, high, digits, locale)})`;
}

/** `1,275 to 3,539`. */
export function boundsText(low: number, high: number, digits: number, locale = 'en'): string {
  return `${fixedText(low, digits, locale)} to ${fixedText(high, digits, locale)}`;
}

/** Every digit that tells the number from its neighbours, thousands separated. For the drawer. */
export function fullText(value: number | null, locale = 'en'): string {
  if (value === null || !Number.isFinite(value)) return missingText;
  const magnitude = Math.abs(value);
  const shortest = String(magnitude);
  if (shortest.includes('e')) return (value < 0 ? minus : '') + shortest.replace('e-', `e${minus}`);
  const [whole, fraction] = shortest.split('.');
  const text =
    formatOf(locale, 0).format(BigInt(whole)) + (fraction === undefined ? '' : `.${fraction}`);
  return value < 0 ? minus + text : text;
}

/** Digits that tell an axis' ticks apart. */
export function tickDigits(step: number): number {
  if (!(step > 0) || !Number.isFinite(step)) return 0;
  return Math.min(mostDigits, Math.max(0, -Math.floor(Math.log10(step) + 1e-9)));
}
