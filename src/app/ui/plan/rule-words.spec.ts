import { moveWords, ruleWords } from './rule-words';
import { planBasis } from './testing/plan-basis';

const numbers = { shown: (value: number) => value };
const ruled = {
  basis: planBasis,
  labels: ['capex', 'book equity'],
  regressor: 0,
  years: [2026, 2028],
} as const;

describe('rules in words', () => {
  it('follow the regressor’s name', () => {
    const words = (rule: Parameters<typeof ruleWords>[0]) => ruleWords(rule, ruled, numbers);
    expect(words(null)).toBe('is entered year by year');
    expect(words({ kind: 'hold' })).toBe('holds FY2025’s 110');
    expect(words({ kind: 'grow', percent: 5 })).toBe('grows 5 % a year from FY2025’s 110');
    expect(words({ kind: 'grow', percent: -2.5 })).toBe('shrinks 2.5 % a year from FY2025’s 110');
    expect(words({ kind: 'total', total: 360, spread: 'rising' })).toBe(
      'comes to 360 over FY2026–FY2028, more every year',
    );
    const thousands = { shown: (value: number) => value * 1000 };
    expect(ruleWords({ kind: 'hold' }, ruled, thousands)).toBe('holds FY2025’s 110,000');
    expect(words({ kind: 'share', percent: 12, of: 1 })).toBe(
      'is 12 % of book equity of the same year',
    );
  });

  it('name what moves book equity as the trade does', () => {
    expect(moveWords({ year: 2027, amount: 200 }, 1, numbers)).toBe(
      'Equity raise of 200 in FY2027',
    );
    expect(moveWords({ year: 2027, amount: -50 }, 1, numbers)).toBe('Buyback of 50 in FY2027');
    expect(moveWords({ year: 2027, amount: -50 }, 0, numbers)).toBe('Lower by 50 from FY2027 on');
  });
});
