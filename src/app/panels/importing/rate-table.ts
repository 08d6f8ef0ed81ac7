import { CurrencyRate, type ImportCheck } from '@contract';
import type { IndexEntry, RateEntry } from './mapping-entry';
import { readFigures } from './read-figures';

type Rows = readonly (readonly string[])[];

const rateColumns = [
  { key: 'currency', words: /curr|code|währ|devise/i },
  { key: 'year', words: /year(?!.?end)|jahr(?!es)/i },
  { key: 'average', words: /aver|mean|durch/i },
  { key: 'yearEnd', words: /end|clos|stich|spot/i },
] as const;

/** Rates of a pasted table: columns by their headers, or in the order currency, year, average, year-end. */
export function ratesOfTable(rows: Rows): readonly RateEntry[] {
  const hasHeader = rows.length > 0 && !rows[0].some(isYear);
  const header = hasHeader ? rows[0] : [];
  const byName = rateColumns.map(({ words }) => header.findIndex((cell) => words.test(cell)));
  const places = byName.slice(0, 2).every((place) => place >= 0) ? byName : [0, 1, 2, 3];
  return rows.slice(hasHeader ? 1 : 0).map((cells) => ({
    currency: cellAt(cells, places[0]).toUpperCase(),
    year: cellAt(cells, places[1]),
    average: cellAt(cells, places[2]),
    yearEnd: cellAt(cells, places[3]),
  }));
}

/** A price index of a pasted table: year, then value. */
export function indexOfTable(rows: Rows): readonly IndexEntry[] {
  const hasHeader = rows.length > 0 && !rows[0].some(isYear);
  return rows
    .slice(hasHeader ? 1 : 0)
    .map((cells) => ({ year: cellAt(cells, 0), value: cellAt(cells, 1) }));
}

/** Rates as numbers, and what is wrong with those that are none; a row with neither rate is left aside. */
export function readRates(entries: readonly RateEntry[]): {
  readonly rates: readonly CurrencyRate[];
  readonly problems: readonly string[];
} {
  const filled = entries.filter(({ average, yearEnd }) => average !== '' || yearEnd !== '');
  const figures = readFigures(filled.flatMap(({ average, yearEnd }) => [average, yearEnd]));
  const rates: CurrencyRate[] = [];
  const problems: string[] = [];
  for (const [place, { currency, year, average, yearEnd }] of filled.entries()) {
    const [averageRate, yearEndRate] = figures.slice(2 * place, 2 * place + 2);
    const rate = CurrencyRate.safeParse({
      currency: currency.trim().toUpperCase(),
      year: isYear(year.trim()) ? Number(year) : undefined,
      average: average === '' ? null : averageRate,
      yearEnd: yearEnd === '' ? null : yearEndRate,
    });
    if (rate.success) rates.push(rate.data);
    else
      problems.push(
        `expected a code as USD, a year, and rates above zero as 0.92; found ${[currency, year, average, yearEnd].join(' · ')}`,
      );
  }
  const doubled = rates.find((rate, place) =>
    rates.slice(0, place).some((one) => one.currency === rate.currency && one.year === rate.year),
  );
  if (doubled !== undefined)
    problems.push(`${doubled.currency} ${doubled.year} has two rows of rates; expected one`);
  return { rates, problems };
}

/** The typed rates with an empty row for each that the check misses. */
export function withMissingRates(
  entries: readonly RateEntry[],
  missing: ImportCheck['missingRates'],
): readonly RateEntry[] {
  const known = new Set(entries.map(({ currency, year }) => `${currency} ${year}`));
  const wanted = missing.flatMap(({ currency, years }) =>
    years.map((year) => ({ currency, year: String(year), average: '', yearEnd: '' })),
  );
  return [...entries, ...wanted.filter(({ currency, year }) => !known.has(`${currency} ${year}`))];
}

/** `USD for 2019–2023`: a run of years is one span. */
export function missingRateWords({ currency, years }: ImportCheck['missingRates'][number]): string {
  const spans: [number, number][] = [];
  for (const year of [...years].sort((left, right) => left - right)) {
    const last = spans.at(-1);
    if (last !== undefined && year === last[1] + 1) last[1] = year;
    else spans.push([year, year]);
  }
  const words = spans.map(([first, last]) => (first === last ? `${first}` : `${first}–${last}`));
  return `${currency} for ${words.join(', ')}`;
}

export function isYear(text: string): boolean {
  return /^[1-9]\d{3}$/.test(text);
}

function cellAt(cells: readonly string[], place: number): string {
  return cells[place] ?? '';
}
