import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { ChartHarness } from '../chart-harness';
import { PlanFan } from './plan-fan';

describe('plan fan', () => {
  async function shown() {
    const fixture = TestBed.createComponent(PlanFan);
    const inputs = {
      text: { title: 'A finding', caption: 'EUR m', source: '' },
      percents: [5, 25, 50, 75, 95],
      years: [{ year: 2026, percentiles: [2500, 2600, 2700, 2800, 2900] }],
      last: { year: 2025, actual: 2650 },
      kind: 'plain',
    };
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    return { chart, page: fixture.nativeElement as HTMLElement };
  }

  it('says what share of the draws lies below each line', async () => {
    const { chart, page } = await shown();
    expect((await chart.points()).at(-1)).toBe('2026, 95 % of the draws below 2,900');
    await chart.press(TestKey.END);
    expect(page.querySelector('.readout')?.textContent.trim()).toBe(
      '2026, 95 % of the draws below 2,900',
    );
  });

  it('sums each year up by its median and its ends', async () => {
    const { page } = await shown();
    expect(page.querySelector('p.kv-visually-hidden')?.textContent).toBe(
      '2026: median 2,700, from 2,500 (5 %) to 2,900 (95 %).',
    );
  });

  it('has every percentile in its table', async () => {
    const { chart } = await shown();
    await chart.toggle();
    expect((await chart.headers()).slice(1)).toEqual(['5 %', '25 %', '50 %', '75 %', '95 %']);
    expect(await chart.table()).toEqual([['2026', '2,500', '2,600', '2,700', '2,800', '2,900']]);
  });

  it('parts its areas without colour', async () => {
    const { page } = await shown();
    const dashes = [...page.querySelectorAll('.area')].map(
      (path) => getComputedStyle(path).strokeDasharray,
    );
    expect(new Set(dashes).size).toBe(dashes.length);
  });
});
