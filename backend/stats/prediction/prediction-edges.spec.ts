import { tQuantile } from '../distributions/t-distribution';
import { expectDigits } from '../testing/expect-digits';
import { fitOf, goldenPanel, panelOf } from '../testing/golden-panels';
import { randomNumbers, randomPanelNames } from '../testing/random-panels';
import {
  asFactor,
  differenceToBase,
  expectedValue,
  familiarRange,
  heldRegressors,
  marketValueBand,
  predict,
  type PredictionBasis,
  reachValue,
} from './index';

const data = goldenPanel('grunfeld10.csv', 'inv', ['value', 'capital']);
const levels = fitOf(data, 'F03').prediction!;
const logs = fitOf(data, 'F03', { form: 'log' }).prediction!;
const lagged = fitOf(data, 'F03', { lag: 1 }).prediction!;
const withYears = fitOf(data, 'F03', { effects: 'company,year' });

function oneYear(basis: PredictionBasis, regressors: readonly number[], year = 1955) {
  return predict(basis, { years: [{ year, regressors }] }, tQuantile)[0];
}

describe('in log form', () => {
  it('shows the mean at the model’s level and the median where the gap is carried', () => {
    const level = expectedValue(logs, [2000, 300]);
    const carried = expectedValue(logs, [2000, 300], { start: 'carry-the-gap' });
    expect(level.log?.shown).toBe('mean');
    expect(level.estimate).toBe(level.log?.mean ?? NaN);
    expectDigits(level.log?.mean, (level.log?.median ?? NaN) * (logs.smear ?? NaN), 15);
    expect(carried.log?.shown).toBe('median');
    expect(carried.log?.mean).toBeNull();
    expect(carried.estimate).toBe(carried.log?.median ?? NaN);
  });

  it('refuses values that have no logarithm, in words', () => {
    for (const regressors of [
      [0, 300],
      [-1, 300],
    ]) {
      expect(oneYear(logs, regressors)).toEqual({
        year: 1955,
        expected: null,
        reason: 'The log form needs values above zero; value is not.',
      });
      expect(() => expectedValue(logs, regressors)).toThrowError(RangeError);
      expect(() => familiarRange(logs, regressors)).toThrowError(RangeError);
    }
  });

  it('reaches no target of zero or less', () => {
    const request = { regressor: 0, regressors: [2000, 300], target: 0 };
    expect(reachValue(logs, request)).toEqual({
      value: null,
      reason: 'The log form reaches only values above zero.',
    });
  });

  it('says a difference as the factor it multiplies by', () => {
    const doubled = differenceToBase(logs, [Math.log(2), 0], tQuantile);
    const factor = asFactor(doubled);
    expectDigits(factor.estimate, 2 ** logs.coefficients[1], 12);
    expectDigits(factor.high, Math.exp(doubled.high ?? NaN), 15);
    expect(factor.standardError).toBeNull();
  });

  it('shrinks a plan until it is inside, straight in logs', () => {
    const { nearestInside } = familiarRange(logs, [80000, 9]);
    expect(familiarRange(logs, nearestInside).kind).toBe('inside');
    const share = (k: number, to: number): number =>
      Math.log(nearestInside[k] / logs.last.regressors[k]) / Math.log(to / logs.last.regressors[k]);
    expectDigits(share(0, 80000), share(1, 9), 9);
  });
});

describe('with a lag', () => {
  it('reads the last observed values in the first year and the plan one year late', () => {
    const years = [
      { year: 1955, regressors: [1, 2] },
      { year: 1956, regressors: [3, 4] },
    ];
    const [first, second] = predict(lagged, { years }, tQuantile);
    if (first.expected === null || second.expected === null) throw new Error('refused');
    expect(first.regressors).toEqual(heldRegressors(lagged));
    expect([first.of, second.of]).toEqual([1954, 1955]);
    expect(second.regressors).toEqual([1, 2]);
    expect(first.difference.estimate).toBe(0);
    expectDigits(second.expected.estimate, expectedValue(lagged, [1, 2]).estimate, 15);
  });

  it('holds the last year’s own values, which the model has not read yet', () => {
    expect(heldRegressors(lagged)).toEqual(levels.last.regressors);
    expect(lagged.last.regressors).not.toEqual(levels.last.regressors);
  });

  it('says which year’s values are missing', () => {
    const missing = { ...lagged, held: null };
    expect(oneYear(missing, [1, 2])).toEqual({
      year: 1955,
      expected: null,
      reason: 'F03 has no values of FY1954 that the model can read; they act in FY1955.',
    });
    expect(oneYear(lagged, [1, 2], 1957)).toEqual({
      year: 1957,
      expected: null,
      reason: 'The plan has no values of FY1956; they act in FY1957.',
    });
  });

  it('has no last values where the panel lacks one of them', () => {
    const values = Float64Array.from(data.regressors[0].values);
    const row = data.year.findIndex(
      (year, index) => year === 1954 && data.companies[data.company[index]] === 'F03',
    );
    values[row] = NaN;
    const panel = { ...data, regressors: [{ name: 'value', values }, data.regressors[1]] };
    expect(fitOf(panel, 'F03', { lag: 1 }).prediction?.held).toBeNull();
  });
});

describe('with year effects', () => {
  it('gives a unit of one regressor the interval of its slope', () => {
    withYears.slopes.forEach((slope, k) => {
      const unit = [k === 0 ? 1 : 0, k === 1 ? 1 : 0];
      const difference = differenceToBase(withYears.prediction!, unit, tQuantile);
      for (const key of ['estimate', 'standardError', 'low', 'high'] as const)
        expectDigits(difference[key], slope[key] ?? NaN, 9, key);
    });
  });

  it('passes through the last fitted value', () => {
    const basis = withYears.prediction!;
    expectDigits(expectedValue(basis, basis.last.regressors).estimate, basis.last.fitted, 12);
  });

  it('leaves the familiar range where it is without them', () => {
    const basis = withYears.prediction!;
    expectDigits(basis.largestLeverage, levels.largestLeverage, 12);
    const plan = [3000, 100];
    expectDigits(familiarRange(basis, plan).leverage, familiarRange(levels, plan).leverage, 12);
  });
});

describe('what cannot be said', () => {
  it('is refused with a reason for a year that has been observed', () => {
    expect(oneYear(levels, [1, 2], 1954)).toEqual({
      year: 1954,
      expected: null,
      reason: 'FY1954 is not after FY1954, the last observed year of F03.',
    });
  });

  it('is refused for a plan with too few values or one that is not a number', () => {
    expect(oneYear(levels, [1])).toEqual(
      jasmine.objectContaining({ reason: 'Expected 2 values, for value, capital; found 1.' }),
    );
    expect(oneYear(levels, [NaN, 1])).toEqual(
      jasmine.objectContaining({ reason: 'No value is given for value.' }),
    );
  });

  it('leaves no band to a company of fewer than 5 rows, though the expected value has its interval', () => {
    const random = randomNumbers(3);
    const rows = Array.from({ length: 44 }, (_, index) => {
      const company = Math.floor(index / 10);
      const regressors = [100 * random(), 50 * random()];
      const outcome = 100 * company + regressors[0] + 40 * random();
      return { company: `K${company}`, year: 2000 + (index % 10), outcome, regressors };
    });
    const basis = fitOf(panelOf(rows, randomPanelNames), 'K4').prediction!;
    expect(expectedValue(basis, [50, 25]).high).toBeGreaterThan(0);
    expect(marketValueBand(basis, [50, 25], {}, tQuantile)).toEqual({
      confidence: 0.8,
      low: null,
      high: null,
      bandReason: 'K4 has 4 rows; a band needs at least 5.',
    });
  });

  it('leaves no interval to differences where the slopes’ method has no covariance', () => {
    const wild = {
      ...levels,
      slopeCovariance: null,
      slopeDegreesOfFreedom: null,
      slopeIntervalReason: 'A bootstrap has no covariance.',
    };
    const year = oneYear(wild, [2000, 300]);
    if (year.expected === null) throw new Error(year.reason);
    expect(year.difference.high).toBeNull();
    expect(year.difference.intervalReason).toBe('A bootstrap has no covariance.');
    expect(year.expected.high).not.toBeNull();
  });

  it('carries no gap where persistence is unknown', () => {
    const persistenceReason = 'No company has two fiscal years in a row.';
    const unknown = {
      ...levels,
      intervalReason: persistenceReason,
      ownErrors: { years: [1954], variance: 1, persistence: null, persistenceReason },
    };
    const years = [{ year: 1955, regressors: [1, 2] }];
    expect(predict(unknown, { years, start: 'carry-the-gap' }, tQuantile)).toEqual([
      { year: 1955, expected: null, reason: persistenceReason },
    ]);
    expect(oneYear(unknown, [1, 2]).expected?.intervalReason).toBe(persistenceReason);
  });

  it('is said of fits that were made before the own company’s errors were kept', () => {
    const earlier = { ...levels, ownErrors: undefined, form: undefined, lag: undefined };
    const reason = 'This fit was made before the own company’s errors were kept; run it again.';
    const year = oneYear(earlier, [2000, 300]);
    if (year.expected === null) throw new Error(year.reason);
    expect(year.expected).toEqual(expectedValue(levels, [2000, 300]));
    expect(year.band).toEqual({ confidence: 0.8, low: null, high: null, bandReason: reason });
    const years = [{ year: 1955, regressors: [2000, 300] }];
    expect(predict(earlier, { years, start: 'carry-the-gap' }, tQuantile)).toEqual([
      { year: 1955, expected: null, reason },
    ]);
  });

  it('is no reach where the slope is zero or the expected value has no interval', () => {
    const request = { regressor: 0, regressors: [2000, 300], target: 500 };
    const flat = { ...levels, coefficients: [levels.coefficients[0], 0, 1] };
    expect(reachValue(flat, request)).toEqual({
      value: null,
      reason: 'The slope of value is zero, so no value of it reaches another.',
    });
    const reach = reachValue({ ...levels, intervalReason: 'Too few years.' }, request);
    expect(reach).toEqual(jasmine.objectContaining({ range: null, rangeReason: 'Too few years.' }));
  });
});
