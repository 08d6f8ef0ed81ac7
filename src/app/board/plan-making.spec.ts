import { TestBed } from '@angular/core/testing';
import { NumberFormat } from '../ui/number-format';
import { planMaking } from './plan-making';
import { plannedIn } from './planned-in';
import { editionContent } from './testing/edition-content';

describe('how the amounts of a scenario were made', () => {
  const [scenario] = editionContent.scenarios;
  const labels = ['capex', 'book equity'];
  let numbers: NumberFormat;

  beforeEach(() => {
    numbers = TestBed.inject(NumberFormat);
    numbers.panelUnit.set('millions');
    numbers.unit.set('millions');
  });

  it('is told by outlook, rules, moves and ranges', () => {
    const told = planMaking(
      {
        ...scenario,
        outlook: {
          start: 'carry-the-gap',
          yearEffect: 'mean-of-last-three',
          confidence: 0.95,
          bandConfidence: 0.8,
        },
        rules: [
          { rule: { kind: 'share', percent: 12, of: 1 }, moves: [] },
          { rule: { kind: 'grow', percent: -3 }, moves: [{ year: 2027, amount: -150 }] },
        ],
        uncertainty: { seed: 7, ranges: [[{ low: 1, high: 2 }, null]] },
      },
      labels,
      true,
      numbers,
    );
    expect(told).toEqual([
      'Starts at the last actual value; the gap to the model fades.',
      'Year effect of planned years: the mean of the last three observed.',
      '95 % intervals of the expected value, 80 % band of the market value.',
      'Capex is 12 % of book equity of the same year.',
      'Book equity falls by 3 % a year, less 150 from FY2027 on.',
      '1 planned amount has a low and a high; seed of the draws 7.',
    ]);
  });

  it('says nothing that an edition of old did not freeze', () => {
    expect(planMaking(scenario, labels, false, numbers)).toEqual([]);
  });
});

describe('the plan’s figure that a sentence writes', () => {
  const [{ name, plan, years }] = editionContent.scenarios;
  const planned = {
    name,
    years: years.map((year, index) => ({ ...year, values: plan[index].values })),
  };
  const other = {
    name: 'Other',
    years: planned.years.map((year) => ({
      ...year,
      expected: { ...year.expected, estimate: 1 },
    })),
  };

  it('is found by its number where plans share a year', () => {
    const expected = planned.years[0].expected.estimate;
    expect(plannedIn([other, planned], 'expected.2026', expected, 'levels')?.plan.name).toBe(name);
    expect(plannedIn([other, planned], 'expected.2026', 1, 'levels')?.plan.name).toBe('Other');
  });

  it('is none of a fit', () => {
    expect(plannedIn([planned], 'standing', 1800, 'levels')).toBeUndefined();
    expect(plannedIn([planned], 'expected.1999', 1800, 'levels')).toBeUndefined();
  });
});
