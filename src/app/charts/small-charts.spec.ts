import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { type Type } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { ChartHarness } from './chart-harness';
import { DifferenceBars } from './difference-bars/difference-bars';
import { FitComparison } from './fit-comparison/fit-comparison';
import { SlopeIntervals } from './slope-intervals/slope-intervals';

async function shown(component: Type<unknown>, inputs: Record<string, unknown>) {
  const fixture = TestBed.createComponent(component);
  const text = { title: 'A finding', caption: 'EUR m', source: '' };
  for (const [name, value] of Object.entries({ text, ...inputs }))
    fixture.componentRef.setInput(name, value);
  const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
  return { chart, page: fixture.nativeElement as HTMLElement };
}

describe('slope intervals', () => {
  it('gives estimate and bounds the same digits, in the chart as in the table', async () => {
    const { chart } = await shown(SlopeIntervals, {
      slopes: [
        { name: '1 more of capex', estimate: 1.84, low: 0.92, high: 2.76 },
        { name: '1 more of staff', estimate: 2, low: null, high: null, intervalReason: 'few rows' },
      ],
    });
    expect(await chart.points()).toEqual([
      '1 more of capex: 1.84 (0.92 to 2.76)',
      '1 more of staff: 2.00 (no interval: few rows)',
    ]);
    await chart.toggle();
    expect(await chart.table()).toEqual([
      ['1 more of capex', '1.84', '0.92', '2.76'],
      ['1 more of staff', '2.00', 'n/a', 'n/a'],
    ]);
  });
});

describe('difference bars', () => {
  it('lists the parts and what they come to, and draws the total hollow', async () => {
    const { chart, page } = await shown(DifferenceBars, {
      kind: 'plain',
      terms: [
        { name: 'Capex', estimate: 1790, low: 1300, high: 2280 },
        { name: 'Book equity', estimate: -250, low: -540, high: 40 },
      ],
      total: { estimate: 1540, low: 900, high: 2180 },
    });
    await chart.toggle();
    expect(await chart.table()).toEqual([
      ['Capex', '+1,790', '1,300 to 2,280'],
      ['Book equity', '\u2212250', '\u2212540 to 40'],
      ['Together', '+1,540', '900 to 2,180'],
    ]);
    expect(page.querySelectorAll('rect.bar').length).toBe(3);
    expect(page.querySelectorAll('rect.bar.total').length).toBe(1);
  });

  it('says that figures may not sum only where rounding shows', async () => {
    const note = async (second: number) => {
      const { page } = await shown(DifferenceBars, {
        kind: 'plain',
        terms: [
          { name: 'Capex', estimate: 1000.4, low: null, high: null },
          { name: 'Book equity', estimate: second, low: null, high: null },
        ],
        total: { estimate: 1000.4 + second, low: null, high: null },
      });
      return page.querySelector('p.kv-caption')?.textContent ?? '';
    };
    expect(await note(200.4)).toContain('may not sum');
    expect(await note(200)).toBe('');
  });
});

describe('fit comparison', () => {
  it('fills the mark of the fit in question and hollows the other, and says why one is missing', async () => {
    const standing = { estimate: 2100, low: 700, high: 3400 };
    const { chart, page } = await shown(FitComparison, {
      kind: 'plain',
      fits: [
        { name: 'this fit', standing },
        { name: 'the one before', standing: { ...standing, estimate: 1700 } },
        { name: 'the first', standing: null, reason: 'own company left out' },
      ],
    });
    expect(await chart.points()).toEqual([
      'this fit: 2,100 (700 to 3,400)',
      'the one before: 1,700 (700 to 3,400)',
      'the first: own company left out',
    ]);
    expect(page.querySelectorAll('path.own').length).toBe(2);
    expect(page.querySelectorAll('path.own.other').length).toBe(1);
    await chart.toggle();
    expect((await chart.table())[2]).toEqual([
      'the first',
      'n/a',
      'n/a',
      'n/a',
      'own company left out',
    ]);
  });
});
