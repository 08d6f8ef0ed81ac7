import type { PlanRule } from '@contract';
import { type AskedPlan, heldAsked } from './asked-plan';
import {
  type AskedChange,
  heldAgain,
  withAmounts,
  withMove,
  withPlan,
  withRange,
  withRule,
  withYearLess,
  withYearMore,
  withoutMove,
} from './change-asked';
import { logBasis, planBasis } from './testing/plan-basis';

const held = heldAsked(planBasis, 3);
const grow: PlanRule = { kind: 'grow', percent: 10 };

function done(change: AskedChange): AskedPlan {
  if (change.kind === 'refused') throw new Error(`expected a change; found ${change.reason}`);
  return change.asked;
}

const columnOf = ({ plan }: AskedPlan, k: number) => plan.map(({ values }) => values[k]);

describe('changing how a plan is asked', () => {
  const grown = done(withRule(planBasis, held, 0, grow));

  it('fills a regressor by its rule from the last actual amount', () => {
    expect(columnOf(grown, 0).map((value) => Number(value.toFixed(9)))).toEqual([
      121, 133.1, 146.41,
    ]);
    expect(columnOf(grown, 1)).toEqual([1000, 1000, 1000]);
  });

  it('reaches on with a rule when a year is added', () => {
    expect(columnOf(done(withYearMore(planBasis, grown)), 0)[3]).toBeCloseTo(161.051, 9);
  });

  it('ends a rule whose amount is changed by hand, and says which', () => {
    const change = withAmounts(planBasis, grown, [{ year: 2027, regressor: 0, value: 150 }]);
    expect(change).toEqual(jasmine.objectContaining({ kind: 'changed', freed: [0] }));
    expect(done(change).rules[0].rule).toBeNull();
    expect(columnOf(done(change), 0)[1]).toBe(150);
    expect(columnOf(done(change), 0)[2]).toBeCloseTo(146.41, 9);
  });

  it('keeps a rule when the same amount is entered', () => {
    const [{ year, values }] = grown.plan;
    const change = withAmounts(planBasis, grown, [{ year, regressor: 0, value: values[0] }]);
    expect(change).toEqual(jasmine.objectContaining({ freed: [] }));
    expect(done(change).rules[0].rule).toEqual(grow);
  });

  it('follows the regressor that another is a share of', () => {
    const shared = done(withRule(planBasis, held, 0, { kind: 'share', percent: 12, of: 1 }));
    expect(columnOf(shared, 0)).toEqual([120, 120, 120]);
    const more = withAmounts(planBasis, shared, [{ year: 2028, regressor: 1, value: 2000 }]);
    expect(columnOf(done(more), 0)).toEqual([120, 120, 240]);
  });

  it('refuses in words what the engine refuses', () => {
    expect(withRule(planBasis, held, 0, { kind: 'grow', percent: -101 })).toEqual({
      kind: 'refused',
      reason: 'capex cannot shrink by more than 100 % a year.',
    });
    const total = { kind: 'total', total: -30, spread: 'even' } as const;
    expect(withRule(logBasis, held, 0, total)).toEqual({
      kind: 'refused',
      reason: 'FY2026: The log form needs values above zero; capex is not.',
    });
  });

  it('moves book equity from a year on, by hand and under a rule, and back again', () => {
    const raised = done(withMove(planBasis, held, 1, { year: 2027, amount: 200 }));
    expect(columnOf(raised, 1)).toEqual([1000, 1200, 1200]);
    const other = done(withMove(planBasis, raised, 1, { year: 2027, amount: -50 }));
    expect(columnOf(other, 1)).toEqual([1000, 950, 950]);
    expect(other.rules[1].moves).toEqual([{ year: 2027, amount: -50 }]);
    expect(columnOf(done(withoutMove(planBasis, other, 1, 2027)), 1)).toEqual([1000, 1000, 1000]);
    const ruled = done(withRule(planBasis, other, 1, grow));
    expect(columnOf(ruled, 1)[1]).toBeCloseTo(1210 - 50, 9);
    expect(columnOf(done(withoutMove(planBasis, ruled, 1, 2027)), 1)[1]).toBeCloseTo(1210, 9);
  });

  it('drops what moves in a year that is taken away', () => {
    const raised = done(withMove(planBasis, held, 1, { year: 2028, amount: 200 }));
    expect(done(withYearLess(planBasis, raised)).rules[1].moves).toEqual([]);
  });

  it('holds each amount within its range, and certain the years without one', () => {
    const ranged = withRange(held, 2026, 0, { low: 100, high: 120 });
    const moved = done(withAmounts(planBasis, ranged, [{ year: 2026, regressor: 0, value: 150 }]));
    expect(moved.uncertainty?.ranges[0]).toEqual([{ low: 100, high: 150 }, null]);
    expect(done(withYearMore(planBasis, moved)).uncertainty?.ranges[3]).toEqual([null, null]);
  });

  it('takes the plan of the sliders, and goes back to the base', () => {
    const plan = grown.plan.map(({ year, values }) => ({ year, values: [values[0], 900] }));
    const moved = withPlan(planBasis, grown, plan);
    expect(moved).toEqual(jasmine.objectContaining({ freed: [] }));
    expect(columnOf(done(moved), 1)).toEqual([900, 900, 900]);
    expect(done(heldAgain(planBasis, done(moved)))).toEqual(held);
  });
});
