import { tQuantile } from '../distributions/t-distribution';
import { fitOf, goldenPanel } from '../testing/golden-panels';
import { basisError } from './basis-error';
import {
  expectedValue,
  fanPercents,
  marketValueBand,
  type Outlook,
  predict,
  type PredictionBasis,
  type Triangle,
  uncertainPlan,
  type UncertainPlanRequest,
} from './index';
import { inModelScale } from './model-scale';
import { plannedContrast } from './planned-contrast';
import { varianceAlong } from './variance-along';

const data = goldenPanel('grunfeld10_unbalanced.csv', 'inv', ['value', 'capital']);
const basis = fitOf(data, 'F07').prediction!;
const withYears = fitOf(data, 'F07', { effects: 'company,year' }).prediction!;
const logs = fitOf(data, 'F07', { form: 'log' }).prediction!;
const lagged = fitOf(data, 'F07', { lag: 1 }).prediction!;

const spread: Triangle = { low: 100, likely: 180, high: 300 };
const point = (value: number): Triangle => ({ low: value, likely: value, high: value });
const year = basis.last.year + 1;

function fansOf(
  inputs: readonly Triangle[],
  from = basis,
  rest: Partial<UncertainPlanRequest> = {},
) {
  const [found] = uncertainPlan(from, { years: [{ year, inputs }], seed: 7, ...rest });
  if (found.expected === null) throw new Error(found.reason);
  return found;
}

/** The end of the band below which the share of the market values lies, at the plan 200 and 300. */
function bandEnd(from: PredictionBasis, outlook: Outlook, share: number): number {
  const bandConfidence = Math.abs(1 - 2 * share);
  const band = marketValueBand(from, [200, 300], { ...outlook, bandConfidence }, tQuantile);
  return (share < 0.5 ? band.low : band.high) ?? NaN;
}

describe('uncertainPlan', () => {
  it('without spread is the expected value, and the market value’s band up to the error of the draws', () => {
    for (const from of [basis, withYears, logs]) {
      for (const start of ['model-level', 'carry-the-gap'] as const) {
        const outlook: Outlook = { year, start };
        const { expected, market } = fansOf([point(200), point(300)], from, { start });
        const value = expectedValue(from, [200, 300], outlook).estimate;
        for (const percentile of expected.percentiles) expect(percentile).toBeCloseTo(value, 8);
        if (market.percentiles === null) throw new Error(market.reason);
        fanPercents.forEach((percent, index) => {
          const share = percent / 100;
          // Draws below a percentile are binomial: five standard errors of their share, as ends of the band.
          const error = 5 * Math.sqrt((share * (1 - share)) / 10_000);
          expect(market.percentiles[index]!).toBeGreaterThan(bandEnd(from, outlook, share - error));
          expect(market.percentiles[index]!).toBeLessThan(bandEnd(from, outlook, share + error));
        });
      }
    }
  });

  it('has the mean and the percentiles of one triangular input, which its slope stretches', () => {
    const { expected, market } = fansOf([spread, point(300)]);
    const slope = basis.coefficients[1];
    const at = (value: number): number => expectedValue(basis, [value, 300]).estimate;
    const deviation =
      slope * Math.sqrt((100 ** 2 + 180 ** 2 + 300 ** 2 - 18_000 - 30_000 - 54_000) / 18);
    expect(slope).toBeGreaterThan(0);
    expect(Math.abs(expected.mean! - at(580 / 3))).toBeLessThan((4 * deviation) / 100);
    fanPercents.forEach((percent, index) => {
      // Triangular quantiles by hand: rise 80 of 200, so 40 % lie below the likeliest value.
      const share = percent / 100;
      const value =
        share < 0.4 ? 100 + Math.sqrt(share * 200 * 80) : 300 - Math.sqrt((1 - share) * 200 * 120);
      const density =
        share < 0.4 ? (2 * (value - 100)) / (200 * 80) : (2 * (300 - value)) / (200 * 120);
      const error = (slope * Math.sqrt(share * (1 - share))) / density / 100;
      expect(Math.abs(expected.percentiles[index]! - at(value))).toBeLessThan(4 * error);
    });
    expect(market.percentiles === null ? null : market.mean).toBe(expected.mean);
  });

  it('has no mean of a market value in logs', () => {
    const { expected, market } = fansOf([spread, point(300)], logs);
    expect(expected.mean).toBeGreaterThan(0);
    expect(market.percentiles === null ? 0 : market.mean).toBeNull();
  });

  it('gives the same for the same seed, whatever other years and inputs are', () => {
    const one = fansOf([spread, point(300)]);
    expect(fansOf([spread, point(300)])).toEqual(one);
    expect(fansOf([spread, point(300)], basis, { seed: 8 }).expected).not.toEqual(one.expected);
    const inputs = [spread, point(300)];
    const years = [0, 1, 2].map((later) => ({ year: year + later, inputs }));
    expect(uncertainPlan(basis, { years, seed: 7 })[0]).toEqual(one);
    const second = fansOf([point(180), spread]);
    const both = fansOf([{ ...spread, low: 180, high: 180 }, spread]);
    expect(both).toEqual(second);
  });

  it('reads with a lag the last observed values first, which are no draws', () => {
    const years = [0, 1].map((later) => ({ year: year + later, inputs: [spread, spread] }));
    const [first, second] = uncertainPlan(lagged, { years, seed: 3 });
    if (first.expected === null || second.expected === null) throw new Error('refused');
    const held = predict(lagged, { years: [{ year, regressors: [1, 1] }] }, tQuantile)[0];
    expect([first.of, second.of]).toEqual([year - 1, year]);
    for (const percentile of first.expected.percentiles)
      expect(percentile).toBeCloseTo(held.expected?.estimate ?? NaN, 8);
    expect(second.expected.percentiles[6]!).toBeGreaterThan(second.expected.percentiles[0]! + 1);
  });

  it('says why a year has no fan', () => {
    const reasonOf = (
      inputs: readonly Triangle[],
      rest: Partial<UncertainPlanRequest> = {},
      from = basis,
    ) => {
      const [found] = uncertainPlan(from, { years: [{ year, inputs }], seed: 1, ...rest });
      return found.expected === null ? found.reason : undefined;
    };
    const inputs = [spread, spread];
    expect(reasonOf([{ low: 5, likely: 4, high: 9 }, spread])).toBe(
      `Low, likely and high of value do not rise in that order in FY${year}.`,
    );
    expect(reasonOf([{ ...spread, high: NaN }, spread])).toBe('No value is given for value.');
    expect(reasonOf([spread])).toBe('Expected 2 values, for value, capital; found 1.');
    expect(reasonOf([{ ...spread, low: -1 }, spread], {}, logs)).toBe(
      'The log form needs values above zero; value is not.',
    );
    for (const seed of [-1, 1.5, NaN, 2 ** 53])
      expect(reasonOf(inputs, { seed })).toBe('A seed is a whole number from 0.');
    for (const draws of [0, 2.5, 1e7])
      expect(reasonOf(inputs, { draws })).toBe('Draws are a whole number from 1 to 1000000.');
    const unknown = { ...basis, ownErrors: undefined };
    const reason = 'This fit was made before the own company’s errors were kept; run it again.';
    expect(reasonOf(inputs, { start: 'carry-the-gap' }, unknown)).toBe(reason);
    expect(fansOf(inputs, unknown).market).toEqual({ percentiles: null, reason });
    expect(fansOf(inputs, { ...basis, intervalReason: 'Too few years.' }).market).toEqual({
      percentiles: null,
      reason: 'Too few years.',
    });
  });
});

describe('varianceAlong', () => {
  it('is the square of the basis’s standard error wherever the slopes’ weights move to', () => {
    for (const from of [basis, withYears, logs]) {
      const outlook: Outlook = { year, start: 'carry-the-gap' };
      const start = inModelScale(from, [200, 300]);
      const variance = varianceAlong(from, plannedContrast(from, start, outlook).weights);
      for (const to of [
        [200, 300],
        [500, 10],
        [20, 4000],
      ] as const) {
        const end = inModelScale(from, to);
        const moves = Float64Array.from(end, (value, k) => value - start[k]);
        const error = basisError(from, plannedContrast(from, end, outlook).weights);
        const expected = (error.standardError ?? NaN) ** 2;
        expect(Math.abs((variance(moves) ?? NaN) / expected - 1)).toBeLessThan(1e-11);
      }
    }
  });

  it('is null where the calibration has no denominator', () => {
    const still = { ...basis, d: basis.d.map((row) => row.map(() => 0)) };
    expect(varianceAlong(still, [1, 0, 0])(Float64Array.of(1, 2))).toBeNull();
  });
});
