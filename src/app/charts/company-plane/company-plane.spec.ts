import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { ChartHarness } from '../chart-harness';
import { CompanyPlane } from './company-plane';
import { planeMove } from './plane-move';
import type { PlaneMeasure, PlaneRow } from './plane-words';

const axis = (title: string, isLog: boolean): PlaneMeasure => ({
  title,
  isLog,
  text: (value) => value.toFixed(2),
  exact: (value) => value,
  tick: (value) => value.toFixed(1),
});
const rows: readonly PlaneRow[] = [
  { company: 'Velmara', side: 'own', x: 100, y: 0.1, distance: '', exactDistance: null },
  { company: 'Kesdrin', side: 'in', x: 200, y: 0.3, distance: '1.20', exactDistance: 1.2034 },
  { company: 'Sarvane', side: 'out', x: 50, y: 0.2, distance: '2.40', exactDistance: 2.4 },
  { company: 'Tolvane', side: 'out', x: 400, y: 0.15, distance: '', exactDistance: null },
];

describe('company plane', () => {
  async function shown(inputs: Record<string, unknown> = {}) {
    const fixture = TestBed.createComponent(CompanyPlane);
    const text = { title: 'One is near', caption: '', source: '' };
    const [across, up] = [axis('market value', true), axis('growth', false)];
    for (const [name, value] of Object.entries({ text, rows, across, up, ...inputs }))
      fixture.componentRef.setInput(name, value);
    const page = fixture.nativeElement as HTMLElement;
    page.style.width = '760px';
    document.body.append(page);
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    const asked: string[] = [];
    fixture.componentInstance.companyAsked.subscribe((company) => asked.push(company));
    const selected = () => [...fixture.componentInstance.selected()].sort();
    return { fixture, chart, page, asked, selected };
  }

  function at(page: HTMLElement, place: { readonly x: number; readonly y: number }) {
    const box = page.querySelector('svg')!.getBoundingClientRect();
    return { clientX: box.left + place.x, clientY: box.top + place.y, button: 0, bubbles: true };
  }

  it('is one tab stop that starts at the own company and walks in the order across', async () => {
    const { chart, page } = await shown();
    expect(page.querySelectorAll('svg[tabindex], svg [tabindex]').length).toBe(1);
    expect(await chart.cloudPoint()).toBe('Velmara, own company: market value 100.00; growth 0.10');
    const cloud = await chart.cloud();
    await cloud.sendKeys(TestKey.RIGHT_ARROW);
    expect(await chart.cloudPoint()).toBe(
      'Kesdrin, in: market value 200.00; growth 0.30; distance 1.20',
    );
    await cloud.sendKeys(TestKey.HOME);
    expect(await chart.cloudPoint()).toMatch('^Sarvane, out');
    expect(page.querySelector('.readout')?.textContent).toContain('Sarvane');
  });

  it('selects by space and by Shift with an arrow, never the own company, and asks by Enter', async () => {
    const { chart, page, asked, selected } = await shown();
    const cloud = await chart.cloud();
    await cloud.sendKeys(TestKey.HOME);
    await cloud.sendKeys({ shift: true }, TestKey.RIGHT_ARROW, TestKey.RIGHT_ARROW);
    expect(selected()).toEqual(['Kesdrin', 'Sarvane']);
    expect(page.querySelectorAll('circle.selected').length).toBe(2);
    expect(page.querySelector('[role=option]')?.getAttribute('aria-selected')).toBe('true');
    await cloud.sendKeys(' ');
    expect(selected()).toEqual(['Sarvane']);
    await cloud.sendKeys(TestKey.ENTER);
    expect(asked).toEqual(['Kesdrin']);
    await cloud.sendKeys(TestKey.LEFT_ARROW, TestKey.ENTER, ' ');
    expect(asked).toEqual(['Kesdrin']);
    expect(selected()).toEqual(['Sarvane']);
  });

  it('selects who lies within the rectangle that a pointer draws, and turns one by a click', async () => {
    const { fixture, page, selected } = await shown();
    const svg = page.querySelector('svg')!;
    spyOn(svg, 'setPointerCapture'); // no pointer of the browser stands behind these events
    const size = svg.getBoundingClientRect();
    const draw = (type: string, place: { readonly x: number; readonly y: number }) =>
      svg.dispatchEvent(new PointerEvent(type, at(page, place)));
    draw('pointerdown', { x: 0, y: 0 });
    draw('pointermove', { x: 30, y: 30 });
    await fixture.whenStable();
    expect(page.querySelector('rect.brush')).not.toBeNull();
    draw('pointermove', { x: size.width, y: size.height });
    draw('pointerup', { x: size.width, y: size.height });
    await fixture.whenStable();
    expect(selected()).toEqual(['Kesdrin', 'Sarvane', 'Tolvane']);
    expect(page.querySelector('rect.brush')).toBeNull();
    const mark = page.querySelector('circle.selected')!;
    const place = { x: Number(mark.getAttribute('cx')), y: Number(mark.getAttribute('cy')) };
    draw('pointerdown', place);
    draw('pointerup', place);
    expect(selected().length).toBe(2);
  });

  it('tells own company, peers and candidates apart, and says what the marks mean', async () => {
    const { page } = await shown({ missing: 3 });
    expect(page.querySelector('path.peer')?.getAttribute('d')?.match(/M/g)?.length).toBe(1);
    expect(page.querySelector('path.candidate')?.getAttribute('d')?.match(/M/g)?.length).toBe(4);
    expect(page.querySelector('text.own-word')?.textContent.trim()).toBe('Velmara');
    expect(page.querySelector('.kv-caption')?.textContent).toBe(
      'Diamond: own company; circles: in; crosses: out. Not shown: 3, which lack one of the two.',
    );
  });

  it('shows the same values as a table', async () => {
    const { chart } = await shown();
    await chart.toggle();
    expect(await chart.headers()).toEqual([
      'company',
      'side',
      'market value',
      'growth',
      'distance',
    ]);
    expect((await chart.table())[1]).toEqual(['Kesdrin', 'in', '200.00', '0.30', '1.20']);
  });

  it('draws 500 companies in few elements, and none as a picture without keys', async () => {
    const many = Array.from({ length: 500 }, (_, k) => ({
      ...rows[2],
      company: `Company ${k}`,
      x: Math.exp(5 + Math.sin(k)),
      y: Math.cos(3 * k),
    }));
    const { page } = await shown({ rows: many });
    expect(page.querySelectorAll('svg *').length).toBeLessThan(120);
    const { chart: empty, page: emptyPage } = await shown({ rows: [] });
    expect(await empty.cloudPoint()).toBeNull();
    expect(emptyPage.querySelector('svg')?.getAttribute('role')).toBe('img');
  });
});

describe('moving among companies', () => {
  const orders = { byX: [2, 0, 1], byY: [1, 2, 0] };

  it('passes over each company on the way, and stops at the ends', () => {
    expect(planeMove('ArrowRight', 2, orders)).toEqual([0]);
    expect(planeMove('End', 2, orders)).toEqual([0, 1]);
    expect(planeMove('Home', 1, orders)).toEqual([0, 2]);
    expect(planeMove('ArrowRight', 1, orders)).toEqual([1]);
    expect(planeMove('ArrowUp', 0, orders)).toEqual([2]);
  });

  it('leaves other keys alone, and an empty chart', () => {
    expect(planeMove('Tab', 0, orders)).toBeNull();
    expect(planeMove('End', 0, { byX: [], byY: [] })).toBeNull();
  });
});
