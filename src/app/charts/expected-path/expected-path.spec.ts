import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import type { FitResult } from '@contract';
import type { ExpectedPathChoice } from '@figures';
import { NumberFormat } from '../../ui/number-format';
import { ChartHarness } from '../chart-harness';
import { ExpectedPath } from './expected-path';

const ownYears = [
  { year: 2024, fileRow: 17, actual: 8600, fitted: 8500, residual: 100, regressors: [1, 2] },
  { year: 2025, fileRow: 18, actual: 9400, fitted: 9000, residual: 400, regressors: [1, 2] },
] satisfies NonNullable<FitResult['ownYears']>;

function plan(name: string, ends: number) {
  return { name, years: [{ year: 2026, estimate: ends, low: ends - 300, high: ends + 300 }] };
}

describe('expected path', () => {
  async function shown() {
    TestBed.inject(NumberFormat).panelUnit.set('millions');
    const fixture = TestBed.createComponent(ExpectedPath);
    fixture.componentRef.setInput('text', { title: 'Plan B', caption: 'EUR m', source: '' });
    fixture.componentRef.setInput('ownYears', ownYears);
    fixture.componentRef.setInput('base', [{ year: 2026, estimate: 9000 }]);
    fixture.componentRef.setInput('plans', [plan('Plan B', 10340), plan('Plan A', 9890)]);
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    return { fixture, chart, page: fixture.nativeElement as HTMLElement };
  }

  it('says every year of every line, with the intervals of the plans', async () => {
    const { chart } = await shown();
    expect(await chart.points()).toEqual([
      '2024: actual 8,600, expected 8,500',
      '2025: actual 9,400, expected 9,000',
      '2026, base: expected 9,000',
      '2026, Plan B: expected 10,340 (10,040 to 10,640)',
      '2026, Plan A: expected 9,890 (9,590 to 10,190)',
    ]);
  });

  it('sums up where each line ends', async () => {
    const { page } = await shown();
    expect(page.querySelector('p.kv-visually-hidden')?.textContent).toBe(
      'In 2025 actual 9,400, expected 9,000. 2026, base: expected 9,000. ' +
        '2026, Plan B: expected 10,340 (10,040 to 10,640). 2026, Plan A: expected 9,890 (9,590 to 10,190).',
    );
  });

  it('has the values of the chart in its table', async () => {
    const { chart } = await shown();
    await chart.toggle();
    expect(await chart.table()).toEqual([
      ['own company', '2024', '8,600', '8,500', '', ''],
      ['own company', '2025', '9,400', '9,000', '', ''],
      ['base', '2026', '', '9,000', '', ''],
      ['Plan B', '2026', '', '10,340', '10,040', '10,640'],
      ['Plan A', '2026', '', '9,890', '9,590', '10,190'],
    ]);
  });

  it('has the band of the market value itself in the table where one is drawn', async () => {
    const { fixture, chart, page } = await shown();
    const [year] = plan('Plan B', 10340).years;
    const banded = { ...year, bandLow: 8000, bandHigh: 12680 };
    fixture.componentRef.setInput('plans', [
      { name: 'Plan B', years: [banded, { ...banded, year: 2027 }] },
    ]);
    await chart.toggle();
    expect((await chart.headers()).slice(-2)).toEqual(['band low', 'band high']);
    const table = await chart.table();
    expect(table[0].slice(-2)).toEqual(['', '']);
    expect(table.at(-1)).toEqual([
      'Plan B',
      '2027',
      '',
      '10,340',
      '10,040',
      '10,640',
      '8,000',
      '12,680',
    ]);
    expect(page.querySelector('.band-area')?.getAttribute('d')).not.toBe('');
    fixture.componentRef.setInput('bandName', '80 % band of the market value');
    await chart.toggle();
    // An interval at a higher level may cover the band: its edge stands over both.
    const shapes = [...page.querySelectorAll('path')].map((path) => path.getAttribute('class'));
    expect(shapes.indexOf('band-edge')).toBeGreaterThan(shapes.indexOf('interval-area within'));
    expect(page.querySelector('svg')?.textContent).toContain('80 % band of the market value');
    expect((await chart.points()).at(-1)).toBe(
      '2027, Plan B: expected 10,340 (10,040 to 10,640), 80 % band of the market value 8,000 to 12,680',
    );
  });

  it('tells plans apart by the shape of their marks, and what happened by whole and broken lines', async () => {
    const { page } = await shown();
    const shapes = [...page.querySelectorAll('path.plan-mark')].map((mark) =>
      mark.getAttribute('d'),
    );
    expect(new Set(shapes).size).toBe(2);
    const dashes = (selector: string) =>
      getComputedStyle(page.querySelector(selector)!).strokeDasharray;
    expect(dashes('.own-line')).toBe('none');
    expect(new Set(['.expected-line', '.plan-line', '.base-line'].map(dashes)).size).toBe(3);
  });

  it('reads out the point with the focus, and tells which year of which line was chosen', async () => {
    const { fixture, chart, page } = await shown();
    const chosen: ExpectedPathChoice[] = [];
    fixture.componentInstance.yearSelected.subscribe((choice) => chosen.push(choice));
    await chart.press(TestKey.END);
    expect(page.querySelector('.readout')?.textContent.trim()).toBe(
      '2026, Plan A: expected 9,890 (9,590 to 10,190)',
    );
    await chart.press(TestKey.ENTER);
    await chart.press(TestKey.HOME);
    await chart.press(TestKey.ENTER);
    await chart.press(TestKey.RIGHT_ARROW);
    await chart.press(TestKey.RIGHT_ARROW);
    await chart.press(TestKey.ENTER);
    expect(chosen).toEqual([
      { kind: 'plan', plan: 1, year: 2026 },
      { kind: 'actual', plan: 0, year: 2024 },
      { kind: 'base', plan: 0, year: 2026 },
    ]);
  });
});
