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
