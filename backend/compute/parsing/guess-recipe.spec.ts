import { guessRecipe } from './guess-recipe';

const header = [
  'Company',
  'Year',
  'Industry',
  'Currency',
  'Note',
  'Market value',
  'Capex',
  'Book equity',
  'Staff',
];
const years = [2019, 2020, 2021];

function tableOf(
  names: readonly string[],
  currencyOf: (company: string) => string,
): Parameters<typeof guessRecipe>[0] {
  const rows = ['Alder', 'Birch', 'Cedar'].flatMap((company, index) =>
    years.map((year) => [
      company,
      String(year),
      index === 0 ? 'wood' : 'steel',
      currencyOf(company),
      `noted on day ${year + index}`,
      String(100.5 + year),
      '10.5',
      '50.5',
      String(900 + index),
    ]),
  );
  return { header: names, repeatedHeaders: [], rows, lines: rows.map((_, row) => row + 2) };
}

const inSeveral = tableOf(header, (company) => (company === 'Cedar' ? 'USD' : 'EUR'));

describe('the guess of a recipe', () => {
  it('finds roles, further numbers, and what describes a company', () => {
    const guess = guessRecipe(inSeveral, []);
    expect(guess).toEqual(
      jasmine.objectContaining({
        company: 'Company',
        year: 'Year',
        marketValue: 'Market value',
        capex: 'Capex',
        bookEquity: 'Book equity',
        others: ['Staff'],
        attributes: ['Industry'],
      }),
    );
  });

  it('wants rates where a column holds several currencies', () => {
    const { currency, conversion } = guessRecipe(inSeveral, []);
    expect(currency).toBe('EUR');
    expect(conversion?.currencies).toEqual({ column: 'Currency', rates: [] });
  });

  it('wants none where the column holds one currency', () => {
    const guess = guessRecipe(
      tableOf(header, () => 'SEK'),
      [],
    );
    expect(guess.currency).toBe('SEK');
    expect(guess.conversion).toBeUndefined();
    expect(guess.attributes).toEqual(['Industry']);
  });

  it('reads currency and unit from the headers, and tells columns in another unit', () => {
    const names = header
      .with(5, 'Market value (USD bn)')
      .with(6, 'Capex (USD m)')
      .with(7, 'Book equity (USD m)');
    const guess = guessRecipe(
      tableOf(names, () => 'none'),
      [],
    );
    expect([guess.currency, guess.unit]).toEqual(['USD', 'millions']);
    expect(guess.conversion?.columns).toEqual([
      { column: 'Market value (USD bn)', unit: 'billions', measure: null },
    ]);
  });

  it('reads them from the titles where no header says them', () => {
    const guess = guessRecipe(
      tableOf(header, () => ''),
      ['Peer figures', 'All amounts in EUR thousands'],
    );
    expect([guess.currency, guess.unit]).toEqual(['EUR', 'thousands']);
  });

  it('says nothing of what it does not know', () => {
    const { currency, unit, conversion } = guessRecipe(
      tableOf(header, () => ''),
      [],
    );
    expect([currency, unit, conversion]).toEqual([undefined, undefined, undefined]);
  });
});
