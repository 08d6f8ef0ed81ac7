import { moneyText } from './money-text';

describe('money of an invoice', () => {
  it('places the point where the currency has it', () => {
    expect(moneyText({ amount: 26_700, currency: 'EUR' }, 'en')).toBe('€267.00');
    expect(moneyText({ amount: 1_234_567, currency: 'JPY' }, 'en')).toBe('¥1,234,567');
    expect(moneyText({ amount: 5, currency: 'USD' }, 'en')).toBe('$0.05');
  });

  it('writes nothing as an amount, and a credit with its sign', () => {
    expect(moneyText({ amount: 0, currency: 'EUR' }, 'en')).toBe('€0.00');
    expect(moneyText({ amount: -950, currency: 'EUR' }, 'en')).toBe('-€9.50');
  });
});
