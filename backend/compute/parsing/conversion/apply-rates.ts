import type { MoneyColumn } from './money-columns';
import type { CurrencyYear, RowCurrencies } from './row-currencies';

/** A currency and year with how many figures want for each kind of rate. */
export interface LackingRate extends CurrencyYear {
  readonly flows: number;
  readonly stocks: number;
}

/**
 * Multiplies money by the rate of its row, in place: flows by the average rate, stocks by the year-end one. Money
 * without a rate, or in a currency that cannot be read, becomes NaN.
 *
 * @param values  values[column][placed row].
 * @returns the currencies and years without the rates that their money needs.
 */
export function applyRates(
  values: readonly Float64Array[],
  columns: readonly MoneyColumn[],
  { currencyYears, position }: RowCurrencies,
): readonly LackingRate[] {
  const average = Float64Array.from(currencyYears, (pair) => pair.average);
  const yearEnd = Float64Array.from(currencyYears, (pair) => pair.yearEnd);
  const flows = new Int32Array(currencyYears.length);
  const stocks = new Int32Array(currencyYears.length);
  columns.forEach(({ measure }, k) => {
    if (measure === 'no-money') return;
    const rates = measure === 'flow' ? average : yearEnd;
    const lacking = measure === 'flow' ? flows : stocks;
    const column = values[k];
    for (let row = 0; row < column.length; row++) {
      if (Number.isNaN(column[row])) continue;
      const rate = position[row] === -1 ? NaN : rates[position[row]];
      if (Number.isNaN(rate) && position[row] !== -1) lacking[position[row]] += 1;
      column[row] *= rate;
    }
  });
  return currencyYears
    .map((pair, index) => ({ ...pair, flows: flows[index], stocks: stocks[index] }))
    .filter((pair) => pair.flows > 0 || pair.stocks > 0);
}
