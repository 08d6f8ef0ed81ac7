import type { PredictionBasis } from '@prediction';
import { usualOutlook } from './asked-plan';
import { readPlan } from './read-plan';
import { tQuantile } from './t-quantile';
import { lagBasis, logBasis, planBasis, quantileOfTen } from './testing/plan-basis';

describe('readPlan', () => {
  it('reads the base, which holds the last actual values, in every year that a plan may have', () => {
    const { bases } = readPlan(planBasis, [], quantileOfTen);
    expect(bases.map(({ year }) => year)).toEqual([2026, 2027, 2028, 2029, 2030]);
    expect(bases.map(({ estimate }) => estimate)).toEqual([2720, 2720, 2720, 2720, 2720]);
  });

  const carried: PredictionBasis = {
    ...planBasis,
    ownErrors: {
      years: [2021, 2022, 2023, 2024, 2025],
      persistence: 0.5,
      variance: 400,
    },
  };

  it('starts from the last gap, of which half is left a year, in plan and base alike', () => {
    const plan = [
      { year: 2026, values: [120, 1000] },
      { year: 2027, values: [120, 1000] },
    ];
    const outlook = { ...usualOutlook(planBasis), start: 'carry-the-gap' as const };
    const { years, bases } = readPlan(carried, plan, tQuantile, outlook);
    // 2740 at the model's level and 2720 for the base; a gap of 30 halves every year.
    expect(years.map(({ expected }) => expected.estimate)).toEqual([2755, 2747.5]);
    expect(years.map(({ base }) => base.estimate)).toEqual([2735, 2727.5]);
    expect(bases.slice(0, 2).map(({ estimate }) => estimate)).toEqual([2735, 2727.5]);
    expect(years.map(({ fromLast }) => fromLast.fadingGap)).toEqual([-15, -22.5]);
  });

  it('widens intervals with the confidence, and the band with its own', () => {
    const plan = [{ year: 2026, values: [120, 1000] }];
    const usual = usualOutlook(planBasis);
    const [narrow] = readPlan(carried, plan, tQuantile, { ...usual, confidence: 0.8 }).years;
    const [wide] = readPlan(carried, plan, tQuantile, { ...usual, bandConfidence: 0.95 }).years;
    // scipy 1.17.1: t.ppf(0.9, 3)/t.ppf(0.975, 3), for three cosines.
    expect((narrow.expected.high! - 2740) / (wide.expected.high! - 2740)).toBeCloseTo(
      1.6377443536962102 / 3.182446305284263,
      8,
    );
    expect(wide.band.confidence).toBe(0.95);
    expect(wide.band.high! - wide.band.low!).toBeGreaterThan(narrow.band.high! - narrow.band.low!);
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
