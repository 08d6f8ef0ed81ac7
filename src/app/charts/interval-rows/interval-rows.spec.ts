import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import type { IntervalRow } from '@figures';
import { ChartHarness } from '../chart-harness';
import { IntervalRows } from './interval-rows';

const rows: readonly IntervalRow[] = [
  {
    name: 'cr2',
    note: 'default here',
    figure: { estimate: 1.84, low: 0.92, high: 2.76 },
    isMarked: true,
  },
  { name: 'wild', figure: { estimate: 1.84, low: 0.51, high: null, unbounded: 'high' } },
  {
    name: 'classical',
    figure: { estimate: 1.84, low: null, high: null, intervalReason: 'perfect fit' },
  },
  { name: 'two-way', figure: null, reason: 'too few years' },
];

describe('interval rows', () => {
  async function shown(inputs: Record<string, unknown> = {}, width = 640) {
    const fixture = TestBed.createComponent(IntervalRows);
    (fixture.nativeElement as HTMLElement).style.width = `${width}px`;
    const text = { title: 'Capex differs from 0 in 2 of 4 ways', caption: '', source: '' };
    for (const [name, value] of Object.entries({ text, rows, ...inputs }))
      fixture.componentRef.setInput(name, value);
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    return { chart, page: fixture.nativeElement as HTMLElement };
  }

  it('says each row with its note, its interval and why there is none', async () => {
    const { chart } = await shown();
    expect(await chart.points()).toEqual([
      'cr2, default here: 1.840 (0.920 to 2.760)',
      'wild: 1.840 (0.510 and up)',
      'classical: 1.840 (no interval), perfect fit',
      'two-way: too few years',
    ]);
  });

  it('shows the same values as a table, an open end as open', async () => {
    const { chart } = await shown({ rowName: 'intervals', figureName: 'slope on capex' });
    await chart.toggle();
    expect(await chart.headers()).toEqual(['intervals', 'slope on capex', 'low', 'high', 'remark']);
    expect(await chart.table()).toEqual([
      ['cr2', '1.840', '0.920', '2.760', 'default here'],
      ['wild', '1.840', '0.510', 'open', ''],
      ['classical', '1.840', 'n/a', 'n/a', 'perfect fit'],
      ['two-way', 'n/a', 'n/a', 'n/a', 'too few years'],
    ]);
  });

  it('fills the mark of the row in question, hollows the others, and draws an arrow at an open end', async () => {
    const { page } = await shown();
    expect(page.querySelectorAll('circle.ink-mark').length).toBe(3);
    expect(page.querySelectorAll('circle.ink-mark.other').length).toBe(2);
    expect(page.querySelectorAll('line.ink-interval').length).toBe(2);
    expect(page.querySelectorAll('path.arrow').length).toBe(1);
  });

  it('writes a long note and a long reason in lines, and says them whole', async () => {
    const reason =
      'Effects drawn from one distribution are no figure of any company, so they place none.';
    const note = 'of this fit, negative variance set to 0, with a remark below';
    const given = [
      { ...rows[0], note },
      { name: 'random effects', figure: null, reason },
    ];
    const { chart, page } = await shown({ rows: given }, 312);
    const written = [...page.querySelectorAll('svg text')]
      .map((each) => each.textContent?.trim())
      .join(' ');
    expect(written).toContain(note);
    expect(written).toContain(reason);
    expect(page.querySelectorAll('svg text.soft.rim').length).toBeGreaterThan(1);
    expect((await chart.points())[1]).toBe(`random effects: ${reason}`);
  });

  it('draws the own company by diamonds', async () => {
    const { page } = await shown({ marks: 'own', kind: 'money' });
    expect(page.querySelectorAll('path.own').length).toBe(3);
    expect(page.querySelectorAll('circle.ink-mark').length).toBe(0);
  });
});
