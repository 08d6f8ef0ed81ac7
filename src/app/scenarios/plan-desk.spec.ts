import { TestBed } from '@angular/core/testing';
import { UndoNotice } from '../ui/undo-notice';
import { logBasis } from '../ui/plan/testing/plan-basis';
import { openScenario } from './testing/opened-scenario';

describe('PlanDesk', () => {
  const grow = { kind: 'grow', percent: 10 } as const;

  it('keeps grid and sliders one state', () => {
    const { state, desk } = openScenario();
    desk.setAmount({ year: 2026, regressor: 0, value: 150 });
    expect(state.text().plan[0].values).toEqual([150, 1000]);
    desk.setPlan(state.text().plan.map(({ year, values }) => ({ year, values: [values[0], 900] })));
    expect(state.text().plan[0].values).toEqual([150, 900]);
    expect(state.reading()?.years[0].difference.estimate).toBe(130);
  });

  it('takes a whole paste back in one step, years that it added among it', () => {
    const { state, desk, edits } = openScenario();
    desk.paste({ text: '1\t2\n3\tlots\n5\t6\n7\t8', at: { year: 2026, regressor: 0 } });
    expect(state.text().plan.map(({ values }) => values)).toEqual([
      [1, 2],
      [3, 1000],
      [5, 6],
      [7, 8],
    ]);
    expect(desk.pasted()?.words).toBe('7 cells pasted. 1 cell kept as before.');
    expect(desk.pasted()?.bad.map(({ text }) => text)).toEqual(['lots']);
    expect(edits.undo()).toBe('7 cells pasted');
    expect(state.isChanged()).toBeFalse();
  });

  it('says that a rule is dropped when an amount under it is changed, and puts it back', () => {
    const { state, desk } = openScenario();
    const show = spyOn(TestBed.inject(UndoNotice), 'show').and.resolveTo();
    desk.setRule(0, grow);
    expect(show).not.toHaveBeenCalled();
    desk.setAmount({ year: 2027, regressor: 0, value: 150 });
    expect(state.text().rules[0].rule).toBeNull();
    const [words, undo] = show.calls.mostRecent().args;
    expect(words).toBe('The rule of capex is dropped: an amount under it was changed.');
    undo();
    expect(state.text().rules[0].rule).toEqual(grow);
    expect(state.text().plan[1].values[0]).toBeCloseTo(133.1, 9);
  });

  it('says in words what the engine refuses, and changes nothing', () => {
    const { state, desk } = openScenario({ basis: logBasis });
    expect(desk.setRule(0, { kind: 'grow', percent: -100 })).toBeFalse();
    expect(desk.refusal()).toBe('FY2026: The log form needs values above zero; capex is not.');
    expect(state.isChanged()).toBeFalse();
    expect(desk.setRule(0, grow)).toBeTrue();
    expect(desk.refusal()).toBe('');
  });

  it('goes back to the base in one step, rules and ranges with it', () => {
    const { state, desk, edits } = openScenario();
    desk.setRule(0, grow);
    desk.setRange(2026, 0, { low: 100, high: 140 });
    desk.resetToBase();
    expect(state.isChanged()).toBeFalse();
    edits.undo();
    expect(state.text().rules[0].rule).toEqual(grow);
    expect(state.text().uncertainty?.ranges[0][0]).toEqual({ low: 100, high: 140 });
  });

  it('brings all years inside at once, where they are not', () => {
    const { state, desk } = openScenario();
    desk.paste({ text: '400\n110\n500', at: { year: 2026, regressor: 0 } });
    desk.takeAllInside(state.reading()!.years);
    expect(state.reading()?.years.map(({ familiar }) => familiar.kind)).toEqual([
      'inside',
      'inside',
      'inside',
    ]);
    expect(state.text().plan[1].values[0]).toBe(110);
  });

  it('keeps low, high and seed, and takes them away', () => {
    const { state, desk } = openScenario();
    desk.setRange(2026, 0, { low: 100, high: 140 });
    desk.setSeed(42);
    expect(state.text().uncertainty?.seed).toBe(42);
    expect(state.text().uncertainty?.ranges[0]).toEqual([{ low: 100, high: 140 }, null]);
    desk.dropRanges();
    expect(state.text().uncertainty).toBeNull();
  });
});
