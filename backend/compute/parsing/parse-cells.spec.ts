import { type ColumnDecimals, decimalSigns as decimalSignsOf } from './decimal-signs';
import { type DecimalSign, parseNumber } from '../../panel-data/numbers/parse-number';

describe('parseNumber', () => {
  const withPoint: readonly (readonly [string, number])[] = [
    ['1234.5', 1234.5],
    [' 1,234.5 ', 1234.5],
    ['1 234 567', 1234567],
    ['1’234.50', 1234.5],
    ["1'234'567.5", 1234567.5],
    ['1\u00a0234', 1234],
    ['1\u202f234', 1234],
    ['1\u2009234\u2009567', 1234567],
    ['1\u2007234', 1234],
    ['.5', 0.5],
    ['5.', 5],
    ['007', 7],
    ['-3', -3],
    ['−3', -3],
    ['–3', -3],
    ['- 3', -3],
    ['+3', 3],
    ['(1,234)', -1234],
    ['( 1,234.5 )', -1234.5],
    ['1,234-', -1234],
    ['1e3', 1000],
    ['1.5E-3', 0.0015],
    ['12%', 0.12],
    ['12 %', 0.12],
    ['12.3%', 0.123],
    ['(12%)', -0.12],
    ['-0.7%', -0.007],
    ['1e2%', 1],
    ['€1,234', 1234],
    ['€ 1,234.5', 1234.5],
    ['-€5', -5],
    ['€-5', -5],
    ['(€1,234)', -1234],
    ['€(1,234)', -1234],
    ['$5', 5],
    ['US$ 5', 5],
    ['£5', 5],
    ['5 €', 5],
    ['5 EUR', 5],
    ['1 234 EUR', 1234],
    ['1 234EUR', 1234],
    ['EUR 1,234', 1234],
    ['CHF 1’234.50', 1234.5],
    ['-5 EUR', -5],
    ['EUR 5-', -5],
  ];
  const withComma: readonly (readonly [string, number])[] = [
    ['1234,5', 1234.5],
    ['1.234.567,89', 1234567.89],
    ['1.234', 1234],
    ['1.234,5', 1234.5],
    ['1 234,5', 1234.5],
    ['1’234,5', 1234.5],
    [',5', 0.5],
    ['(1.234,5)', -1234.5],
    ['12,5 %', 0.125],
    ['1.234,50 €', 1234.5],
    ['EUR 1.234,50', 1234.5],
    ['1,5e3', 1500],
  ];
  const cases: readonly (readonly [DecimalSign, readonly (readonly [string, number])[]])[] = [
    ['.', withPoint],
    [',', withComma],
  ];

  for (const [decimalSign, forms] of cases) {
    for (const [text, value] of forms) {
      it(`reads “${text}” with a decimal ${decimalSign} as ${value}`, () => {
        expect(parseNumber(text, decimalSign)).toBe(value);
      });
    }
  }

  for (const text of ['', ' ', 'NA', 'N/A', 'n/a', '#N/A', '-', '–', '—', '.', '..', '\u00a0']) {
    it(`takes “${text}” as missing`, () => {
      expect(parseNumber(text)).toBeNaN();
      expect(parseNumber(text, ',')).toBeNaN();
    });
  }

  it('takes no text for a number', () => {
    for (const text of [
      'x',
      'NaN',
      'Infinity',
      'null',
      '1,23',
      '12,34,567',
      '1,23,456.7',
      '1,2345',
      '1.2.3',
      '1 2345',
      '1,234 567',
      '1e999',
      '--1',
      '-(1)',
      '(-1)',
      '+-1',
      '()',
      '%',
      '%%',
      '5%%',
      '€',
      '€€5',
      '€5 EUR',
      'EUR',
      '5 ABC',
      '5 eur',
      '5EURO',
      '0x10',
      '1'.repeat(400),
    ]) {
      expect(parseNumber(text)).withContext(text).toBeUndefined();
    }
  });

  it('refuses a long text in no more time than it takes to look at it', () => {
    const text = `1${' '.repeat(65_000)}x`;
    const start = performance.now();
    expect(parseNumber(text)).toBeUndefined();
    expect(performance.now() - start).toBeLessThan(200);
  });
});

describe('decimalSigns', () => {
  const decimalSigns = (columns: readonly (readonly string[])[]): ColumnDecimals[] =>
    decimalSignsOf({ rows: columns[0].map((_, row) => columns.map((cells) => cells[row] ?? '')) }, [
      ...columns.keys(),
    ]);

  it('goes by the numbers that can be read one way only', () => {
    expect(decimalSigns([['1,5', '1,234']])).toEqual([{ decimalSign: ',', ambiguousAt: null }]);
    expect(decimalSigns([['1.234.567']])).toEqual([{ decimalSign: ',', ambiguousAt: null }]);
    expect(decimalSigns([['0,123']])).toEqual([{ decimalSign: ',', ambiguousAt: null }]);
    expect(decimalSigns([['1.5', '1,234']])).toEqual([{ decimalSign: '.', ambiguousAt: null }]);
  });

  it('sees past what stands around a number', () => {
    for (const text of ['1,5 €', '(1,5)', 'EUR 1,5', '1,5%', '1.234,5 EUR', '1,5e3']) {
      expect(decimalSigns([[text]])[0].decimalSign)
        .withContext(text)
        .toBe(',');
    }
  });

  it('lets the other columns decide for one that could be read both ways, and says where', () => {
    const [first] = decimalSigns([['7', '1.234', '5.678'], ['1,5'], ['2,25']]);
    expect(first).toEqual({ decimalSign: ',', ambiguousAt: 1 });
  });

  it('takes the point where nothing speaks', () => {
    expect(decimalSigns([['1,234']])).toEqual([{ decimalSign: '.', ambiguousAt: 0 }]);
    expect(decimalSigns([['7', 'x']])).toEqual([{ decimalSign: '.', ambiguousAt: null }]);
  });
});
