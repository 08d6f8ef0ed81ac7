import { bareNumber } from './bare-number';
import { isMissing } from './missing-cell';

/** The sign before the decimals; the other one, blanks and apostrophes may stand between thousands. */
export type DecimalSign = '.' | ',';

/** Blanks of any width and apostrophes. */
const blanks = "’' \\u00a0\\u2007\\u2009\\u202f";
const patterns: Readonly<Record<DecimalSign, RegExp>> = {
  '.': patternOf('\\.', ','),
  ',': patternOf(',', '.'),
};
const separators: Readonly<Record<DecimalSign, RegExp>> = {
  '.': new RegExp(`[,${blanks}]`, 'gu'),
  ',': new RegExp(`[.${blanks}]`, 'gu'),
};
/** Most cells: a number that the language itself reads. */
const plainPattern = /^-?\d+(?:\.\d+)?$/u;

/**
 * Reads a number as people write it: `1234.5`, `1,234.5`, `1.234,5` with a decimal comma, `1 234` and `1’234`,
 * `(1,234)` and `1,234-` as negatives, `1e3`, `12%` as 0.12, and any of them with a currency sign or code, which is
 * passed over: `€1,234`, `1 234 EUR`. Thousands stand in groups of three.
 *
 * @returns the number, NaN for a missing value, undefined for any other text.
 */
export function parseNumber(text: string, decimalSign: DecimalSign = '.'): number | undefined {
  if (decimalSign === '.' && plainPattern.test(text)) return finite(Number(text));
  if (isMissing(text)) return NaN;
  const { digits, isNegative, isPercent } = bareNumber(text.trim());
  const match = patterns[decimalSign].exec(digits);
  if (match === null) return undefined;
  const [, mantissa, , exponent = '0'] = match;
  const plain = mantissa.replace(separators[decimalSign], '').replace(',', '.');
  // The exponent, not a division: 12.3% is the number nearest to 0.123.
  const value = finite(Number(`${plain}e${Number(exponent) - (isPercent ? 2 : 0)}`));
  return isNegative && value !== undefined ? -value : value;
}

function finite(value: number): number | undefined {
  return Number.isFinite(value) ? value : undefined;
}

function patternOf(decimal: string, thousands: string): RegExp {
  const plain = `\\d+${decimal}?\\d*|${decimal}\\d+`;
  const grouped = `\\d{1,3}([${thousands}${blanks}])\\d{3}(?:\\2\\d{3})*(?:${decimal}\\d*)?`;
  return new RegExp(`^(${plain}|${grouped})(?:[eE]([+-]?\\d+))?$`, 'u');
}
