import { isCurrencyCode } from './currency-code';

/** The digits of a number with what stands between them, and what stood around them. */
export interface BareNumber {
  readonly digits: string;
  readonly isNegative: boolean;
  readonly isPercent: boolean;
  /** The sign or code of a currency that stood at it, as `€`, `US$`, `kr` or `EUR`. */
  readonly currency: string | null;
}

/** No number is longer; a text that is would take long to look through. */
const longestNumber = 100;

/** Signs that are written in letters. */
const letterSign = /^(kr\.?|zł|Kč|Ft)(?!\p{L})\s*|\s*(?<!\p{L})(kr\.?|zł|Kč|Ft)$/u;

/** Most numbers begin and end with a digit. */
const nothingAround = /^\d(?:.*\d)?$/su;

/**
 * Takes off what stands around a number: one sign in front, behind or as brackets, one currency sign or code, one per
 * cent sign, in any order. What is left need not be a number.
 *
 * @param text  without blanks around it.
 */
export function bareNumber(text: string): BareNumber {
  if (text.length > longestNumber || nothingAround.test(text)) {
    return { digits: text, isNegative: false, isPercent: false, currency: null };
  }
  let digits = text;
  let isNegative = false;
  let isPercent = false;
  let hasSign = false;
  let currency: string | null = null;
  for (;;) {
    const before = digits;
    if (!hasSign) {
      const unsigned = withoutSign(digits);
      hasSign = unsigned.digits !== digits;
      digits = unsigned.digits;
      isNegative = unsigned.isNegative;
    }
    if (currency === null) ({ digits, currency } = withoutCurrency(digits));
    if (!isPercent && digits.endsWith('%')) {
      isPercent = true;
      digits = digits.slice(0, -1).trimEnd();
    }
    if (digits === before) return { digits, isNegative, isPercent, currency };
  }
}

function withoutSign(text: string): { digits: string; isNegative: boolean } {
  const inBrackets = /^\((.*)\)$/u.exec(text);
  if (inBrackets !== null) return { digits: inBrackets[1].trim(), isNegative: true };
  if (/^[-−–]/u.test(text)) return { digits: text.slice(1).trimStart(), isNegative: true };
  if (/[-−–]$/u.test(text)) return { digits: text.slice(0, -1).trimEnd(), isNegative: true };
  return { digits: text.startsWith('+') ? text.slice(1) : text, isNegative: false };
}

/** `€5`, `US$ 5`, `5 kr`, `5 EUR` become `5`. */
function withoutCurrency(text: string): Pick<BareNumber, 'digits' | 'currency'> {
  const sign = /^([A-Z]{0,2}\p{Sc})\s*|\s*(\p{Sc})$/u.exec(text) ?? letterSign.exec(text);
  if (sign !== null) return { digits: text.replace(sign[0], ''), currency: sign[1] ?? sign[2] };
  const code = /^([A-Z]{3})(?![A-Z])\s*|\s*(?<![A-Z])([A-Z]{3})$/u.exec(text);
  const currency = code === null ? undefined : (code[1] ?? code[2]);
  if (code === null || currency === undefined || !isCurrencyCode(currency))
    return { digits: text, currency: null };
  const isInFront = code[1] !== undefined;
  return {
    digits: isInFront ? text.slice(code[0].length) : text.slice(0, -code[0].length),
    currency,
  };
}
