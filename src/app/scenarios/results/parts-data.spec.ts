import { type TQuantile, type YearEffectEstimates } from '@prediction';
import { usualOutlook } from '../../ui/plan/asked-plan';
import { readPlan } from '../../ui/plan/read-plan';
import { tQuantile } from '../../ui/plan/t-quantile';
import { logBasis, planBasis } from '../../ui/plan/testing/plan-basis';
import { partsFromLast, partsToBase } from './parts-data';

const labels = ['capex', 'book equity'];
const plan = [{ year: 2026, values: [130, 1100] }];
const quantile: TQuantile = tQuantile;

function sumOf(terms: readonly { readonly estimate: number }[]): number {
  return terms.reduce((sum, { estimate }) => sum + estimate, 0);
}

describe('parts of a difference', () => {
  it('are slopes times differences against the base, and nothing else', () => {
    const [year] = readPlan(planBasis, plan, quantile).years;
    const { terms, total } = partsToBase(year, labels, planBasis);
    // 2 × (130 − 110) and −0.5 × (1,100 − 1,000).
    expect(terms.map(({ name, estimate }) => [name, estimate])).toEqual([
      ['Capex', 40],
      ['Book equity', -50],
    ]);
    expect(total.estimate).toBe(-10);
  });

  it('come to the expected value less the last actual one, with the gap that fades', () => {
    const [year] = readPlan(planBasis, plan, quantile).years;
    const { terms, total } = partsFromLast(year, labels, planBasis);
    expect(terms.map(({ name, estimate }) => [name, estimate])).toEqual([
      ['Capex', 40],
      ['Book equity', -50],
      ['Gap of FY2025 that fades', -30],
    ]);
    expect(sumOf(terms)).toBeCloseTo(total.estimate, 9);
    expect(total.estimate).toBeCloseTo(year.expected.estimate - 2750, 9);
    expect(total.low).toBeCloseTo(year.expected.low! - 2750, 9);
    expect(total.high).toBeCloseTo(year.expected.high! - 2750, 9);
  });

  it('have the year effect where the fit has one', () => {
    const yearEffects: YearEffectEstimates = {
      ownMean: 0,
      last: 12,
      lastYear: 2025,
      lastThree: 5,
      ownLast: 12,
    };
    const widened = (matrix: readonly (readonly number[])[]) =>
      Array.from({ length: 7 }, (_, row) =>
        Array.from({ length: 7 }, (_, column) => matrix.at(row)?.[column] ?? 0),
      );
    const basis = {
      ...planBasis,
      yearEffects,
      lambdas: planBasis.lambdas.map((lambda) => [...lambda, 0, 0, 0, 0]),
      a: widened(planBasis.a),
      d: widened(planBasis.d),
    };
    const outlook = { ...usualOutlook(basis), yearEffect: { given: 20 } };
    const [year] = readPlan(basis, plan, quantile, outlook).years;
    const { terms, total } = partsFromLast(year, labels, basis);
    expect(terms.at(-1)).toEqual(jasmine.objectContaining({ name: 'Year effect', estimate: 8 }));
    expect(sumOf(terms)).toBeCloseTo(total.estimate, 9);
  });

  it('add up in logs, with the smearing between median and mean', () => {
    const fitted = logBasis.ownLevel + 0.4 * Math.log(110 / 100);
    const last = { ...logBasis.last, residual: Math.log(2750) - fitted };
    const basis = { ...logBasis, last };
    const [year] = readPlan(basis, plan, quantile).years;
    const { terms, total } = partsFromLast(year, labels, basis);
    expect(terms.at(-1)).toEqual(
      jasmine.objectContaining({
        name: 'Smearing, from median to mean',
        estimate: Math.log(1.02),
      }),
    );
    expect(sumOf(terms)).toBeCloseTo(total.estimate, 9);
    expect(total.estimate).toBeCloseTo(Math.log(year.expected.estimate / 2750), 9);
    expect(total.low).toBeCloseTo(Math.log(year.expected.low! / 2750), 9);
  });
});
