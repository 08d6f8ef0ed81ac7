import { countInWords, listInWords, pInWords, shortNumber } from './in-words';

describe('figures in words', () => {
  it('writes counts out up to twelve', () => {
    expect([0, 1, 12, 13].map(countInWords)).toEqual(['no', 'one', 'twelve', '13']);
  });

  it('gives four digits and a true minus sign', () => {
    expect([-1234.56, 0.000123456, 5].map(shortNumber)).toEqual(['−1235', '0.0001235', '5']);
    expect(shortNumber(-1.23456e-9)).toBe('−1.235e−9');
  });

  it('gives p values two digits, and none below a thousandth', () => {
    expect([0.0123, 0.5, 0.00099].map(pInWords)).toEqual(['p = 0.012', 'p = 0.50', 'p < 0.001']);
  });

  it('joins names, and counts those beyond the fourth', () => {
    expect([[], ['A'], ['A', 'B'], ['A', 'B', 'C']].map((names) => listInWords(names))).toEqual([
      '',
      'A',
      'A and B',
      'A, B and C',
    ]);
    expect(listInWords(['A', 'B', 'C', 'D', 'E', 'F'])).toBe('A, B, C, D and 2 more');
  });
});
