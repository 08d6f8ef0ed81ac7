import { decimalSigns } from './decimal-signs';
import { parseNumber } from './parse-number';
import { parseYear } from './parse-year';

describe('parseNumber', () => {
  it('reads numbers with a decimal point', () => {
    for (const [text, value] of [
      ['1234.5', 1234.5],
      [' 1,234.5 ', 1234.5],
      ['1 234 567', 1234567],
      ['1’234.50', 1234.5],
      ['1\u202f234', 1234],
      ['.5', 0.5],
      ['-3', -3],
      ['−3', -3],
      ['+3', 3],
      ['(1,234)', -1234],
      ['1,234-', -1234],
      ['1e3', 1000],
    ] as const) {
      expect(parseNumber(text)).withContext(text).toBe(value);
    }
  });

  it('reads numbers with a decimal comma', () => {
    for (const [text, value] of [
      ['1234,5', 1234.5],
      ['1.234.567,89', 1234567.89],
      ['1.234', 1234],
      ['(1.234,5)', -1234.5],
    ] as const) {
      expect(parseNumber(text, ',')).withContext(text).toBe(value);
    }
  });

  it('takes every token of a missing value as missing', () => {
    for (const text of ['', ' ', 'NA', 'N/A', 'n/a', '#N/A', '-', '–', '.', '..']) {
      expect(parseNumber(text)).withContext(text).toBeNaN();
    }
  });

  it('takes no text for a number', () => {
    for (const text of [
      'x',
      '12 %',
      '1,23',
      '12,34,567',
      '1.2.3',
      '1e999',
      '--1',
      '()',
      '0x10',
      '5 EUR',
    ]) {
      expect(parseNumber(text)).withContext(text).toBeUndefined();
    }
  });
});

describe('decimalSigns', () => {
  it('goes by the numbers that can be read one way only', () => {
    expect(decimalSigns([['1,5', '1,234']])).toEqual([{ decimalSign: ',', isAmbiguous: false }]);
    expect(decimalSigns([['1.234.567']])).toEqual([{ decimalSign: ',', isAmbiguous: false }]);
    expect(decimalSigns([['0,123']])).toEqual([{ decimalSign: ',', isAmbiguous: false }]);
    expect(decimalSigns([['1.5', '1,234']])).toEqual([{ decimalSign: '.', isAmbiguous: false }]);
  });

  it('lets the other columns decide for one that could be read both ways', () => {
    const [first] = decimalSigns([['1.234', '5.678'], ['1,5'], ['2,25']]);
    expect(first).toEqual({ decimalSign: ',', isAmbiguous: true });
  });

  it('takes the point where nothing speaks', () => {
    expect(decimalSigns([['1,234']])).toEqual([{ decimalSign: '.', isAmbiguous: true }]);
    expect(decimalSigns([['7', 'x']])).toEqual([{ decimalSign: '.', isAmbiguous: false }]);
  });
});

describe('parseYear', () => {
  it('reads years and fiscal year labels', () => {
    for (const text of ['2023', 'FY2023', 'FY 2023', 'fy-2023', 'GJ 2023', '2023.0', ' 2023 ']) {
      expect(parseYear(text)).withContext(text).toBe(2023);
    }
    expect(parseYear('7')).toBe(7);
  });

  it('takes nothing else for a year', () => {
    for (const text of ['2023.5', '2022/23', '31.12.2023', 'Q1 2023', 'x', '20230']) {
      expect(parseYear(text)).withContext(text).toBeUndefined();
    }
    expect(parseYear('n/a')).toBeNaN();
  });
});
