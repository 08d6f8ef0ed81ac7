import { type AskedPlan, heldAsked } from '../ui/plan/asked-plan';
import { planBasis } from '../ui/plan/testing/plan-basis';
import { noHistory, redone, stepped, undone } from './plan-history';

describe('the history of a plan', () => {
  const plans: readonly AskedPlan[] = [1, 2, 3].map((years) => heldAsked(planBasis, years));

  it('leads back and forth', () => {
    const one = stepped(noHistory, plans[0], { words: 'first' }, 0);
    const two = stepped(one, plans[1], { words: 'second' }, 10);
    const back = undone(two, plans[2]);
    expect(back?.words).toBe('second');
    expect(back?.plan).toBe(plans[1]);
    const forth = redone(back!.history, plans[1]);
    expect(forth?.plan).toBe(plans[2]);
    expect(redone(forth!.history, plans[2])).toBeNull();
    expect(undone(noHistory, plans[0])).toBeNull();
  });

  it('takes moves of one slider that follow each other at once as one step', () => {
    const key = 'Capex FY2026';
    const one = stepped(noHistory, plans[0], { words: key, key }, 0);
    const two = stepped(one, plans[1], { words: key, key }, 900);
    expect(two.past.map(({ plan }) => plan)).toEqual([plans[0]]);
    const later = stepped(two, plans[2], { words: key, key }, 2000);
    expect(later.past.length).toBe(2);
    const other = stepped(two, plans[2], { words: 'Capex FY2027', key: 'Capex FY2027' }, 950);
    expect(other.past.length).toBe(2);
  });

  it('forgets what could be done again once there is a new step', () => {
    const one = stepped(noHistory, plans[0], { words: 'first' }, 0);
    const back = undone(one, plans[1]);
    const anew = stepped(back!.history, plans[0], { words: 'anew' }, 10);
    expect(redone(anew, plans[2])).toBeNull();
  });
});
