import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { NumberFormat } from '../../ui/number-format';
import { ChartHarness } from '../chart-harness';
import { CompanyLines } from './company-lines';

const companies = [
  { company: 'Ostrell', from: [0, 100], to: [20, 140] },
  { company: 'Velmara', from: [10, 400], to: [30, 440] },
  { company: 'Kestrane', from: [20, 250], to: [40, 290] },
];
const points = [
  { company: 'Velmara', x: 12, y: 420 },
  { company: 'Velmara', x: 28, y: 430 },
  { company: 'Ostrell', x: 5, y: 90 },
];

describe('company lines', () => {
  async function shown(inputs: Record<string, unknown> = {}) {
    const numbers = TestBed.inject(NumberFormat);
    numbers.panelUnit.set('millions');
    const fixture = TestBed.createComponent(CompanyLines);
    const all = {
      text: { title: 'One line does not do', caption: 'EUR m', source: '' },
      companies,
      points,
      pooled: { from: [0, 120], to: [40, 420] },
      ownCompany: 'Velmara',
      xTitle: 'capex, EUR m',
      yTitle: 'market value, EUR m',
      ...inputs,
    };
    for (const [name, value] of Object.entries(all)) fixture.componentRef.setInput(name, value);
    (fixture.nativeElement as HTMLElement).style.width = '760px';
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    const page = fixture.nativeElement as HTMLElement;
    const words = () =>
      [...page.querySelectorAll('svg text')].map((word) => word.textContent.trim());
    return { fixture, chart, page, words };
  }

  it('draws the own company by a line and diamonds, peers by lines and circles, one line for all across', async () => {
    const { page, words } = await shown();
    expect(page.querySelector('.peer-lines')?.getAttribute('d')?.match(/M/g)?.length).toBe(2);
    expect(page.querySelectorAll('path.own').length).toBe(2);
    expect(page.querySelectorAll('circle.peer').length).toBe(1);
    expect(page.querySelectorAll('path.expected-line').length).toBe(1);
    expect(words()).toContain('one line for all');
    expect(words()).toContain('Velmara');
    expect(words()).toContain('capex, EUR m');
    expect(words()).toContain('market value, EUR m');
  });

  it('says both ends of each line, the highest first, and shows them as a table', async () => {
    const { chart } = await shown();
    expect(await chart.points()).toEqual([
      'Velmara, from 400.0 at 10.00 to 440.0 at 30.00',
      'Kestrane, from 250.0 at 20.00 to 290.0 at 40.00',
      'Ostrell, from 100.0 at – to 140.0 at 20.00',
    ]);
    await chart.toggle();
    expect((await chart.headers())[1]).toBe('from capex, EUR m');
    expect((await chart.table()).at(-1)).toEqual([
      'one line for all',
      '–',
      '40.00',
      '120.0',
      '420.0',
    ]);
  });

  it('names a peer while it has the focus, and tells when it is chosen', async () => {
    const many = Array.from({ length: 120 }, (_, k) => ({
      company: `Company ${k}`,
      from: [k % 30, 1000 - 8 * k],
      to: [(k % 30) + 20, 1000 - 8 * k],
    }));
    const { fixture, chart, words } = await shown({ companies: many, ownCompany: 'Company 60' });
    const chosen: string[] = [];
    fixture.componentInstance.companySelected.subscribe((company) => chosen.push(company));
    const named = () => words().filter((word) => word.startsWith('Company'));
    expect(named()).toEqual(['Company 60']);
    await chart.press(TestKey.DOWN_ARROW);
    expect(named()).toEqual(['Company 60', 'Company 1']);
    await chart.press(TestKey.ENTER);
    expect(chosen).toEqual(['Company 1']);
  });

  it('draws lines only where there are too many rows, and says so', async () => {
    const rows = Array.from({ length: 700 }, (_, k) => ({
      company: k < 10 ? 'Velmara' : 'Ostrell',
      x: k / 20,
      y: 100 + k / 5,
    }));
    const { page } = await shown({ points: rows });
    expect(page.querySelectorAll('circle.peer').length).toBe(0);
    expect(page.querySelectorAll('path.own').length).toBe(10);
    expect(page.querySelector('.kv-caption')?.textContent).toBe(
      'Lines only: the 690 rows of peers are not drawn.',
    );
  });
});
