import { readPlan } from './read-plan';
import { tQuantile } from './t-quantile';
import { lagBasis, logBasis, planBasis, quantileOfTen } from './testing/plan-basis';

describe('readPlan', () => {
  it('reads the base, which holds the last actual values', () => {
    const { base } = readPlan(planBasis, [], quantileOfTen);
    expect(base.estimate).toBe(2720);
  });

  it('gives each year its expected value, its difference to the base and the parts that add up to it', () => {
    const plan = [{ year: 2026, values: [130, 1100] }];
    const [year] = readPlan(planBasis, plan, quantileOfTen).years;
    expect(year.expected.estimate).toBe(2710);
    expect(year.difference.estimate).toBe(-10);
    // √(20²·0.04 + 100²·0.0025) = √41, times t(10).
    expect(year.difference.high).toBeCloseTo(-10 + Math.sqrt(41) * 2.2281388519649385, 10);
    expect(year.parts.terms.map(({ estimate }) => estimate)).toEqual([40, -50]);
    expect(year.parts.total).toBe(-10);
    expect(year.familiar.kind).toBe('inside');
  });

  it('has no difference where the plan holds the last actual values', () => {
    const plan = [{ year: 2026, values: [110, 1000] }];
    expect(readPlan(planBasis, plan, quantileOfTen).years[0].difference).toEqual({
      estimate: 0,
      standardError: 0,
      low: 0,
      high: 0,
    });
  });

  it('gives the mean in amounts and the difference in logs where the fit is in logs', () => {
    const plan = [{ year: 2026, values: [121, 1000] }];
    const [year] = readPlan(logBasis, plan, quantileOfTen).years;
    // exp(ln 2700 + 0.4·ln 1.21)·1.02, and 0.4·ln 1.1 against a base of 110.
    expect(year.expected.estimate).toBeCloseTo(2700 * 1.21 ** 0.4 * 1.02, 8);
    expect(year.difference.estimate).toBeCloseTo(0.4 * Math.log(1.1), 12);
    expect(year.parts.total).toBeCloseTo(year.difference.estimate, 12);
  });

  it('refuses an amount that has no log, and gives no figure for its year', () => {
    const plan = [
      { year: 2026, values: [0, 1000] },
      { year: 2027, values: [120, 1000] },
    ];
    const { years, refused } = readPlan(logBasis, plan, quantileOfTen);
    expect(years.map(({ year }) => year)).toEqual([2027]);
    expect(refused.map(({ year }) => year)).toEqual([2026]);
    expect(refused[0].reason).toContain('capex is not');
  });

  it('reads the plan of the year before with a lag, and the last actual values first', () => {
    const plan = [
      { year: 2026, values: [130, 1000] },
      { year: 2027, values: [150, 1000] },
    ];
    const { years } = readPlan(lagBasis, plan, quantileOfTen);
    expect(years.map(({ of }) => of)).toEqual([2025, 2026]);
    expect(years.map(({ difference }) => difference.estimate)).toEqual([0, 40]);
    expect(years[1].values).toEqual([150, 1000]);
  });

  it('takes its quantile of Student’s t from the package that the server uses', () => {
    // scipy 1.17.1: t.ppf(0.975, 10), t.ppf(0.975, 2.07).
    expect(tQuantile(0.975, 10)).toBeCloseTo(2.2281388519649385, 9);
    expect(tQuantile(0.975, 2.07)).toBeCloseTo(4.166185037146253, 9);
  });
});
