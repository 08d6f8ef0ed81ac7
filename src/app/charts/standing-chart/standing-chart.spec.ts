import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import type { FitResult } from '@contract';
import { NumberFormat } from '../../ui/number-format';
import { ChartHarness } from '../chart-harness';
import { StandingChart } from './standing-chart';

const text = { title: 'Velmara stands above its peers', caption: 'EUR m', source: 'Fit 6f3a91' };

/** In the shape of the contract: what a fit replies goes into the chart as it is. */
function intercept(company: string, estimate: number, half: number | null) {
  return {
    company,
    estimate,
    standardError: null,
    low: half === null ? null : estimate - half,
    high: half === null ? null : estimate + half,
    deviation: null,
    rows: 18,
    ...(half === null ? { intervalReason: 'one row only' } : {}),
  } satisfies FitResult['intercepts'][number];
}

const intercepts = [
  intercept('Kestrane', -900, 600),
  intercept('Tolvane', 5200, 1300),
  intercept('Lindrowe', -600, null),
  intercept('Velmara', 2970, 1350),
];

describe('standing chart', () => {
  let fixture: ComponentFixture<StandingChart>;
  let chart: ChartHarness;
  let numbers: NumberFormat;

  beforeEach(async () => {
    numbers = TestBed.inject(NumberFormat);
    numbers.currency.set('EUR');
    numbers.panelUnit.set('millions');
    fixture = TestBed.createComponent(StandingChart);
    fixture.componentRef.setInput('text', text);
    fixture.componentRef.setInput('intercepts', intercepts);
    fixture.componentRef.setInput('ownCompany', 'Velmara');
    fixture.componentRef.setInput('meanOfPeers', 1233);
    (fixture.nativeElement as HTMLElement).style.width = '900px';
    chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
  });

  function drawn(selector: string): Element[] {
    return [...(fixture.nativeElement as HTMLElement).querySelectorAll(selector)];
  }

  it('says each company with its value and interval, highest first', async () => {
    expect(await chart.points()).toEqual([
      'Tolvane, 5,200 (3,900 to 6,500)',
      'Velmara, 2,970 (1,620 to 4,320)',
      'Lindrowe, \u2212600 (no interval: one row only)',
      'Kestrane, \u2212900 (\u22121,500 to \u2212300)',
    ]);
  });

  it('marks the own company by a diamond and a row of its own, peers by circles', () => {
    expect(drawn('path.own').length).toBe(1);
    expect(drawn('rect.own-row').length).toBe(1);
    expect(drawn('circle.peer').length).toBe(3);
    expect(drawn('.own-word').map((word) => word.textContent.trim())).toEqual(['Velmara', '2,970']);
    expect(drawn('line.own-interval, line.peer-interval').length).toBe(3);
  });

  it('shows the same values as a table, before which the toggle stands', async () => {
    await chart.toggle();
    expect(await chart.headers()).toEqual([
      'company',
      'value, EUR m',
      'low',
      'high',
      'why no interval',
    ]);
    expect(await chart.table()).toEqual([
      ['Tolvane', '5,200', '3,900', '6,500', ''],
      ['Velmara', '2,970', '1,620', '4,320', ''],
      ['Lindrowe', '\u2212600', 'n/a', 'n/a', 'one row only'],
      ['Kestrane', '\u2212900', '\u22121,500', '\u2212300', ''],
    ]);
    expect(drawn('tr.kv-own-row th').map((cell) => cell.textContent)).toEqual(['Velmara']);
    const [button] = drawn('.actions button');
    const order = button.compareDocumentPosition(drawn('table')[0]);
    expect(order & Node.DOCUMENT_POSITION_FOLLOWING).toBeTruthy();
  });

  it('is one tab stop; arrows, Home and End move among the companies and stop at the ends', async () => {
    expect((await chart.tabStops()).length).toBe(1);
    await chart.press(TestKey.DOWN_ARROW);
    expect(await chart.focusedPoint()).toMatch('^Velmara');
    await chart.press(TestKey.END, TestKey.DOWN_ARROW);
    expect(await chart.focusedPoint()).toMatch('^Kestrane');
    await chart.press(TestKey.HOME);
    expect(await chart.focusedPoint()).toMatch('^Tolvane');
    expect(await chart.tabStops()).toEqual([await chart.focusedPoint()]);
  });

  it('tells which company was chosen, by click and by Enter', async () => {
    const chosen: string[] = [];
    fixture.componentInstance.companySelected.subscribe((company) => chosen.push(company));
    await chart.clickPoint(/^Kestrane/);
    await chart.press(TestKey.DOWN_ARROW);
    await chart.press(TestKey.ENTER);
    expect(chosen).toEqual(['Kestrane', 'Velmara']);
  });

  it('follows the unit and the sign that the person sets', async () => {
    numbers.unit.set('billions');
    numbers.negatives.set('parentheses');
    await chart.toggle();
    expect((await chart.headers())[1]).toBe('value, EUR bn');
    expect((await chart.table())[3][1]).toBe('(0.900)');
    numbers.unit.set('millions');
    numbers.negatives.set('minus');
  });

  it('writes the own figures under a chart too narrow for columns', async () => {
    (fixture.nativeElement as HTMLElement).style.width = '340px';
    await expectEventually(() => drawn('svg')[0].getAttribute('width') === '340');
    const words = drawn('svg text').map((word) => word.textContent.replace(/\s+/g, ' ').trim());
    expect(words).toContain('Velmara2,970 (1,620 to 4,320)');
    expect(words).not.toContain('5,200');
  });

  it('names only the own company and the one asked for where rows are low', async () => {
    const many = Array.from({ length: 120 }, (_, k) => intercept(`Company ${k}`, k * 10, 50));
    fixture.componentRef.setInput('intercepts', many);
    fixture.componentRef.setInput('ownCompany', 'Company 60');
    await fixture.whenStable();
    const names = () => drawn('text.name').map((name) => name.textContent.trim());
    expect(names()).toEqual(['Company 60']);
    await chart.press(TestKey.END);
    expect(names()).toEqual(['Company 60', 'Company 0']);
  });

  async function expectEventually(isTrue: () => boolean): Promise<void> {
    for (let attempt = 0; attempt < 50 && !isTrue(); attempt++) {
      await new Promise((resolve) => setTimeout(resolve, 20));
      await fixture.whenStable();
    }
    expect(isTrue()).toBeTrue();
  }
});
