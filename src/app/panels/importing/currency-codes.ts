export interface CurrencyName {
  readonly code: string;
  readonly name: string;
}

/** The currencies the browser knows, by code. */
export function currencyNames(locale = 'en'): readonly CurrencyName[] {
  const names = new Intl.DisplayNames([locale], { type: 'currency' });
  return Intl.supportedValuesOf('currency').map((code) => ({ code, name: names.of(code) ?? code }));
}

/** Those whose code begins with what was typed or whose name holds it; at most 12, codes first. */
export function matchingCurrencies(
  typed: string,
  all: readonly CurrencyName[],
): readonly CurrencyName[] {
  const text = typed.trim().toLowerCase();
  if (text === '') return all.filter(({ code }) => usual.includes(code));
  const byCode = all.filter(({ code }) => code.toLowerCase().startsWith(text));
  const byName = all.filter(
    (currency) => !byCode.includes(currency) && currency.name.toLowerCase().includes(text),
  );
  return [...byCode, ...byName].slice(0, 12);
}

const usual: readonly string[] = ['CHF', 'CNY', 'EUR', 'GBP', 'JPY', 'SEK', 'USD'];
