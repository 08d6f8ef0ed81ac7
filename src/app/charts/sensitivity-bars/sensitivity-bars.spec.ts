import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import type { SensitivityRow } from '@figures';
import { ChartHarness } from '../chart-harness';
import { SensitivityBars } from './sensitivity-bars';

const rows: readonly SensitivityRow[] = [
  {
    name: 'Capex',
    low: { at: '20', expected: { estimate: 2540, low: 2400, high: 2680 }, remark: '' },
    high: {
      at: '300',
      expected: { estimate: 3100, low: 2900, high: 3300 },
      remark: 'outside the familiar range',
    },
  },
];

describe('sensitivity bars', () => {
  async function shown(changed: readonly SensitivityRow[] = rows) {
    const fixture = TestBed.createComponent(SensitivityBars);
    const text = { title: 'A finding', caption: 'EUR m', source: '' };
    const inputs = {
      text,
      rows: changed,
      planned: 2700,
      endNames: ['10th', '90th'],
      kind: 'plain',
    };
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    return { chart, page: fixture.nativeElement as HTMLElement };
  }

  it('says what each end comes to, and walks them by arrow keys', async () => {
    const { chart } = await shown();
    expect(await chart.points()).toEqual([
      'Capex, 10th at 20: 2,540 (2,400 to 2,680)',
      'Capex, 90th at 300: 3,100 (2,900 to 3,300), outside the familiar range',
    ]);
    await chart.press(TestKey.DOWN_ARROW);
    expect(await chart.focusedPoint()).toContain('90th');
  });

  it('has the values of the chart in its table, with where the familiar range ends', async () => {
    const { chart } = await shown();
    await chart.toggle();
    expect(await chart.table()).toEqual([
      ['Capex', '10th', '20', '2,540', '2,400 to 2,680', 'inside'],
      ['Capex', '90th', '300', '3,100', '2,900 to 3,300', 'outside the familiar range'],
    ]);
  });

  it('tells the ends apart without colour', async () => {
    const { page } = await shown();
    const [low, high] = [...page.querySelectorAll('.end-interval')].map(
      (line) => getComputedStyle(line).strokeDasharray,
    );
    expect(low).not.toBe(high);
    expect(page.querySelectorAll('.bar.low').length).toBe(1);
  });

  it('says why an end has no expected value', async () => {
    const none = { at: '0', expected: null, reason: 'Nothing is read at zero.', remark: '' };
    const { chart } = await shown([{ ...rows[0], low: none }]);
    expect((await chart.points())[0]).toBe('Capex, 10th at 0: Nothing is read at zero.');
    await chart.toggle();
    expect((await chart.table())[0].slice(3, 5)).toEqual(['n/a', 'Nothing is read at zero.']);
  });
});
