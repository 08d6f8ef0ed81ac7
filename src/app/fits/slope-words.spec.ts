import type { NumberFormat } from '../ui/number-format';
import { type SlopeReading, slopeChange, slopeRemark, slopeSentence } from './slope-words';
import { exampleLogResult, examplePanelVersion, exampleResult } from './testing/example-fit';
import { exampleNumbers } from './testing/example-numbers';

describe('slopes in words', () => {
  let numbers: NumberFormat;

  beforeEach(() => {
    numbers = exampleNumbers();
  });

  const [capex, equity] = exampleResult.slopes;
  const plain: SlopeReading = { index: 0, form: 'levels', lag: 0 };
  const inLogs: SlopeReading = { ...plain, form: 'log' };

  it('says what one more goes with, and within which bounds', () => {
    expect(slopeSentence(capex, plain, numbers)).toBe(
      'Each extra 1 of capex goes with 2.01 more market value (1.20 to 2.82)',
    );
  });

  it('says less and more at each bound of an interval that spans zero', () => {
    expect(slopeSentence(equity, { ...plain, index: 1 }, numbers)).toBe(
      'Each extra 1 of book equity goes with 0.508 less market value (1.20 less to 0.184 more)',
    );
  });

  it('writes bounds of a negative slope from the smaller to the larger', () => {
    expect(slopeSentence({ ...equity, high: -0.2 }, { ...plain, index: 1 }, numbers)).toContain(
      '0.508 less market value (0.200 to 1.20)',
    );
  });

  it('names a further regressor as the panel does, with the unit of its market value', () => {
    const employees = { ...capex, name: 'employees' };
    expect(slopeSentence(employees, { ...plain, index: 2 }, numbers)).toContain(
      'of employees goes with',
    );
    expect(slopeRemark(employees, { ...plain, index: 2 }, examplePanelVersion)).toBe(
      'Market value in EUR m, employees as it stands in the panel.',
    );
  });

  it('warns of few degrees of freedom and of a slope that is not told from none', () => {
    expect(slopeRemark(equity, { ...plain, index: 1 }, examplePanelVersion)).toBe(
      'Not clearly different from none. Rests on 2.07 degrees of freedom: one large company drives it.',
    );
    expect(slopeRemark(capex, plain, examplePanelVersion)).toBe('');
  });

  it('gives the reason where there is no interval', () => {
    const bare = { ...capex, low: null, high: null, intervalReason: 'perfect fit' };
    expect(slopeSentence(bare, plain, numbers)).toContain('(no interval)');
    expect(slopeRemark(bare, plain, examplePanelVersion)).toContain('perfect fit');
  });

  it('reads a slope of logs as percent for percent', () => {
    const [elasticity] = exampleLogResult.slopes;
    expect(slopeSentence(elasticity, inLogs, numbers)).toBe(
      '1 % more capex goes with 0.420 % more market value (0.100 to 0.700)',
    );
    const employees = { ...elasticity, name: 'employees' };
    expect(slopeRemark(employees, { ...inLogs, index: 2 }, examplePanelVersion)).toBe('');
  });

  it('says that a regressor is read a year late', () => {
    expect(slopeSentence(capex, { ...plain, lag: 1 }, numbers)).toContain(
      'Each extra 1 of capex of the year before goes with 2.01 more',
    );
    expect(slopeChange(capex, { ...inLogs, lag: 1 })).toBe('1 % more capex of the year before');
  });

  it('says that an interval of the bootstrap has no upper or no lower end', () => {
    const [, equityInLogs] = exampleLogResult.slopes;
    const reading = { ...inLogs, index: 1 };
    expect(slopeSentence(equityInLogs, reading, numbers)).toBe(
      '1 % more book equity goes with 0.300 % more market value (0.0500 more and up, no upper end)',
    );
    expect(slopeRemark(equityInLogs, reading, examplePanelVersion)).toBe(
      'The draws rule out no value on the high side.',
    );
    const falling = { ...equityInLogs, low: null, high: 0.2, unbounded: 'low' as const };
    expect(slopeSentence(falling, reading, numbers)).toContain(
      '(0.200 more and down, no lower end)',
    );
    expect(slopeRemark(falling, reading, examplePanelVersion)).toBe(
      'Not clearly different from none. The draws rule out no value on the low side.',
    );
  });
});
