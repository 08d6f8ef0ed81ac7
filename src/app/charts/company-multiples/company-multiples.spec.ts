import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { NumberFormat } from '../../ui/number-format';
import { ChartHarness } from '../chart-harness';
import { type ChosenFigure, CompanyMultiples } from './company-multiples';

const rows = [
  { company: 'Ostrell', year: 2020, values: [100, 10] },
  { company: 'Ostrell', year: 2021, values: [200, null], flagged: [0] },
  { company: 'Velmara', year: 2020, values: [900, 90] },
  { company: 'Velmara', year: 2021, values: [950, 95] },
];

describe('company multiples', () => {
  async function shown() {
    const numbers = TestBed.inject(NumberFormat);
    numbers.currency.set('EUR');
    numbers.panelUnit.set('millions');
    const fixture = TestBed.createComponent(CompanyMultiples);
    (fixture.nativeElement as HTMLElement).style.width = '900px';
    const all = {
      text: { title: 'Two companies', caption: '', source: '' },
      rows,
      variables: [
        { name: 'market value', kind: 'money' },
        { name: 'capex', kind: 'money' },
      ],
      ownCompany: 'Velmara',
      years: [2020, 2021],
    };
    for (const [name, value] of Object.entries(all)) fixture.componentRef.setInput(name, value);
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    const chosen: ChosenFigure[] = [];
    fixture.componentInstance.figureSelected.subscribe((figure) => chosen.push(figure));
    const page = fixture.nativeElement as HTMLElement;
    const current = () => {
      const id = page.querySelector('[role="grid"]')?.getAttribute('aria-activedescendant');
      return page.querySelector(`#${id}`)?.getAttribute('aria-label');
    };
    return { chart, page, chosen, current, grid: await chart.grid() };
  }

  it('draws the own company in its own line and mark, the peers in theirs', async () => {
    const { page } = await shown();
    expect(page.querySelectorAll('path.own-line').length).toBe(2);
    expect(page.querySelectorAll('path.peer-line').length).toBe(2);
    expect(page.querySelector('.own-word')?.textContent.trim()).toBe('Velmara');
    const flags = [...page.querySelectorAll('path.flag')].map((flag) => flag.getAttribute('d'));
    expect(flags.filter((path) => path !== '').length).toBe(1);
  });

  it('is one tab stop: arrows walk years and variables across, companies down', async () => {
    const { page, grid, current, chosen } = await shown();
    expect(page.querySelectorAll('svg [tabindex], svg[tabindex]').length).toBe(1);
    expect(current()).toBe('Velmara 2020 market value, EUR m: 900.0');
    await grid.sendKeys(TestKey.RIGHT_ARROW, TestKey.DOWN_ARROW);
    expect(current()).toBe('Ostrell 2021 market value, EUR m: 200.0, flagged');
    await grid.sendKeys(TestKey.END);
    expect(current()).toBe('Ostrell 2021 capex, EUR m: n/a');
    await grid.sendKeys(TestKey.ENTER);
    expect(chosen).toEqual([{ company: 'Ostrell', year: 2021, variable: 1 }]);
  });

  it('tells the figure that is clicked', async () => {
    const { page, chosen } = await shown();
    const svg = page.querySelector('[role="grid"]')!;
    const box = svg.getBoundingClientRect();
    const end = svg.querySelectorAll('.figure.soft')[3];
    const names = [...svg.querySelectorAll('text.name')];
    svg.dispatchEvent(
      new MouseEvent('click', {
        clientX: box.left + Number(end.getAttribute('x')),
        clientY: box.top + Number(names[1].getAttribute('y')) - 4,
      }),
    );
    expect(chosen).toEqual([{ company: 'Ostrell', year: 2021, variable: 1 }]);
  });

  it('shows the same figures as a table', async () => {
    const { chart } = await shown();
    await chart.toggle();
    expect(await chart.headers()).toEqual(['company', 'variable', '2020', '2021']);
    expect(await chart.table()).toEqual([
      ['Velmara', 'market value, EUR m', '900.0', '950.0'],
      ['Velmara', 'capex, EUR m', '90.00', '95.00'],
      ['Ostrell', 'market value, EUR m', '100.0', '200.0'],
      ['Ostrell', 'capex, EUR m', '10.00', 'n/a'],
    ]);
  });
});
