import { familiarRange } from '@prediction';
import { heldPlan, withValue } from './change-plan';
import { sliderRange, steppedInside } from './slider-range';
import { logBasis, planBasis } from './testing/plan-basis';

describe('sliderRange', () => {
  const plan = heldPlan(planBasis, 2);

  it('reaches beyond the own company’s range in round steps, and below zero only where something was', () => {
    const capex = sliderRange(planBasis, 0, plan);
    expect([capex.min, capex.max, capex.step]).toEqual([14, 240, 2]);
    expect(capex.familiar).toEqual({ low: 20, high: 300 });
    const low = { ...planBasis, ownRange: [{ low: 10, high: 150 }, planBasis.ownRange[1]] };
    expect(sliderRange(low, 0, plan).min).toBe(0);
    const debt = { ...planBasis, ownRange: [{ low: -50, high: 150 }, planBasis.ownRange[1]] };
    expect(sliderRange(debt, 0, plan).min).toBe(-150);
  });

  it('stays above zero in logs, down to a smaller amount that was typed', () => {
    const ownRange = [{ low: 10, high: 150 }, logBasis.ownRange[1]];
    const low = { ...logBasis, ownRange };
    const { min, step } = sliderRange(low, 0, plan);
    expect(min).toBeGreaterThan(0);
    expect(min).toBeLessThanOrEqual(step);
    expect(sliderRange(low, 0, withValue(plan, 2026, 0, 0.25)).min).toBe(0.25);
  });

  it('counts its steps from the held amount, so that it can be reached again', () => {
    for (const held of [100, 101.3, 0.7]) {
      const basis = { ...planBasis, last: { ...planBasis.last, regressors: [held, 1000] } };
      const { min, max, step } = sliderRange(basis, 0, heldPlan(basis, 2));
      for (const end of [min, max])
        expect((held - end) / step).toBeCloseTo(Math.round((held - end) / step), 9);
      expect(min).toBeGreaterThanOrEqual(0);
    }
  });

  it('widens to an amount that was typed beyond it', () => {
    expect(sliderRange(planBasis, 0, withValue(plan, 2026, 0, 900)).max).toBe(900);
    expect(sliderRange(planBasis, 0, withValue(plan, 2026, 0, -40)).min).toBe(-40);
  });

  it('has a step also for a company whose values never moved', () => {
    const still = {
      ...planBasis,
      ownRange: [{ low: 0, high: 0 }, planBasis.ownRange[1]],
      last: { ...planBasis.last, regressors: [0, 1000] },
    };
    const { min, max, step } = sliderRange(still, 0, heldPlan(still, 1));
    expect(step).toBeGreaterThan(0);
    expect(max).toBeGreaterThan(min);
  });
});

describe('steppedInside', () => {
  const plan = heldPlan(planBasis, 1);

  it('takes the nearest amounts inside that the slider can show', () => {
    const far = familiarRange(planBasis, [400, 1300]);
    const [capex, equity] = steppedInside(planBasis, far, plan);
    const steps = [0, 1].map((k) => sliderRange(planBasis, k, plan).step);
    const held = planBasis.last.regressors;
    for (const [k, amount] of [capex, equity].entries()) {
      const stepsAway = (amount - held[k]) / steps[k];
      expect(stepsAway).toBeCloseTo(Math.round(stepsAway), 9);
    }
    expect(familiarRange(planBasis, [capex, equity]).kind).toBe('inside');
    expect(far.nearestInside[0] - capex).toBeLessThan(steps[0]);
  });

  it('keeps the exact amounts where rounding would leave the range', () => {
    // Far along one direction, hardly at all across it: 124 and 1,155 on the sliders lie across.
    const narrow = {
      ...planBasis,
      ownMeans: planBasis.last.regressors,
      inverseCrossProduct: [
        [1, -0.1],
        [-0.1, 0.01001],
      ],
    };
    const far = familiarRange(narrow, [160, 1500]);
    expect(steppedInside(narrow, far, plan)).toEqual(far.nearestInside);
  });
});
