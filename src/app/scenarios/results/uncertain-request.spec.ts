import { uncertainPlan } from '@prediction';
import { usualOutlook } from '../../ui/plan/asked-plan';
import { planBasis } from '../../ui/plan/testing/plan-basis';
import { isSameQuestion, uncertainRequest } from './uncertain-request';

const plan = [{ year: 2026, values: [110, 1000] }];
const outlook = usualOutlook(planBasis);

describe('the question about an uncertain plan', () => {
  it('is none while every amount is certain', () => {
    expect(uncertainRequest(plan, null, outlook)).toBeNull();
    expect(uncertainRequest(plan, { seed: 1, ranges: [[null, null]] }, outlook)).toBeNull();
  });

  it('has the planned amount as the likeliest, and a point where it is certain', () => {
    const uncertainty = { seed: 7, ranges: [[{ low: 90, high: 150 }, null]] };
    const request = uncertainRequest(plan, uncertainty, outlook)!;
    expect(request.years[0].inputs).toEqual([
      { low: 90, likely: 110, high: 150 },
      { low: 1000, likely: 1000, high: 1000 },
    ]);
    expect([request.seed, request.draws]).toEqual([7, 10_000]);
    const [year] = uncertainPlan(planBasis, request);
    // The mean of the triangle is 350/3: 2,700 + 2 × (350/3 − 100).
    expect(year.expected?.mean).toBeCloseTo(2700 + 2 * (350 / 3 - 100), 0);
  });

  it('stays the same while nothing of it changes', () => {
    const uncertainty = { seed: 7, ranges: [[{ low: 90, high: 150 }, null]] };
    const ask = (seed: number) => ({
      basis: planBasis,
      request: uncertainRequest(plan, { ...uncertainty, seed }, outlook)!,
    });
    expect(isSameQuestion(ask(7), ask(7))).toBeTrue();
    expect(isSameQuestion(ask(7), ask(8))).toBeFalse();
    expect(isSameQuestion(ask(7), { ...ask(7), basis: { ...planBasis } })).toBeFalse();
    expect(isSameQuestion(null, ask(7))).toBeFalse();
  });
});
