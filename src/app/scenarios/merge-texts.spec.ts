import { heldAsked, isSameAsked } from '../ui/plan/asked-plan';
import { withRange, withRule } from '../ui/plan/change-asked';
import { withValue } from '../ui/plan/change-plan';
import { planBasis } from '../ui/plan/testing/plan-basis';
import { mergedTexts } from './merge-texts';
import type { ScenarioText } from './scenario-text';
import { textDifferences } from './text-differences';

const held: ScenarioText = { name: 'Build-out', note: '', ...heldAsked(planBasis, 2) };
const ground = {
  basis: planBasis,
  labels: ['capex', 'book equity'],
  numbers: { shown: (value: number) => value, full: (value: unknown) => String(value) },
};

function planned(text: ScenarioText, year: number, regressor: number, value: number): ScenarioText {
  return { ...text, plan: withValue(text.plan, year, regressor, value) };
}

function ruled(text: ScenarioText): ScenarioText {
  const change = withRule(planBasis, text, 0, { kind: 'grow', percent: 10 });
  if (change.kind === 'refused') throw new Error(change.reason);
  return { ...text, ...change.asked };
}

describe('two versions of a scenario', () => {
  const mine = planned({ ...held, note: 'mine' }, 2026, 0, 150);
  const theirs = planned(planned(held, 2026, 0, 200), 2027, 1, 900);

  it('differ place by place', () => {
    expect(textDifferences(mine, theirs, ground)).toEqual([
      { key: 'note', label: 'Note', left: 'mine', right: '–' },
      { key: 'amount 0 2026', label: 'Capex FY2026', left: '150', right: '200' },
      { key: 'amount 1 2027', label: 'Book equity FY2027', left: '1000', right: '900' },
    ]);
    expect(textDifferences(mine, mine, ground)).toEqual([]);
  });

  it('come together as chosen, cell by cell', () => {
    const merged = mergedTexts(planBasis, mine, theirs, new Set(['amount 1 2027']));
    expect(merged.note).toBe('mine');
    expect(merged.plan.map(({ values }) => values)).toEqual([
      [150, 1000],
      [110, 900],
    ]);
  });

  it('are one of them where all is taken from it', () => {
    const keys = textDifferences(mine, theirs, ground).map(({ key }) => key);
    expect(isSameAsked(mergedTexts(planBasis, mine, theirs, new Set(keys)), theirs)).toBeTrue();
    expect(isSameAsked(mergedTexts(planBasis, mine, theirs, new Set()), mine)).toBeTrue();
  });

  it('offer a regressor under a rule as a whole', () => {
    const rows = textDifferences(mine, ruled(held), ground);
    expect(rows.map(({ key }) => key)).toEqual(['note', 'regressor 0']);
    expect(rows[1].left).toBe('is entered year by year: 150 · 110');
    expect(rows[1].right).toContain('grows 10 % a year from FY2025’s 110: 121');
    const merged = mergedTexts(planBasis, mine, ruled(held), new Set(['regressor 0']));
    expect(merged.rules[0].rule).toEqual({ kind: 'grow', percent: 10 });
    expect(merged.plan[0].values[0]).toBeCloseTo(121, 9);
  });

  it('keep a range of one that holds the amount of the other', () => {
    const ranged = { ...theirs, ...withRange(theirs, 2026, 0, { low: 190, high: 210 }) };
    const merged = mergedTexts(planBasis, mine, ranged, new Set(['range 0 2026']));
    expect(merged.uncertainty?.ranges[0][0]).toEqual({ low: 150, high: 210 });
  });

  it('take years from one of them with the amounts that only it has', () => {
    const longer = { ...theirs, ...heldAsked(planBasis, 3) };
    const merged = mergedTexts(planBasis, mine, longer, new Set(['years']));
    expect(merged.plan.map(({ year }) => year)).toEqual([2026, 2027, 2028]);
    expect(merged.plan[0].values[0]).toBe(150);
  });
});
