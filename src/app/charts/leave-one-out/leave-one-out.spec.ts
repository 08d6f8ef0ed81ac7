import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import type { LeftOut } from '@figures';
import { NumberFormat } from '../../ui/number-format';
import { ChartHarness } from '../chart-harness';
import { LeaveOneOut } from './leave-one-out';

const leftOut: readonly LeftOut[] = [
  { name: 'Tolvane', estimate: 1500 },
  { name: 'Ostrell', estimate: 2350 },
  { name: 'Kestrane', estimate: null, reason: 'too few rows' },
];

describe('leave one out', () => {
  async function shown(inputs: Record<string, unknown> = {}) {
    const numbers = TestBed.inject(NumberFormat);
    numbers.currency.set('EUR');
    numbers.panelUnit.set('millions');
    const fixture = TestBed.createComponent(LeaveOneOut);
    const text = { title: 'Tolvane moves the standing most', caption: 'EUR m', source: '' };
    const full = { estimate: 2100, low: 700, high: 3400 };
    for (const [name, value] of Object.entries({ text, leftOut, full, ...inputs }))
      fixture.componentRef.setInput(name, value);
    (fixture.nativeElement as HTMLElement).style.width = '760px';
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    return { fixture, chart, page: fixture.nativeElement as HTMLElement };
  }

  it('says for each peer the figure without it and how far that is from the full one', async () => {
    const { chart, page } = await shown();
    expect(await chart.points()).toEqual([
      'without Tolvane: 1,500, \u2212600',
      'without Ostrell: 2,350, +250',
      'without Kestrane: too few rows',
    ]);
    expect(page.querySelectorAll('path.own').length).toBe(2);
    const summary = page.querySelector('p.kv-visually-hidden')?.textContent;
    expect(summary).toContain('standing with all 2,100 (700 to 3,400).');
    expect(summary).toContain('it lies between 1,500 and 2,350.');
  });

  it('writes a change that rounds to zero as zero is written', async () => {
    const { chart } = await shown({ leftOut: [{ name: '2014', estimate: 2100.0004 }] });
    expect(await chart.points()).toEqual(['without 2014: 2,100, –']);
  });

  it('gives the change of a share in percentage points, drawn and in the table', async () => {
    const { chart } = await shown({
      kind: 'percent',
      full: { estimate: 0.34, low: 0.1, high: 0.6 },
      leftOut: [
        { name: 'Tolvane', estimate: 0.281 },
        { name: 'Ostrell', estimate: 0.36 },
        { name: 'Kestrane', estimate: 0.34 },
      ],
    });
    expect(await chart.points()).toEqual([
      'without Tolvane: 28.1 %, \u22125.9 pp',
      'without Ostrell: 36.0 %, +2.0 pp',
      'without Kestrane: 34.0 %, –',
    ]);
    await chart.toggle();
    expect((await chart.table()).map(([, , change]) => change)).toEqual([
      '\u22125.9 pp',
      '+2.0 pp',
      '–',
      '',
    ]);
  });

  it('shows the same values as a table, with all in the last row', async () => {
    const { chart } = await shown();
    await chart.toggle();
    expect(await chart.headers()).toEqual([
      'without company',
      'standing, EUR m',
      'change',
      'why none',
    ]);
    expect(await chart.table()).toEqual([
      ['Tolvane', '1,500', '\u2212600', ''],
      ['Ostrell', '2,350', '+250', ''],
      ['Kestrane', 'n/a', 'n/a', 'too few rows'],
      ['with all (700 to 3,400)', '2,100', '', ''],
    ]);
  });

  it('tells which peer was chosen, by click and by Enter', async () => {
    const { fixture, chart } = await shown();
    const chosen: string[] = [];
    fixture.componentInstance.companySelected.subscribe((company) => chosen.push(company));
    await chart.clickPoint(/Ostrell/);
    await chart.press(TestKey.END, TestKey.ENTER);
    expect(chosen).toEqual(['Ostrell', 'Kestrane']);
  });

  it('leaves years without a way out where there is none', async () => {
    const years = [{ name: '2014', estimate: 2000 }];
    const { fixture, chart, page } = await shown({ leftOut: years, isChoice: false });
    let chosen = 0;
    fixture.componentInstance.companySelected.subscribe(() => (chosen += 1));
    await chart.clickPoint(/2014/);
    expect(chosen).toBe(0);
    expect(page.querySelector('g[role="button"]')).toBeNull();
  });

  it('draws the 25 first of 119, and all of them in the table', async () => {
    const many = Array.from({ length: 119 }, (_, k) => ({
      name: `Company ${k}`,
      estimate: 2100 + 400 / (k + 1),
    }));
    const { chart, page } = await shown({ leftOut: many });
    expect((await chart.points()).length).toBe(25);
    const words = [...page.querySelectorAll('svg text')].map((word) => word.textContent.trim());
    expect(words).toContain('94 more in the table');
    await chart.toggle();
    expect((await chart.table()).length).toBe(120);
  });

  it('draws a slope by circles in ink', async () => {
    const { page } = await shown({ marks: 'model', kind: 'plain' });
    expect(page.querySelectorAll('circle.ink-mark').length).toBe(2);
    expect(page.querySelectorAll('path.own').length).toBe(0);
  });
});
