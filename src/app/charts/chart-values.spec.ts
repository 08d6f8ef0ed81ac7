import type { Type } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { By } from '@angular/platform-browser';
import { NumberFormat } from '../ui/number-format';
import { ChartFrame } from './chart-frame/chart-frame';
import { chartTable } from './chart-frame/chart-table';
import { CompanyLines } from './company-lines/company-lines';
import { CompanyMultiples } from './company-multiples/company-multiples';
import { CompanyPlane } from './company-plane/company-plane';
import { CoverageMap } from './coverage-map/coverage-map';
import { DifferenceBars } from './difference-bars/difference-bars';
import { ExpectedPath } from './expected-path/expected-path';
import { GapPath } from './gap-path/gap-path';
import { IntervalRows } from './interval-rows/interval-rows';
import { LeaveOneOut } from './leave-one-out/leave-one-out';
import { ResidualGroups } from './residual-groups/residual-groups';
import { ResidualScatter } from './residual-scatter/residual-scatter';
import { SlopeIntervals } from './slope-intervals/slope-intervals';
import { StandingChart } from './standing-chart/standing-chart';

/** What a chart of money in EUR m, shown in EUR k, gives a file: headers, then rows. */
async function fileOf(component: Type<unknown>, inputs: Record<string, unknown>) {
  const numbers = TestBed.inject(NumberFormat);
  numbers.currency.set('EUR');
  numbers.panelUnit.set('millions');
  numbers.unit.set('thousands');
  const fixture = TestBed.createComponent(component);
  const text = { title: 'A finding', caption: '', source: '' };
  for (const [name, value] of Object.entries({ text, ...inputs }))
    fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  const frame = fixture.debugElement.query(By.directive(ChartFrame))
    .componentInstance as ChartFrame;
  const { columns, rows } = chartTable(frame.text(), frame.columns(), frame.rows());
  return [columns.map(({ header }) => header), ...rows];
}

const interval = { estimate: 1.23456789, low: -0.1, high: 2.000000001 };
const inThousands = [1234.56789, -100, 2000.000001];

describe('the file of a chart has every digit under headers with their units:', () => {
  it('standings', async () => {
    const intercepts = [
      { company: 'Velmara', ...interval },
      { company: 'Ostrell', estimate: 0.5, low: null, high: null, intervalReason: 'few rows' },
    ];
    expect(await fileOf(StandingChart, { intercepts, ownCompany: 'Velmara' })).toEqual([
      ['company', 'value, EUR k', 'low, EUR k', 'high, EUR k', 'why no interval'],
      ['Velmara', ...inThousands, ''],
      ['Ostrell', 500, null, null, 'few rows'],
    ]);
  });

  it('gaps by year', async () => {
    const years = [
      { year: 2020, gap: 1.1, peers: 9 },
      { year: 2021, gap: null, peers: 0 },
    ];
    expect(await fileOf(GapPath, { years })).toEqual([
      ['year', 'gap to peers, EUR k', 'peers present'],
      [2020, 1100, 9],
      [2021, null, 0],
    ]);
  });

  it('expected values', async () => {
    const given = {
      ownYears: [{ year: 2020, actual: 1.1, fitted: null }],
      base: [{ year: 2021, estimate: 1.7 }],
      plans: [{ name: 'Plan A', years: [{ year: 2021, ...interval, bandLow: -9.9, bandHigh: 9 }] }],
    };
    const units = ['actual', 'expected', 'low', 'high', 'band low', 'band high'];
    expect(await fileOf(ExpectedPath, given)).toEqual([
      ['line', 'year', ...units.map((name) => `${name}, EUR k`)],
      ['own company', 2020, 1100, null, null, null, null, null],
      ['base', 2021, null, 1700, null, null, null, null],
      ['Plan A', 2021, null, ...inThousands, -9900, 9000],
    ]);
  });

  it('slopes, open ends in words', async () => {
    const slopes = [{ name: '1 more of capex', ...interval, unbounded: 'high' }];
    expect(await fileOf(SlopeIntervals, { slopes })).toEqual([
      ['change', 'goes with', 'low', 'high'],
      ['1 more of capex', 1.23456789, -0.1, 'open'],
    ]);
    expect((await fileOf(SlopeIntervals, { slopes, kind: 'money' }))[0][1]).toBe(
      'goes with, EUR k',
    );
  });

  it('what leaving one out changes, the interval of all beside it', async () => {
    const leftOut = [
      { name: 'Ostrell', estimate: 2.5 },
      { name: 'Tolvane', estimate: null, reason: 'one year' },
    ];
    expect(await fileOf(LeaveOneOut, { leftOut, full: { ...interval, estimate: 1.25 } })).toEqual([
      [
        ...['without company', 'standing, EUR k', 'low, EUR k', 'high, EUR k'],
        ...['change, EUR k', 'why none'],
      ],
      ['Ostrell', 2500, null, null, 1250, ''],
      ['Tolvane', null, null, null, null, 'one year'],
      ['with all', 1250, ...inThousands.slice(1), null, ''],
    ]);
  });

  it('differences, their intervals in two columns', async () => {
    const terms = [{ name: 'Capex', ...interval }];
    expect(await fileOf(DifferenceBars, { terms, total: interval })).toEqual([
      ['part', 'difference, EUR k', 'low, EUR k', 'high, EUR k'],
      ['Capex', ...inThousands],
      ['Together', ...inThousands],
    ]);
  });

  it('residuals by row and by group', async () => {
    const rows = [
      {
        ...{ company: 'Velmara', year: 2013, fileRow: 21 },
        ...{ fitted: 0.3, residual: -0.0412345, studentised: -3.14159 },
      },
    ];
    expect(await fileOf(ResidualScatter, { rows, ownCompany: 'Velmara' })).toEqual([
      ['company', 'year', 'fitted, EUR k', 'residual, EUR k', 'studentised', 'row of the file'],
      ['Velmara', 2013, 300, -41.2345, -3.14159, 21],
    ]);
    const groups = [
      { label: '2014', count: 12, mean: 0.1, standardDeviation: 1.23456789, largest: null },
    ];
    expect(await fileOf(ResidualGroups, { groups, rowName: 'year' })).toEqual([
      ['year', 'mean, EUR k', 'standard deviation, EUR k', 'largest, EUR k', 'rows'],
      ['2014', 100, 1234.56789, null, 12],
    ]);
  });

  it('lines of companies', async () => {
    const line = { from: [1.1, 2.2], to: [0.12345, 0.7] };
    const titles = { xTitle: 'capex, EUR k', yTitle: 'ratio', yKind: 'plain' };
    expect(
      await fileOf(CompanyLines, {
        ...{ companies: [{ company: 'Velmara', ...line }], pooled: line, ownCompany: 'Velmara' },
        ...titles,
      }),
    ).toEqual([
      ['line', 'from capex, EUR k', 'to capex, EUR k', 'from ratio', 'to ratio'],
      ['Velmara', 1100, 123.45, 2.2, 0.7],
      ['one line for all', 1100, 123.45, 2.2, 0.7],
    ]);
  });

  it('companies over time', async () => {
    expect(
      await fileOf(CompanyMultiples, {
        rows: [{ company: 'Velmara', year: 2021, values: [1.1, 1.2345678], flagged: [] }],
        variables: [
          { name: 'capex', kind: 'money' },
          { name: 'staff', kind: 'plain' },
        ],
        years: [2020, 2021],
      }),
    ).toEqual([
      ['company', 'variable', '2020', '2021'],
      ['Velmara', 'capex, EUR k', null, 1100],
      ['Velmara', 'staff', null, 1.2345678],
    ]);
  });

  it('companies on two measures', async () => {
    const axis = (title: string) => ({
      ...{ title, isLog: false, text: String, tick: String },
      exact: (value: number) => value * 10,
    });
    const row = { company: 'Kesdrin', side: 'in', x: 1.5, y: 2, distance: '1.20' };
    expect(
      await fileOf(CompanyPlane, {
        rows: [{ ...row, exactDistance: 1.2034567 }],
        across: axis('market value, EUR k'),
        up: axis('growth, % a year'),
      }),
    ).toEqual([
      ['company', 'side', 'market value, EUR k', 'growth, % a year', 'distance'],
      ['Kesdrin', 'in', 15, 20, 1.2034567],
    ]);
  });

  it('what the panel covers, which is words', async () => {
    const cells = [{ company: 'Ardwyne', year: 2025, missing: ['capex'] }];
    expect(await fileOf(CoverageMap, { cells, variables: ['capex', 'staff'] })).toEqual([
      ['company', '2025'],
      ['Ardwyne', 'no capex'],
    ]);
  });

  it('one figure found in several ways, a share in per cent', async () => {
    const rows = [
      { name: 'by cosines', figure: { estimate: 0.07, low: 0.011, high: null, unbounded: 'high' } },
      { name: 'by clusters', figure: null, reason: 'few companies' },
    ];
    expect(await fileOf(IntervalRows, { rows, kind: 'percent' })).toEqual([
      ['way', 'estimate, %', 'low, %', 'high, %', 'remark'],
      ['by cosines', 7, 1.1, 'open', ''],
      ['by clusters', null, null, null, 'few companies'],
    ]);
  });
});
