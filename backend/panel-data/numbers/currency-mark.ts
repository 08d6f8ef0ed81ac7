import { isCurrencyCode } from './currency-code';
import { bareNumber } from './bare-number';

/** The sign or code of a currency that stands at a number, as `€`, `US$`, `kr` or `EUR`; null where none does. */
export function currencyMark(text: string): string | null {
  return bareNumber(text.trim()).currency;
}

/** Whether a number is written as a share, as `12%`. */
export function isPercent(text: string): boolean {
  return bareNumber(text.trim()).isPercent;
}

/**
 * Whether an amount with this sign or code may be one in the currency. A code is one currency; a sign can be that of
 * several: `$` of each dollar and many a peso, `kr` of each crown of the north. `US$` and `A$` are those dollars whose
 * code begins so. Which sign a currency has, the Unicode locale data of the runtime say.
 *
 * @param currency  code of ISO 4217.
 */
export function mayStandFor(mark: string, currency: string): boolean {
  if (mark === currency) return true;
  if (isCurrencyCode(mark) || !/^[A-Z]{3}$/u.test(currency)) return false;
  const sign = mark.normalize('NFKC').replace(/\.$/u, '');
  const narrow = signOf(currency, 'narrowSymbol');
  if (sign === narrow || sign === signOf(currency, 'symbol')) return true;
  const letters = /^[A-Z]{1,2}(?=\p{Sc})/u.exec(sign)?.[0];
  return (
    letters !== undefined && currency.startsWith(letters) && sign.slice(letters.length) === narrow
  );
}

function signOf(currency: string, currencyDisplay: 'symbol' | 'narrowSymbol'): string | undefined {
  const parts = new Intl.NumberFormat('en', { style: 'currency', currency, currencyDisplay });
  return parts.formatToParts(0).find(({ type }) => type === 'currency')?.value;
}
