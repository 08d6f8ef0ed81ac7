import {
  indexOfTable,
  missingRateWords,
  ratesOfTable,
  readRates,
  withMissingRates,
} from './rate-table';
import { tableOfText } from './table-text';

describe('a table of rates', () => {
  it('is read from a spreadsheet’s block in the order currency, year, average, year-end', () => {
    const rows = tableOfText('usd\t2022\t0.95\t0.94\r\nUSD\t2023\t0.92\t0.90\r\n');
    expect(ratesOfTable(rows)).toEqual([
      { currency: 'USD', year: '2022', average: '0.95', yearEnd: '0.94' },
      { currency: 'USD', year: '2023', average: '0.92', yearEnd: '0.90' },
    ]);
  });

  it('is read from a CSV file by its headers, with decimal commas', () => {
    const rows = tableOfText('\ufeffYear;Year-end;Average;Currency\n2022;0,94;"0,95";USD\n\n');
    const entries = ratesOfTable(rows);
    expect(entries).toEqual([{ currency: 'USD', year: '2022', average: '0,95', yearEnd: '0,94' }]);
    expect(readRates(entries)).toEqual({
      rates: [{ currency: 'USD', year: 2022, average: 0.95, yearEnd: 0.94 }],
      problems: [],
    });
  });

  it('leaves rows without a rate aside, and names what is no rate or stands twice', () => {
    const rate = { currency: 'USD', year: '2022', average: '0.95', yearEnd: '' };
    expect(readRates([{ ...rate, average: '' }])).toEqual({ rates: [], problems: [] });
    expect(readRates([{ ...rate, year: '22' }]).problems).toEqual([
      'expected a code as USD, a year, and rates above zero as 0.92; found USD · 22 · 0.95 · ',
    ]);
    expect(readRates([{ ...rate, average: '0' }]).problems.length).toBe(1);
    expect(readRates([rate, rate]).problems).toEqual([
      'USD 2022 has two rows of rates; expected one',
    ]);
  });

  it('gets an empty row for each rate that the check misses, once', () => {
    const missing = [{ currency: 'USD', years: [2022, 2023] }];
    const typed = [{ currency: 'USD', year: '2022', average: '', yearEnd: '' }];
    const entries = withMissingRates(typed, missing);
    expect(entries.map(({ year }) => year)).toEqual(['2022', '2023']);
    expect(withMissingRates(entries, missing)).toEqual(entries);
  });

  it('says which years lack a rate', () => {
    expect(missingRateWords({ currency: 'USD', years: [2021, 2019, 2020, 2024] })).toBe(
      'USD for 2019–2021, 2024',
    );
  });

  it('reads a price index with or without a header', () => {
    const index = [{ year: '2020', value: '100' }];
    expect(indexOfTable([['2020', '100']])).toEqual(index);
    expect(
      indexOfTable([
        ['year', 'index'],
        ['2020', '100'],
      ]),
    ).toEqual(index);
  });
});
