import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { ChartHarness } from '../chart-harness';
import { CoverageMap, type SelectedCell } from './coverage-map';
import { gridMove } from '../grid-move';

const variables = ['market value', 'capex', 'book equity'];
const cells = [
  { company: 'Ardwyne', year: 2024, missing: [] },
  { company: 'Ardwyne', year: 2025, missing: ['capex'] },
  { company: 'Velmara', year: 2024, missing: [], flagged: ['capex'] },
];

describe('coverage map', () => {
  async function shown() {
    const fixture = TestBed.createComponent(CoverageMap);
    fixture.componentRef.setInput('text', { title: 'Coverage', caption: '', source: '' });
    fixture.componentRef.setInput('cells', cells);
    fixture.componentRef.setInput('variables', variables);
    fixture.componentRef.setInput('ownCompany', 'Velmara');
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    const page = fixture.nativeElement as HTMLElement;
    const grid = await chart.grid();
    return { fixture, chart, page, grid };
  }

  it('says the state of each cell in its table, the own company first', async () => {
    const { chart } = await shown();
    await chart.toggle();
    expect(await chart.headers()).toEqual(['company', '2024', '2025']);
    expect(await chart.table()).toEqual([
      ['Velmara', 'complete, flagged: capex', 'none'],
      ['Ardwyne', 'complete', 'no capex'],
    ]);
  });

  it('draws an outline around what is fully covered, and says so in the export', async () => {
    const { fixture, page } = await shown();
    expect(page.querySelector('rect.frame')).toBeNull();
    fixture.componentRef.setInput('frame', {
      firstYear: 2024,
      lastYear: 2024,
      companies: ['Ardwyne', 'Velmara'],
    });
    await fixture.whenStable();
    expect(page.querySelectorAll('rect.frame').length).toBe(1);
    expect(page.querySelector('.words')?.textContent).toContain('fully covered');
  });

  it('marks the own company with a diamond at the head of its row', async () => {
    const { page } = await shown();
    const marked = [...page.querySelectorAll('path.own[transform]')];
    expect(marked.length).toBe(1);
    expect(page.querySelector('.own-word')?.textContent.trim()).toBe('Velmara');
  });

  it('is one tab stop that arrow keys walk, and tells the cell by name', async () => {
    const { page, grid } = await shown();
    const current = () => {
      const id = page.querySelector('[role="grid"]')?.getAttribute('aria-activedescendant');
      return page.querySelector(`#${id}`)?.getAttribute('aria-label');
    };
    expect(page.querySelectorAll('svg [tabindex], svg[tabindex]').length).toBe(1);
    expect(current()).toBe('Velmara 2024: complete, flagged: capex');
    await grid.sendKeys(TestKey.RIGHT_ARROW, TestKey.DOWN_ARROW);
    expect(current()).toBe('Ardwyne 2025: no capex');
    expect(page.querySelector('.readout')?.textContent).toBe('Ardwyne 2025: no capex');
    await grid.sendKeys(TestKey.RIGHT_ARROW, TestKey.DOWN_ARROW);
    expect(current()).toBe('Ardwyne 2025: no capex');
  });

  it('tells which cell was chosen by Enter', async () => {
    const { fixture, grid } = await shown();
    const chosen: SelectedCell[] = [];
    fixture.componentInstance.cellSelected.subscribe((cell) => chosen.push(cell));
    await grid.sendKeys(TestKey.DOWN_ARROW, TestKey.ENTER);
    expect(chosen).toEqual([{ company: 'Ardwyne', year: 2024 }]);
  });

  it('tells which cell was clicked, and none where names stand', async () => {
    const { fixture, page } = await shown();
    const chosen: SelectedCell[] = [];
    fixture.componentInstance.cellSelected.subscribe((cell) => chosen.push(cell));
    const svg = page.querySelector('[role="grid"]')!;
    const box = svg.getBoundingClientRect();
    const click = (x: number, y: number) =>
      svg.dispatchEvent(new MouseEvent('click', { clientX: box.left + x, clientY: box.top + y }));
    const label = svg.querySelector('text.figure')!;
    click(Number(label.getAttribute('x')), 40);
    click(4, 40);
    expect(chosen.map(({ company }) => company)).toEqual(['Velmara']);
  });
});

describe('coverage map of a large panel', () => {
  const companies = 1000;
  const nameOf = (place: number) => `Company ${String(place).padStart(4, '0')}`;

  async function shown() {
    const fixture = TestBed.createComponent(CoverageMap);
    const inputs = {
      text: { title: 'Coverage', caption: '', source: '' },
      cells: Array.from({ length: companies * 2 }, (_, k) => ({
        company: nameOf(Math.floor(k / 2)),
        year: 2024 + (k % 2),
        missing: k % 2 === 1 ? ['capex'] : [],
      })),
      variables,
    };
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    const page = fixture.nativeElement as HTMLElement;
    const names = () =>
      [...page.querySelectorAll('text.name')].map((name) => name.textContent.trim());
    return { fixture, chart, page, names, grid: await chart.grid() };
  }

  it('draws the companies in view alone, and says how many there are', async () => {
    const { fixture, page, names } = await shown();
    expect(names().length).toBeLessThan(100);
    expect(page.querySelector('[role="grid"]')?.getAttribute('aria-rowcount')).toBe('1000');
    const scroller = page.querySelector('.scroller')!;
    scroller.scrollTop = 20_000;
    scroller.dispatchEvent(new Event('scroll'));
    await fixture.whenStable();
    const box = scroller.getBoundingClientRect();
    const within = [...page.querySelectorAll('text.name')].filter((name) => {
      const { top, bottom } = name.getBoundingClientRect();
      return top >= box.top && bottom <= box.bottom;
    });
    expect(within.length).toBeGreaterThan(15);
    expect(names().length).toBeLessThan(100);
    expect(names()).not.toContain(nameOf(0));
  });

  it('leads the keys to every company, and shows it', async () => {
    const { page, names, grid } = await shown();
    const current = () => {
      const id = page.querySelector('[role="grid"]')?.getAttribute('aria-activedescendant');
      return page.querySelector(`#${id}`)?.getAttribute('aria-label');
    };
    const end = (key: string) =>
      page
        .querySelector('[role="grid"]')!
        .dispatchEvent(new KeyboardEvent('keydown', { key, ctrlKey: true, cancelable: true }));
    end('End');
    await grid.sendKeys(TestKey.LEFT_ARROW);
    expect(current()).toBe(`${nameOf(999)} 2024: complete`);
    expect(names()).toContain(nameOf(999));
    await grid.sendKeys(TestKey.PAGE_UP);
    expect(current()).toBe(`${nameOf(989)} 2024: complete`);
    end('Home');
    await grid.sendKeys(TestKey.DOWN_ARROW);
    expect(current()).toBe(`${nameOf(1)} 2024: complete`);
    expect(names()).toContain(nameOf(1));
  });

  it('says what a picture and the table hold, and holds it', async () => {
    const { chart, page, names } = await shown();
    const said = /picture holds 1 to (\d+), a table 1 to (\d+)/.exec(page.textContent);
    expect(said?.slice(1)).toEqual([String(names().length), '200']);
    await chart.toggle();
    const table = await chart.table();
    expect(table.length).toBe(200);
    expect(table[199]).toEqual([nameOf(199), 'complete', 'no capex']);
  });
});

describe('moving in a grid', () => {
  const at = { row: 5, column: 5 };
  const press = (key: string, ctrlKey = false) => gridMove({ key, ctrlKey }, at, 120, 30);

  it('goes to the ends of the row, and with Ctrl to those of the grid', () => {
    expect(press('Home')).toEqual({ row: 5, column: 0 });
    expect(press('End')).toEqual({ row: 5, column: 29 });
    expect(press('Home', true)).toEqual({ row: 0, column: 0 });
    expect(press('End', true)).toEqual({ row: 119, column: 29 });
    expect(press('PageDown')).toEqual({ row: 15, column: 5 });
    expect(press('PageUp')).toEqual({ row: 0, column: 5 });
  });

  it('leaves other keys alone, and an empty grid', () => {
    expect(press('Tab')).toBeNull();
    expect(gridMove({ key: 'End', ctrlKey: false }, { row: 0, column: 0 }, 0, 0)).toBeNull();
  });
});
