import { planLineage } from './planned-figure';
import { lagBasis, logBasis, planBasis } from './testing/plan-basis';

describe('what is behind a planned figure', () => {
  const labels = ['capex', 'book equity'];
  const none = { estimate: 0.04, standardError: 0.01, low: 0.02, high: 0.06 };
  const years = [
    { year: 2026, values: [120, 1000] },
    { year: 2027, values: [150, 1000] },
  ].map((year) => ({ ...year, expected: none, difference: none, familiar: 'inside' as const }));
  const plan = { name: 'Build-out', years };

  it('is money in amounts; a difference of logs is none, and says what it is', () => {
    const wanted = { plan, year: years[0], kind: 'difference' as const };
    expect(planLineage(wanted, labels, planBasis).isMoney).toBeTrue();
    const inLogs = planLineage(wanted, labels, logBasis);
    expect(inLogs.isMoney).toBeFalse();
    expect(inLogs.label).toBe('Build-out: difference to the base in 2026, in natural logs');
    const expected = planLineage({ ...wanted, kind: 'expected' }, labels, logBasis);
    expect(expected.isMoney).toBeTrue();
    expect(expected.label).toBe('Build-out: expected value in 2026, the mean');
  });

  it('names what was read with a lag: the last actual values, then the plan of the year before', () => {
    const inputs = (year: (typeof years)[number]) =>
      planLineage({ plan, year, kind: 'expected' }, labels, lagBasis).inputs;
    expect(inputs(years[0])[0]).toEqual({
      label: 'Capex of FY2025',
      value: 110,
      isMoney: true,
      figure: null,
    });
    expect(inputs(years[1])[0].label).toBe('Capex planned for FY2026');
    expect(inputs(years[1])[0].value).toBe(120);
  });
});
