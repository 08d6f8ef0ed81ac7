import { differenceTable } from './difference-table';
import { furthestBy } from './furthest-by';

describe('the table of differences', () => {
  it('takes the furthest case of each figure, and one without a number before all others', () => {
    const checks = [
      { figure: 'slopes', difference: 1e-15 },
      { figure: 'drift', difference: 1e-12 },
      { figure: 'slopes', difference: NaN },
      { figure: 'slopes', difference: 1e-3 },
    ];
    expect(furthestBy(checks, ({ figure }) => figure)).toEqual([
      { key: 'slopes', count: 3, furthest: checks[2] },
      { key: 'drift', count: 1, furthest: checks[1] },
    ]);
  });

  it('marks what lies beyond its tolerance, also where there is no number', () => {
    const row = { cases: 2, dataSet: 'demo', tolerance: 1e-9 };
    const lines = differenceTable([
      { ...row, figure: 'slopes', difference: 1e-9 },
      { ...row, figure: 'drift', difference: 2e-9 },
      { ...row, figure: 'band', difference: NaN },
    ]).split('\n');
    expect(lines.map((line) => line.endsWith('beyond'))).toEqual([false, false, true, true]);
  });
});
