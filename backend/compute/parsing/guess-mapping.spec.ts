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
