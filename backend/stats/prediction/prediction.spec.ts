import * as fc from 'fast-check';
import { tQuantile } from '../distributions/t-distribution';
import { expectDigits } from '../testing/expect-digits';
import { fitOf, goldenPanel, panelOf } from '../testing/golden-panels';
import { randomNumbers } from '../testing/random-panels';
import {
  decompositionFromLast,
  decompositionToBase,
  differenceToBase,
  expectedValue,
  familiarRange,
} from './index';

const data = goldenPanel('grunfeld11_value_on_inv_capital.csv', 'value', ['inv', 'capital']);
const fit = fitOf(data, 'C06');
const basis = fit.prediction!;
const plans = fc.tuple(
  fc.double({ min: -5000, max: 5000, noNaN: true }),
  fc.double({ min: -5000, max: 5000, noNaN: true }),
);

describe('expectedValue', () => {
  it('passes through the own company’s fitted values', () => {
    for (const year of fit.ownYears ?? [])
      expectDigits(
        expectedValue(basis, year.regressors).estimate,
        year.fitted,
        12,
        String(year.year),
      );
  });

  it('is the intercept and its interval at regressors of zero', () => {
    const intercept = fit.intercepts.find(({ company }) => company === 'C06');
    const value = expectedValue(basis, [0, 0]);
    for (const key of ['estimate', 'standardError', 'low', 'high'] as const)
      expectDigits(value[key], intercept?.[key] ?? NaN, 9, key);
  });

  it('says why there is no interval', () => {
    const value = expectedValue({ ...basis, intervalReason: 'Too few years.' }, [1, 2]);
    expect(value.low).toBeNull();
    expect(value.intervalReason).toBe('Too few years.');
    expect(value.estimate).toBe(expectedValue(basis, [1, 2]).estimate);
  });
});

describe('differenceToBase', () => {
  it('of one unit of one regressor is that slope with its interval', () => {
    fit.slopes.forEach((slope, k) => {
      const difference = differenceToBase(basis, [k === 0 ? 1 : 0, k === 1 ? 1 : 0], tQuantile);
      for (const key of ['estimate', 'standardError', 'low', 'high'] as const)
        expectDigits(difference[key], slope[key] ?? NaN, 9, key);
    });
  });

  it('scales with the difference, however small or large', () => {
    const one = differenceToBase(basis, [1, -2], tQuantile);
    for (const size of [1e-90, 1e90]) {
      const other = differenceToBase(basis, [size, -2 * size], tQuantile);
      expectDigits(other.high, (one.high ?? NaN) * size, 12);
    }
  });

  it('of nothing is nothing, without doubt', () => {
    expect(differenceToBase(basis, [0, 0], tQuantile)).toEqual({
      estimate: 0,
      standardError: 0,
      low: 0,
      high: 0,
    });
  });

  it('has finite bounds at the largest confidence below 1, as every other interval has', () => {
    const sure = fitOf(data, 'C06', { confidence: 1 - 2 ** -53 });
    const difference = differenceToBase(sure.prediction!, [1, 0], tQuantile);
    const value = expectedValue(sure.prediction!, [1, 0]);
    for (const interval of [difference, value, ...sure.slopes, sure.standing, sure.drift]) {
      expect(interval?.high).toBeLessThan(Infinity);
      expect(interval?.low).toBeGreaterThan(-Infinity);
      expect(interval?.high).toBeGreaterThan(interval?.estimate ?? NaN);
    }
  });

  it('takes fixed degrees of freedom where the covariance has them', () => {
    const classical = fitOf(data, 'C06', { slopes: 'classical' });
    const difference =
      classical.prediction && differenceToBase(classical.prediction, [1, 0], tQuantile);
    expectDigits(difference?.high, classical.slopes[0].high ?? NaN, 12);
  });

  for (const slopes of ['cr2', 'cr1', 'cr0'] as const)
    it(`has no interval where one company alone determines it, just as the slope has none (${slopes})`, () => {
      // b varies in C3 only, a in the others only: C3's residuals are orthogonal to b, so a sandwich sees no variance.
      const random = randomNumbers(7);
      const rows = Array.from({ length: 8 * 12 }, (_, index) => {
        const company = Math.floor(index / 12);
        const regressors = company === 3 ? [4, 50 * random()] : [100 * random(), 9];
        const outcome = 100 * company + 2 * regressors[0] - regressors[1] + 40 * random();
        return { company: `C${company}`, year: 2000 + (index % 12), outcome, regressors };
      });
      const alone = fitOf(panelOf(rows, { outcome: 'y', regressors: ['a', 'b'] }), 'C3', {
        slopes,
      });
      const reason = 'No variance is left to judge it by: one company alone determines it.';
      expect(alone.slopes[0].standardError).toBeGreaterThan(0);
      expect(alone.slopes[1].standardError).toBeNull();
      expect(alone.slopes[1].intervalReason).toBe(reason);
      const difference = differenceToBase(alone.prediction!, [0, 3], tQuantile);
      expect(difference.standardError).toBeNull();
      expect(difference.intervalReason).toBe(reason);
      expectDigits(difference.estimate, 3 * alone.slopes[1].estimate, 12);
      const other = differenceToBase(alone.prediction!, [1, 0], tQuantile);
      expectDigits(other.high, alone.slopes[0].high ?? NaN, 12);
    });

  it('says in the covariance’s own words why there is no variance, and in its own of an earlier engine’s basis', () => {
    const still = {
      ...basis,
      slopeCovariance: [
        [0, 0],
        [0, 0],
      ],
    };
    const reasons = [
      { ...still, slopeNoVarianceReason: 'Nothing is left.' },
      { ...still, slopeNoVarianceReason: undefined },
    ].map((one) => differenceToBase(one, [1, 0], tQuantile).intervalReason);
    expect(reasons).toEqual([
      'Nothing is left.',
      'No variance is left to judge it by: one company alone determines this difference.',
    ]);
  });

  it('has no interval where the slopes have none', () => {
    const difference = differenceToBase(
      { ...basis, slopeIntervalReason: 'Perfect.' },
      [1, 0],
      tQuantile,
    );
    expect(difference.high).toBeNull();
    expect(difference.intervalReason).toBe('Perfect.');
  });
});

describe('decompositions', () => {
  it('against a base add up to the difference of the expected values', () => {
    fc.assert(
      fc.property(plans, plans, (plan, base) => {
        const { terms, total } = decompositionToBase(basis, plan, base, tQuantile);
        expect(total).toBe(terms[0].estimate + terms[1].estimate);
        const difference =
          expectedValue(basis, plan).estimate - expectedValue(basis, base).estimate;
        expect(Math.abs(total - difference)).toBeLessThan(1e-8);
      }),
    );
  });

  it('against the last actual value add up to the way from there to the expected value', () => {
    fc.assert(
      fc.property(plans, (plan) => {
        const { terms, fadingGap, total } = decompositionFromLast(basis, plan, tQuantile);
        expect(total).toBe(terms[0].estimate + terms[1].estimate + fadingGap);
        expect(
          Math.abs(total - (expectedValue(basis, plan).estimate - basis.last.actual)),
        ).toBeLessThan(1e-8);
      }),
    );
  });
});

describe('familiarRange', () => {
  it('holds every year of the own company to be inside', () => {
    for (const { regressors, year } of fit.ownYears ?? []) {
      expect(familiarRange(basis, regressors).kind).withContext(String(year)).toBe('inside');
    }
  });

  it('tells the edge from what lies outside', () => {
    const kinds = fitOf(data, 'C05').prediction!;
    const [capex, equity] = kinds.last.regressors;
    const at = (factor: number): string => familiarRange(kinds, [capex * factor, equity]).kind;
    expect([at(1), at(3), at(30)]).toEqual(['inside', 'edge', 'outside']);
  });

  it('says which planned value left which observed range', () => {
    const { ownRange, peerRange } = basis;
    const { reasons } = familiarRange(basis, [ownRange[0].high + 1, peerRange[1].low - 1]);
    expect(reasons.map(({ regressor, own, peers }) => [regressor, own, peers])).toEqual([
      ['inv', 'above', 'above'],
      ['capital', 'below', 'below'],
    ]);
  });

  it('shrinks a plan on the line from the last actual values until it is just inside', () => {
    fc.assert(
      fc.property(plans, (plan) => {
        const { kind, nearestInside } = familiarRange(basis, plan);
        expect(familiarRange(basis, nearestInside).kind).toBe('inside');
        if (kind === 'inside') {
          expect(nearestInside).toEqual(plan);
          return;
        }
        const last = basis.last.regressors;
        const share = (nearestInside[0] - last[0]) / (plan[0] - last[0]);
        expect(nearestInside[1]).toBeCloseTo(last[1] + share * (plan[1] - last[1]), 6);
        const further = last.map((value, k) => value + (share + 1e-6) * (plan[k] - value));
        expect(familiarRange(basis, further).kind).not.toBe('inside');
      }),
    );
  });
});
