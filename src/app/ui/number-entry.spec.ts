import { readNumber } from './number-entry';

describe('number entry', () => {
  it('reads what people type and paste', () => {
    expect(readNumber('1,234.5')).toBe(1234.5);
    expect(readNumber('(1,234)')).toBe(-1234);
    expect(readNumber(' \u221212 ')).toBe(-12);
    expect(readNumber('1\u00a0234')).toBe(1234);
    expect(readNumber('.5')).toBe(0.5);
    expect(readNumber('-0')).toBe(0);
  });

  it('reads no number from what is not one', () => {
    for (const text of ['', 'abc', '1.234,56', '12,34', '1,2345', '--1', '(-1)', '1e3', '1.2.3'])
      expect(readNumber(text)).withContext(text).toBeUndefined();
  });
});
