import type { CurrencyRate } from '../../file-recipe';
import { isCurrencyCode } from '../../../panel-data/numbers/currency-code';
import { findingAt, type FindingList } from '../finding-list';
import type { Table } from '../table';

/** The rows of one currency and calendar year, which share their rates. */
export interface CurrencyYear {
  readonly currency: string;
  readonly year: number;
  /** NaN where there is none. */
  readonly average: number;
  readonly yearEnd: number;
  /** First of the rows, of the table counted from 0. */
  readonly firstRow: number;
}

export interface RowCurrencies {
  /** Currency of each placed row as the file has it. */
  readonly texts: readonly string[];
  readonly currencyYears: readonly CurrencyYear[];
  /** Position in `currencyYears` by placed row; −1 where its currency cannot be read. */
  readonly position: Int32Array;
}

interface PlacedRows {
  readonly tableRow: Int32Array;
  readonly year: Int32Array;
  readonly hasMoney: (row: number) => boolean;
}

interface CurrencyTerms {
  /** The panel's own currency, which needs no rate. */
  readonly own: string;
  readonly rates: readonly CurrencyRate[];
}

/**
 * Which rates each placed row is converted at: those of its currency in the calendar year that it belongs to. A code is
 * one of ISO 4217 or one that the rates name. Of two rates for one currency and year the later counts.
 *
 * @param rows  the placed ones: row of the table, calendar year, and whether any figure of it is money.
 * @param column  of the table: the currencies.
 * @param findings  is told of every row with money whose currency cannot be read.
 */
export function rowCurrencies(
  table: Table,
  rows: PlacedRows,
  column: number,
  terms: CurrencyTerms,
  findings: FindingList,
): RowCurrencies {
  const rateOf = new Map(terms.rates.map((rate) => [`${rate.currency} ${rate.year}`, rate]));
  const named = new Set([terms.own, ...terms.rates.map(({ currency }) => currency)]);
  const texts: string[] = [];
  const currencyYears: CurrencyYear[] = [];
  const position = new Int32Array(rows.year.length).fill(-1);
  const known = new Map<string, Map<number, number>>();
  rows.tableRow.forEach((tableRow, row) => {
    const currency = table.rows[tableRow][column].trim();
    texts.push(currency);
    if (!named.has(currency) && !isCurrencyCode(currency)) {
      if (rows.hasMoney(row)) findings.add(findingAt(table, tableRow, column, noCurrency));
      return;
    }
    const ofCurrency = known.get(currency) ?? new Map<number, number>();
    known.set(currency, ofCurrency);
    const year = rows.year[row];
    let found = ofCurrency.get(year);
    if (found === undefined) {
      const rate = rateOf.get(`${currency} ${year}`);
      const isOwn = currency === terms.own;
      found = currencyYears.length;
      ofCurrency.set(year, found);
      currencyYears.push({
        currency,
        year,
        average: isOwn ? 1 : (rate?.average ?? NaN),
        yearEnd: isOwn ? 1 : (rate?.yearEnd ?? NaN),
        firstRow: tableRow,
      });
    }
    position[row] = found;
  });
  return { texts, currencyYears, position };
}

const noCurrency = {
  code: 'currency',
  detail: 'Expected a currency code of three letters, as EUR.',
  isBlocking: true,
} as const;
