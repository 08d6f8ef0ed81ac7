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
