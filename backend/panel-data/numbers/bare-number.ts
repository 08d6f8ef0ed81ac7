import { isCurrencyCode } from './currency-code';

/** The digits of a number with what stands between them, and what stood around them. */
export interface BareNumber {
  readonly digits: string;
  readonly isNegative: boolean;
  readonly isPercent: boolean;
}

/** No number is longer; a text that is would take long to look through. */
const longestNumber = 100;

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
    return { digits: text, isNegative: false, isPercent: false };
  }
  let digits = text;
  let isNegative = false;
  let isPercent = false;
  let hasSign = false;
  let hasCurrency = false;
  for (;;) {
    const before = digits;
    if (!hasSign) {
      const unsigned = withoutSign(digits);
      hasSign = unsigned.digits !== digits;
      digits = unsigned.digits;
      isNegative = unsigned.isNegative;
    }
    if (!hasCurrency) {
      const plain = withoutCurrency(digits);
      hasCurrency = plain !== digits;
      digits = plain;
    }
    if (!isPercent && digits.endsWith('%')) {
      isPercent = true;
      digits = digits.slice(0, -1).trimEnd();
    }
    if (digits === before) return { digits, isNegative, isPercent };
  }
}

function withoutSign(text: string): { digits: string; isNegative: boolean } {
  const inBrackets = /^\((.*)\)$/u.exec(text);
  if (inBrackets !== null) return { digits: inBrackets[1].trim(), isNegative: true };
  if (/^[-−–]/u.test(text)) return { digits: text.slice(1).trimStart(), isNegative: true };
  if (/[-−–]$/u.test(text)) return { digits: text.slice(0, -1).trimEnd(), isNegative: true };
  return { digits: text.startsWith('+') ? text.slice(1) : text, isNegative: false };
}

/** `€5`, `US$ 5`, `5 EUR` become `5`. */
function withoutCurrency(text: string): string {
  const sign = /^[A-Z]{0,2}\p{Sc}\s*|\s*\p{Sc}$/u.exec(text);
  if (sign !== null) return text.replace(sign[0], '');
  const code = /^([A-Z]{3})(?![A-Z])\s*|\s*(?<![A-Z])([A-Z]{3})$/u.exec(text);
  if (code === null || !isCurrencyCode(code[1] ?? code[2])) return text;
  return code[1] === undefined ? text.slice(0, -code[0].length) : text.slice(code[0].length);
}
