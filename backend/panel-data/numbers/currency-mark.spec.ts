import { currencyMark, isPercent, mayStandFor } from './currency-mark';

describe('currency marks of a number', () => {
  it('are found before and behind it, as sign or code', () => {
    for (const [text, mark] of [
      ['$136.692', '$'],
      ['US$ 5', 'US$'],
      ['(1,234) €', '€'],
      ['-£5', '£'],
      ['EUR 5', 'EUR'],
      ['5 CHF', 'CHF'],
      ['5,00 kr', 'kr'],
      ['kr. 5', 'kr.'],
      ['12 zł', 'zł'],
    ])
      expect(currencyMark(text)).withContext(text).toBe(mark);
    for (const text of ['5', '', '12%', '5 ABC', 'x'])
      expect(currencyMark(text)).withContext(text).toBeNull();
  });

  it('stand for their own currency and no other', () => {
    for (const [mark, currency] of [
      ['€', 'EUR'],
      ['EUR', 'EUR'],
      ['£', 'GBP'],
      ['zł', 'PLN'],
    ]) {
      expect(mayStandFor(mark, currency)).withContext(`${mark} ${currency}`).toBeTrue();
      expect(mayStandFor(mark, 'USD')).withContext(mark).toBeFalse();
    }
    expect(mayStandFor('$', 'EUR')).toBeFalse();
    expect(mayStandFor('USD', 'AUD')).toBeFalse();
  });

  it('may stand for several where a sign is shared, unless letters say which', () => {
    for (const currency of ['USD', 'AUD', 'CAD', 'NZD', 'SGD', 'HKD', 'MXN'])
      expect(mayStandFor('$', currency)).withContext(currency).toBeTrue();
    for (const currency of ['SEK', 'NOK', 'DKK', 'ISK'])
      expect(mayStandFor('kr', currency)).withContext(currency).toBeTrue();
    expect(mayStandFor('kr.', 'DKK')).toBeTrue();
    expect(mayStandFor('¥', 'JPY') && mayStandFor('¥', 'CNY')).toBeTrue();
    expect(mayStandFor('US$', 'USD') && mayStandFor('NT$', 'TWD')).toBeTrue();
    expect(mayStandFor('A$', 'AUD') && mayStandFor('C$', 'CAD')).toBeTrue();
    expect(mayStandFor('A$', 'USD') || mayStandFor('US$', 'CAD')).toBeFalse();
  });

  it('tell a share from an amount', () => {
    expect(isPercent('12 %') && isPercent('(3%)')).toBeTrue();
    expect(isPercent('12') || isPercent('x')).toBeFalse();
  });
});
