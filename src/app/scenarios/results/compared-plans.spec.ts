import { usualOutlook } from '../../ui/plan/asked-plan';
import { tQuantile } from '../../ui/plan/t-quantile';
import { planBasis } from '../../ui/plan/testing/plan-basis';
import { type ComparedPlan, comparedDifferences, readCompared } from './compared-plans';

const outlook = usualOutlook(planBasis);
const plans: readonly ComparedPlan[] = [
  { id: null, name: 'This plan', plan: [{ year: 2026, values: [130, 1000] }], outlook },
  {
    id: '00000000-0000-4000-8000-000000000001',
    name: 'Build-out',
    plan: [
      { year: 2026, values: [160, 1000] },
      { year: 2027, values: [160, 1000] },
    ],
    outlook,
  },
];

describe('compared plans', () => {
  it('differ by slopes alone where they start alike: narrower than either value', () => {
    const read = readCompared(planBasis, plans, tQuantile);
    const [found, ...rest] = comparedDifferences(planBasis, read, read[0], tQuantile);
    expect(rest).toEqual([]);
    expect(found.year).toBe(2026);
    // 2 × 30, with the slope's standard error 0.2 and t(10).
    expect(found.difference.kind).toBe('slopes');
    expect(found.difference.estimate).toBeCloseTo(60, 9);
    expect(found.difference.high! - 60).toBeCloseTo(2.2281388519649385 * 0.2 * 30, 6);
    const { expected } = read[0].years[0];
    expect(found.difference.high! - found.difference.low!).toBeLessThan(
      expected.high! - expected.low!,
    );
  });

  it('take the confidence of the one that they are compared with', () => {
    const narrow = { ...plans[0], outlook: { ...outlook, confidence: 0.8 } };
    const read = readCompared(planBasis, [narrow, plans[1]], tQuantile);
    const [to80] = comparedDifferences(planBasis, read, read[0], tQuantile);
    const [to95] = comparedDifferences(planBasis, read, read[1], tQuantile);
    const width = ({ difference }: typeof to80) => difference.high! - difference.low!;
    expect(width(to80)).toBeLessThan(width(to95));
    expect(to95.difference.estimate).toBeCloseTo(-to80.difference.estimate, 9);
  });

  it('are each read in their own outlook', () => {
    const carrying = { ...outlook, start: 'carry-the-gap' as const };
    const ownErrors = { persistence: 0.5, years: [2024, 2025], variance: 100 };
    const basis = { ...planBasis, ownErrors };
    const read = readCompared(basis, [plans[0], { ...plans[1], outlook: carrying }], tQuantile);
    const [found] = comparedDifferences(basis, read, read[0], tQuantile);
    expect(found.difference.kind).toBe('calibrated');
    expect(found.difference.estimate).toBeCloseTo(60 + 0.5 * 30, 9);
  });
});
