import { guessMapping } from './guess-mapping';

describe('the guess of a mapping', () => {
  it('takes a column with a slip for what it is, and one of mostly words for no number', () => {
    const rows = Array.from({ length: 10 }, (_, row) => [
      'A',
      String(2000 + row),
      '10',
      '1',
      row === 4 ? 'abc' : '5',
      row < 5 ? 'abc' : '5',
    ]);
    const guess = guessMapping(['company', 'year', 'value', 'capex', 'equity', 'remark'], rows);
    expect(guess.bookEquity).toBe('equity');
    expect(guess.others).toEqual([]);
  });
});

describe('a header that says what its column is', () => {
  const headers = ['company', 'year', 'Market value (EUR m)', 'Capex', 'Equity', 'Market cap'];
  const rowsOf = (value: (row: number) => string) =>
    Array.from({ length: 10 }, (_, row) => [
      'A',
      String(2000 + row),
      value(row),
      '1',
      row < 4 ? 'n.b.' : '5',
      '9',
    ]);

  it('wins though many cells are no numbers', () => {
    const guess = guessMapping(
      headers.slice(0, 5),
      rowsOf((row) => (row < 3 ? 'pending' : '10')),
    );
    expect(guess.marketValue).toBe('Market value (EUR m)');
    expect(guess.bookEquity).toBe('Equity');
  });

  it('wins before a part of a header whose cells are all numbers', () => {
    const guess = guessMapping(
      headers,
      rowsOf((row) => (row < 3 ? 'pending' : '10')),
    );
    expect(guess.marketValue).toBe('Market value (EUR m)');
    expect(guess.others).toEqual(['Market cap']);
  });

  it('does not make figures of a column in which hardly a cell is a number', () => {
    const guess = guessMapping(
      headers,
      rowsOf((row) => (row < 9 ? 'pending' : '10')),
    );
    expect(guess.marketValue).toBe('Market cap');
  });

  it('has to be all of it: a column that names a value in passing is judged by its cells', () => {
    const remarks = ['company', 'year', 'Remarks on market value', 'Capex', 'Note on equity'];
    const guess = guessMapping(
      remarks,
      rowsOf((row) => (row < 4 ? 'pending' : '10')),
    );
    expect(guess.marketValue).toBeUndefined();
    expect(guess.bookEquity).toBeUndefined();
  });
});

describe('guessMapping', () => {
  it('knows the usual English headers', () => {
    const headers = [
      'Company',
      'Fiscal Year',
      'Market Cap (EUR m)',
      'CapEx',
      'Book Equity',
      'Revenue',
      'Sector',
    ];
    const row = ['A', 'FY2020', '1', '2', '3', '4', 'Retail'];
    expect(guessMapping(headers, [row])).toEqual({
      company: 'Company',
      year: 'Fiscal Year',
      marketValue: 'Market Cap (EUR m)',
      capex: 'CapEx',
      bookEquity: 'Book Equity',
      others: ['Revenue'],
    });
  });

  it('knows the usual German headers', () => {
    const headers = [
      'Unternehmen',
      'Geschäftsjahr',
      'Marktkapitalisierung',
      'Investitionen',
      'Eigenkapital',
    ];
    expect(guessMapping(headers, [['A', '2020', '1,5', '2,5', '3,5']])).toEqual({
      company: 'Unternehmen',
      year: 'Geschäftsjahr',
      marketValue: 'Marktkapitalisierung',
      capex: 'Investitionen',
      bookEquity: 'Eigenkapital',
      others: [],
    });
  });

  it('reads joined words, and falls back on what the columns hold', () => {
    expect(guessMapping(['bookEquityEur', 'k', 't'], [['1', 'A', '2020']])).toEqual({
      company: 'k',
      year: 't',
      bookEquity: 'bookEquityEur',
      others: [],
    });
  });
});
