import { Conversion, noConversion } from './imports';

describe('the conversion of an import', () => {
  const usd = { currency: 'USD', year: 2020, average: 0.9, yearEnd: 0.8 };

  function refusal(conversion: object): string {
    const read = Conversion.safeParse({ ...noConversion, ...conversion });
    return read.success
      ? ''
      : read.error.issues.map(({ path, message }) => `${path.join('/')}: ${message}`).join();
  }

  it('takes one rate a currency and year, and says where a second stands', () => {
    const rates = [usd, { ...usd, year: 2021 }, { ...usd, currency: 'GBP' }];
    expect(refusal({ currencies: { column: 'currency', rates } })).toBe('');
    expect(refusal({ currencies: { column: 'currency', rates: [...rates, usd] } })).toBe(
      'currencies/rates/3: expected one rate a currency and year; found a second for USD 2020',
    );
  });

  it('takes one price index a year', () => {
    const index = [
      { year: 2020, value: 100 },
      { year: 2020, value: 101 },
    ];
    expect(refusal({ prices: { baseYear: 2020, index } })).toBe(
      'prices/index/1: expected one price index a year; found a second for 2020',
    );
  });
});
