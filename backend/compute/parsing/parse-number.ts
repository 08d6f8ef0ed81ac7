import { isMissing } from './missing-cell';

/** The sign before the decimals; the other one, blanks and apostrophes may stand between thousands. */
export type DecimalSign = '.' | ',';

const patterns: Readonly<Record<DecimalSign, RegExp>> = {
  '.': /^(?:\d+\.?\d*|\.\d+|\d{1,3}([,’' \u00a0\u202f])\d{3}(?:\1\d{3})*(?:\.\d*)?)(?:[eE][+-]?\d+)?$/u,
  ',': /^(?:\d+,?\d*|,\d+|\d{1,3}([.’' \u00a0\u202f])\d{3}(?:\1\d{3})*(?:,\d*)?)(?:[eE][+-]?\d+)?$/u,
};

/**
 * Reads a number as people write it: `1234.5`, `1,234.5`, `1.234,5` with a decimal comma, `(1,234)` and `1,234-` as
 * negatives, `1e3`.
 *
 * @returns the number, NaN for a missing value, undefined for any other text.
 */
export function parseNumber(text: string, decimalSign: DecimalSign = '.'): number | undefined {
  if (isMissing(text)) return NaN;
  const { digits, isNegative } = withoutSign(text.trim());
  if (!patterns[decimalSign].test(digits)) return undefined;
  const plain =
    decimalSign === '.'
      ? digits.replace(/[,’' \u00a0\u202f]/gu, '')
      : digits.replace(/[.’' \u00a0\u202f]/gu, '').replace(',', '.');
  const value = Number(plain);
  if (!Number.isFinite(value)) return undefined;
  return isNegative ? -value : value;
}

/** Takes one sign off: in front, behind, or as brackets. */
export function withoutSign(text: string): { digits: string; isNegative: boolean } {
  const inBrackets = /^\((.*)\)$/u.exec(text);
  if (inBrackets !== null) return { digits: inBrackets[1].trim(), isNegative: true };
  if (/^[-−–]/u.test(text)) return { digits: text.slice(1).trimStart(), isNegative: true };
  if (/[-−–]$/u.test(text)) return { digits: text.slice(0, -1).trimEnd(), isNegative: true };
  return { digits: text.startsWith('+') ? text.slice(1) : text, isNegative: false };
}
