import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import type { ResidualRow } from '@figures';
import { NumberFormat } from '../../ui/number-format';
import { ChartHarness } from '../chart-harness';
import { ResidualScatter } from './residual-scatter';
import { scatterMove } from './scatter-move';

const rows: readonly ResidualRow[] = [
  { company: 'Ostrell', year: 2012, fileRow: 7, fitted: 100, residual: 5, studentised: 0.4 },
  { company: 'Velmara', year: 2013, fileRow: 21, fitted: 300, residual: -40, studentised: -3.1 },
  { company: 'Tolvane', year: 2014, fileRow: 0, fitted: 200, residual: 30, studentised: null },
];

describe('residual scatter', () => {
  async function shown(inputs: Record<string, unknown> = {}) {
    const numbers = TestBed.inject(NumberFormat);
    numbers.currency.set('EUR');
    numbers.panelUnit.set('millions');
    const fixture = TestBed.createComponent(ResidualScatter);
    const text = { title: 'One row stands out', caption: 'EUR m', source: '' };
    for (const [name, value] of Object.entries({ text, rows, ownCompany: 'Velmara', ...inputs }))
      fixture.componentRef.setInput(name, value);
    (fixture.nativeElement as HTMLElement).style.width = '760px';
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    const page = fixture.nativeElement as HTMLElement;
    document.body.append(page);
    const chosen: string[] = [];
    fixture.componentInstance.rowSelected.subscribe(({ company, year }) =>
      chosen.push(`${company} ${year}`),
    );
    return { fixture, chart, page, chosen };
  }

  it('names the largest by company and year', async () => {
    const { page } = await shown();
    const words = [...page.querySelectorAll('svg text.rim')].map((word) => word.textContent.trim());
    expect(words[0]).toBe('Velmara 2013');
    expect(page.querySelector('svg text.own-word')?.textContent.trim()).toBe('Velmara 2013');
  });

  it('is one tab stop that starts at the largest, and walks left to right and up and down', async () => {
    const { chart, page } = await shown();
    expect(page.querySelectorAll('svg[tabindex], svg [tabindex]').length).toBe(1);
    expect(await chart.cloudPoint()).toBe(
      'Velmara 2013: residual \u221240.0, fitted 300.0, studentised \u22123.10',
    );
    const cloud = await chart.cloud();
    await cloud.sendKeys(TestKey.LEFT_ARROW);
    expect(await chart.cloudPoint()).toMatch('^Tolvane 2014.*studentised n/a');
    await cloud.sendKeys(TestKey.DOWN_ARROW);
    expect(await chart.cloudPoint()).toMatch('^Ostrell 2012');
    await cloud.sendKeys(TestKey.END, TestKey.RIGHT_ARROW);
    expect(await chart.cloudPoint()).toMatch('^Velmara 2013');
    expect(page.querySelector('.readout')?.textContent).toContain('Velmara 2013');
  });

  it('tells the row that was chosen by Enter and by click, and none beside the points', async () => {
    const { chart, page, chosen } = await shown();
    await (await chart.cloud()).sendKeys(TestKey.HOME, TestKey.ENTER);
    const svg = page.querySelector('svg')!;
    const [box, at] = [svg.getBoundingClientRect(), page.querySelector('.cursor')!];
    const click = (dx: number) =>
      svg.dispatchEvent(
        new MouseEvent('click', {
          clientX: box.left + Number(at.getAttribute('cx')) + dx,
          clientY: box.top + Number(at.getAttribute('cy')),
        }),
      );
    click(4);
    click(80);
    expect(chosen).toEqual(['Ostrell 2012', 'Ostrell 2012']);
  });

  it('shows the same values as a table, the largest first', async () => {
    const { chart } = await shown();
    await chart.toggle();
    expect(await chart.headers()).toEqual([
      'company',
      'year',
      'fitted, EUR m',
      'residual, EUR m',
      'studentised',
      'row of the file',
    ]);
    expect(await chart.table()).toEqual([
      ['Velmara', '2013', '300.0', '\u221240.0', '\u22123.10', '21'],
      ['Ostrell', '2012', '100.0', '5.0', '0.40', '7'],
      ['Tolvane', '2014', '200.0', '30.0', 'n/a', 'added'],
    ]);
  });

  it('draws 5,000 points as two paths and says when they are not all', async () => {
    const many = Array.from({ length: 5000 }, (_, k) => ({
      ...rows[0],
      company: `Company ${k % 120}`,
      year: 2000 + (k % 25),
      fileRow: k,
      fitted: 1e3 * Math.sin(k),
      residual: 1e2 * Math.cos(7 * k),
      studentised: 3 * Math.cos(7 * k),
    }));
    const { page } = await shown({ rows: many, of: 40_000, ownCompany: 'Company 3' });
    expect(page.querySelectorAll('svg *').length).toBeLessThan(120);
    const marks = page.querySelector('path.peer')?.getAttribute('d')?.match(/M/g)?.length ?? 0;
    const own = page.querySelector('path.own')?.getAttribute('d')?.match(/M/g)?.length ?? 0;
    expect(marks + own).toBe(5000);
    expect(page.querySelector('.kv-caption')?.textContent).toContain('5,000 of 40,000 rows');
  });

  it('is a picture without points where there are none', async () => {
    const { chart, page } = await shown({ rows: [] });
    expect(await chart.cloudPoint()).toBeNull();
    expect(page.querySelector('svg')?.getAttribute('role')).toBe('img');
  });
});

describe('moving in a cloud of points', () => {
  const orders = { byFitted: [2, 0, 1], byResidual: [1, 2, 0] };

  it('goes to the next fitted value and to the next residual, and stops at the ends', () => {
    expect(scatterMove('ArrowRight', 2, orders)).toBe(0);
    expect(scatterMove('ArrowRight', 1, orders)).toBe(1);
    expect(scatterMove('ArrowUp', 0, orders)).toBe(2);
    expect(scatterMove('PageUp', 0, orders)).toBe(1);
    expect(scatterMove('Home', 1, orders)).toBe(2);
    expect(scatterMove('End', 2, orders)).toBe(1);
  });

  it('leaves other keys alone, and an empty chart', () => {
    expect(scatterMove('Tab', 0, orders)).toBeNull();
    expect(scatterMove('End', 0, { byFitted: [], byResidual: [] })).toBeNull();
  });
});
