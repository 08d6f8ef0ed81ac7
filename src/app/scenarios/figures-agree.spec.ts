import type { ScenarioYear } from '@contract';
import { readPlan } from '../ui/plan/read-plan';
import { planBasis, quantileOfTen } from '../ui/plan/testing/plan-basis';
import { yearsThatDiffer } from './figures-agree';

describe('the server’s figures beside those of the screen', () => {
  const plan = [
    { year: 2026, values: [130, 1100] },
    { year: 2027, values: [110, 1000] },
  ];
  const { years } = readPlan(planBasis, plan, quantileOfTen);
  const stored = (): ScenarioYear[] =>
    years.map(({ year, expected, difference, familiar }) => ({
      year,
      expected: { ...expected },
      difference: { ...difference },
      familiar: familiar.kind,
    }));

  it('agree when they differ by rounding alone', () => {
    const other = stored();
    other[0].expected.estimate *= 1 + 1e-12;
    expect(yearsThatDiffer(years, other)).toEqual([]);
  });

  it('differ from the ninth digit on, and the years are named', () => {
    const other = stored();
    other[0].difference.high = (other[0].difference.high ?? 0) * (1 + 1e-8);
    expect(yearsThatDiffer(years, other)).toEqual([2026]);
  });

  it('differ where a bound, a year or the mark of the familiar range is another', () => {
    const noBound = stored();
    noBound[1].expected.low = null;
    const outside = stored();
    outside[1].familiar = 'outside';
    expect(yearsThatDiffer(years, noBound)).toEqual([2027]);
    expect(yearsThatDiffer(years, outside)).toEqual([2027]);
    expect(yearsThatDiffer(years, stored().slice(0, 1))).toEqual([2027]);
  });
});
