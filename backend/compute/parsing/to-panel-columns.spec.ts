import { tableOf } from '../testing/tables';
import { toPanelColumns } from './to-panel-columns';

const header = ['company', 'year', 'y', 'x'];

describe('toPanelColumns', () => {
  it('keeps missing numbers as gaps and each row with its line of the file', () => {
    const table = tableOf(
      header,
      ['A', 'FY2020', '1,5', ''],
      ['', '2021', '1', '1'],
      ['B', '2021', '2', '3'],
    );
    const { data, problems, leftOut } = toPanelColumns(table, {
      company: 'company',
      year: 'year',
      outcome: 'y',
      regressors: ['x'],
    });
    expect(problems).toEqual([]);
    expect(leftOut.map(({ row }) => row)).toEqual([3]);
    expect([...data.fileRow]).toEqual([2, 4]);
    expect([...data.outcome.values]).toEqual([1.5, 2]);
    expect([...data.regressors[0].values]).toEqual([NaN, 3]);
    expect(data.companies).toEqual(['A', 'B']);
  });

  it('reads a column’s decimals off all of its rows, also those that it leaves out', () => {
    const table = tableOf(
      header,
      ['A', '2020', '1.250', '1'],
      ['Sum', '', '1,5', '1'],
      ['B', '2020', '2.250', '1'],
    );
    const { data, problems } = toPanelColumns(table, {
      company: 'company',
      year: 'year',
      outcome: 'y',
      regressors: ['x'],
    });
    expect([...data.outcome.values]).toEqual([1250, 2250]);
    expect(problems).toEqual([]);
  });

  it('reads the newer forms of years and numbers, and finds no fault in doubtful ones', () => {
    const table = tableOf(
      header,
      ['A', '2019/20', '€1,250', '12%'],
      ['A', '31.12.2021', '—', '0.5'],
    );
    const { data, problems, leftOut } = toPanelColumns(table, {
      company: 'company',
      year: 'year',
      outcome: 'y',
      regressors: ['x'],
    });
    expect([...data.year]).toEqual([2020, 2021]);
    expect([...data.outcome.values]).toEqual([1250, NaN]);
    expect([...data.regressors[0].values]).toEqual([0.12, 0.5]);
    expect(problems).toEqual([]);
    expect(leftOut).toEqual([]);
  });
});
