import type { SeatsReply } from '@contract';

type Money = SeatsReply['invoices'][number]['total'];

/** Minor units as the currency is written: `€267.00`. The number of decimals comes from the currency. */
export function moneyText({ amount, currency }: Money, locale: string): string {
  const format = new Intl.NumberFormat(locale, { style: 'currency', currency });
  const decimals = format.resolvedOptions().maximumFractionDigits ?? 0;
  return format.format(amount / 10 ** decimals);
}
