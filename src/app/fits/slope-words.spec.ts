import type { NumberFormat } from '../ui/number-format';
import { slopeRemark, slopeSentence } from './slope-words';
import { examplePanelVersion, exampleResult } from './testing/example-fit';
import { exampleNumbers } from './testing/example-numbers';

describe('slopes in words', () => {
  let numbers: NumberFormat;

  beforeEach(() => {
    numbers = exampleNumbers();
  });

  const [capex, equity] = exampleResult.slopes;

  it('says what one more goes with, and within which bounds', () => {
    expect(slopeSentence(capex, 0, numbers)).toBe(
      'Each extra 1 of capex goes with 2.01 more market value (1.20 to 2.82)',
    );
  });

  it('says less and more at each bound of an interval that spans zero', () => {
    expect(slopeSentence(equity, 1, numbers)).toBe(
      'Each extra 1 of book equity goes with 0.508 less market value (1.20 less to 0.184 more)',
    );
  });

  it('writes bounds of a negative slope from the smaller to the larger', () => {
    expect(slopeSentence({ ...equity, high: -0.2 }, 1, numbers)).toContain(
      '0.508 less market value (0.200 to 1.20)',
    );
  });

  it('names a further regressor as the panel does, with the unit of its market value', () => {
    const employees = { ...capex, name: 'employees' };
    expect(slopeSentence(employees, 2, numbers)).toContain('of employees goes with');
    expect(slopeRemark(employees, 2, examplePanelVersion)).toBe(
      'Market value in EUR m, employees as it stands in the panel.',
    );
  });

  it('warns of few degrees of freedom and of a slope that is not told from none', () => {
    expect(slopeRemark(equity, 1, examplePanelVersion)).toBe(
      'Not clearly different from none. Rests on 2.07 degrees of freedom: one large company drives it.',
    );
    expect(slopeRemark(capex, 0, examplePanelVersion)).toBe('');
  });

  it('gives the reason where there is no interval', () => {
    const bare = { ...capex, low: null, high: null, intervalReason: 'perfect fit' };
    expect(slopeSentence(bare, 0, numbers)).toContain('(no interval)');
    expect(slopeRemark(bare, 0, examplePanelVersion)).toContain('perfect fit');
  });
});
