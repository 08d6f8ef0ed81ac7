import type { PeerTrialReply } from '@contract';
import { exampleTrial, fitted } from '../testing/example-trial';
import { trialChanges } from './trial-changes';
import { largestFirst, ordered, pressed } from './trial-order';

const names = (list: readonly { readonly company: string }[]): readonly string[] =>
  list.map(({ company }) => company);

describe('what each choice would change', () => {
  it('is the standing, the places and every slope against the group as chosen', () => {
    const [first] = trialChanges(exampleTrial()).without;
    expect(first.change).toBe(10);
    expect(first.places).toEqual({ first: 1, last: 3, of: 4 });
    expect(first.slopes.map(({ change }) => change?.toFixed(6))).toEqual(['0.100000', '0.000000']);
    expect(first.marks).toEqual([]);
  });

  it('is not marked where every place stays possible, or an end moves by the one company alone', () => {
    const marks = (before: [number, number], after: [number, number], ranked: number) =>
      trialChanges(
        exampleTrial({
          chosen: fitted([100, 20, 180], before, 0.4),
          without: [
            { company: 'Company 2', outcome: fitted([110, 30, 190], after, 0.4, { ranked }) },
          ],
        }),
      ).without[0].marks;
    expect(marks([1, 5], [1, 4], 4)).toEqual([]);
    expect(marks([2, 5], [1, 4], 4)).toEqual([]);
    expect(marks([1, 5], [1, 6], 6)).toEqual([]);
    expect(marks([2, 5], [2, 3], 4)).toEqual(['places move']);
    expect(marks([2, 4], [3, 4], 4)).toEqual(['places move']);
  });

  it('is marked in words where a sign turns, zero comes into the interval or places move', () => {
    const [, third, fourth, fifth] = trialChanges(exampleTrial()).without;
    expect(third.marks).toEqual(['interval of the standing starts to hold zero', 'places move']);
    expect(fourth.marks).toEqual(['slope of capex changes sign']);
    expect(fifth.why).toBe('A regressor never changes within a company. (outlay)');
    const back = trialChanges(
      exampleTrial({
        chosen: fitted([10, -20, 40], [1, 3], 0.4),
        without: [{ company: 'Company 2', outcome: fitted([50, 10, 90], [1, 3], 0.4) }],
      }),
    );
    expect(back.without[0].marks).toEqual(['interval of the standing no longer holds zero']);
  });

  it('is a share in log form, its change in shares as well', () => {
    const trial = exampleTrial({
      chosen: fitted([Math.log(1.2), Math.log(1.1), Math.log(1.3)], [1, 3], 0.4),
      without: [{ company: 'Company 2', outcome: fitted([Math.log(1.5), 0, 1], [1, 3], 0.4) }],
    });
    const inLogs: PeerTrialReply = {
      ...trial,
      asked: { ...trial.asked, specification: { ...trial.asked.specification, form: 'log' } },
    };
    expect(trialChanges(inLogs).without[0].change).toBeCloseTo(0.3, 12);
  });

  it('is not there before it is computed, nor after a trial that ended without it', () => {
    const without = [{ company: 'Company 2', outcome: null }];
    const why = (state: PeerTrialReply['state']) =>
      trialChanges(exampleTrial({ state, without })).without[0].why;
    expect(why('running')).toBe('not computed yet');
    expect(why('cancelled')).toBe('not computed');
  });

  it('has no change where the group as chosen has no figures', () => {
    const { without, base } = trialChanges(exampleTrial({ chosen: null, state: 'cancelled' }));
    expect(base.why).toBe('not computed');
    expect(without[0].change).toBeNull();
    expect(without[0].marks).toEqual([]);
  });
});

describe('the order of changes', () => {
  const { without } = trialChanges(exampleTrial());

  it('has what moves the standing most first, whichever way, and what has no figures last', () => {
    expect(names(ordered(without, largestFirst))).toEqual([
      'Company 3',
      'Company 4',
      'Company 2',
      'Company 5',
    ]);
  });

  it('goes by any column, and turns round', () => {
    const bySlope = pressed(largestFirst, 'slope-0');
    expect(names(ordered(without, bySlope)).at(0)).toBe('Company 4');
    expect(names(ordered(without, pressed(bySlope, 'slope-0'))).at(-1)).toBe('Company 5');
    const byName = pressed(bySlope, 'company');
    expect(names(ordered(without, byName)).at(0)).toBe('Company 2');
    expect(names(ordered(without, pressed(byName, 'company'))).at(0)).toBe('Company 5');
    const byStanding = pressed(byName, 'standing');
    expect(names(ordered(without, byStanding)).slice(0, 3)).toEqual([
      'Company 4',
      'Company 2',
      'Company 3',
    ]);
  });
});
