import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import type { ResidualSpread } from '@figures';
import { NumberFormat } from '../../ui/number-format';
import { ChartHarness } from '../chart-harness';
import { ResidualGroups } from './residual-groups';

const companies: readonly ResidualSpread[] = [
  { label: 'Ostrell', count: 18, standardDeviation: 20, largest: -55 },
  { label: 'Velmara', count: 18, standardDeviation: 45, largest: 130 },
];
const years: readonly ResidualSpread[] = [
  { label: '2013', count: 14, mean: -12, standardDeviation: 20, largest: -55 },
  { label: '2014', count: 14, mean: 30, standardDeviation: 60, largest: 130 },
];

describe('residual groups', () => {
  async function shown(inputs: Record<string, unknown>) {
    const numbers = TestBed.inject(NumberFormat);
    numbers.currency.set('EUR');
    numbers.panelUnit.set('millions');
    const fixture = TestBed.createComponent(ResidualGroups);
    const text = { title: 'Velmara varies most', caption: 'EUR m', source: '' };
    for (const [name, value] of Object.entries({ text, ...inputs }))
      fixture.componentRef.setInput(name, value);
    (fixture.nativeElement as HTMLElement).style.width = '760px';
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    return { fixture, chart, page: fixture.nativeElement as HTMLElement };
  }

  it('draws companies widest first, the own one by a diamond', async () => {
    const { chart, page } = await shown({ groups: companies, ownCompany: 'Velmara' });
    expect(await chart.points()).toEqual([
      'Velmara: standard deviation 45.0, largest 130.0',
      'Ostrell: standard deviation 20.0, largest \u221255.0',
    ]);
    expect(page.querySelectorAll('path.own').length).toBe(1);
    expect(page.querySelectorAll('circle.peer').length).toBe(1);
    expect(page.querySelectorAll('path.largest').length).toBe(2);
    await chart.toggle();
    expect(await chart.table()).toEqual([
      ['Ostrell', '20.0', '\u221255.0', '18'],
      ['Velmara', '45.0', '130.0', '18'],
    ]);
  });

  it('keeps years in their order and says their mean', async () => {
    const { chart, page } = await shown({ groups: years, order: 'given', rowName: 'year' });
    expect(await chart.points()).toEqual([
      '2013: mean \u221212.0, standard deviation 20.0, largest \u221255.0',
      '2014: mean 30.0, standard deviation 60.0, largest 130.0',
    ]);
    expect(page.querySelector('p.kv-visually-hidden')?.textContent).toContain('Widest: 2014');
    await chart.toggle();
    expect(await chart.headers()).toEqual([
      'year',
      'mean, EUR m',
      'standard deviation, EUR m',
      'largest, EUR m',
      'rows',
    ]);
  });

  it('draws 30 of 120, and holds all in its table', async () => {
    const groups = Array.from({ length: 120 }, (_, k) => ({
      ...companies[0],
      label: `Company ${k}`,
      standardDeviation: 200 - k,
    }));
    const { chart } = await shown({ groups, ownCompany: 'Company 90' });
    const points = await chart.points();
    expect(points.length).toBe(30);
    expect(points[29]).toMatch('^Company 90');
    await chart.toggle();
    expect((await chart.table()).length).toBe(120);
  });

  it('tells which was chosen, where one leads somewhere', async () => {
    const { fixture, chart } = await shown({ groups: companies, isChoice: true });
    const chosen: string[] = [];
    fixture.componentInstance.groupSelected.subscribe((label) => chosen.push(label));
    await chart.clickPoint(/^Ostrell/);
    expect(chosen).toEqual(['Ostrell']);
  });
});
