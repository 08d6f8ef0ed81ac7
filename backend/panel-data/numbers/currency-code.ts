/** The codes of ISO 4217 that the runtime knows, old ones too. */
const codes: ReadonlySet<string> = new Set(Intl.supportedValuesOf('currency'));

/** Whether a text is a currency code of ISO 4217, as `EUR`; `eur` and `GBp` are none. */
export function isCurrencyCode(text: string): boolean {
  return codes.has(text);
}
