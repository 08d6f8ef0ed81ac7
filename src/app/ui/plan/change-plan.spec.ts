import {
  heldPlan,
  isSamePlan,
  withValue,
  withYearAdded,
  withYearRemoved,
  withYearSet,
} from './change-plan';
import { planBasis } from './testing/plan-basis';

const years = (plan: readonly { readonly year: number }[]) => plan.map(({ year }) => year);

describe('changing a plan', () => {
  const plan = heldPlan(planBasis, 3);

  it('starts from the last actual values in the years after the last observed one', () => {
    expect(plan).toEqual([
      { year: 2026, values: [110, 1000] },
      { year: 2027, values: [110, 1000] },
      { year: 2028, values: [110, 1000] },
    ]);
  });

  it('adds years up to five and keeps at least one', () => {
    let longest = plan;
    for (let more = 0; more < 4; more += 1) longest = withYearAdded(longest);
    expect(years(longest)).toEqual([2026, 2027, 2028, 2029, 2030]);
    let shortest = plan;
    for (let fewer = 0; fewer < 4; fewer += 1) shortest = withYearRemoved(shortest);
    expect(years(shortest)).toEqual([2026]);
  });

  it('gives an added year the values of the year before it', () => {
    const changed = withValue(plan, 2028, 0, 180);
    expect(withYearAdded(changed)[3]).toEqual({ year: 2029, values: [180, 1000] });
  });

  it('changes one amount and leaves the plan it came from alone', () => {
    const changed = withValue(plan, 2027, 1, 900);
    expect(changed.map(({ values }) => values[1])).toEqual([1000, 900, 1000]);
    expect(plan[1].values[1]).toBe(1000);
    expect(withYearSet(plan, 2026, [1, 2])[0].values).toEqual([1, 2]);
  });

  it('tells plans apart by years and by values', () => {
    expect(isSamePlan(plan, heldPlan(planBasis, 3))).toBeTrue();
    expect(isSamePlan(plan, heldPlan(planBasis, 2))).toBeFalse();
    expect(isSamePlan(plan, withValue(plan, 2027, 1, 900))).toBeFalse();
  });
});
