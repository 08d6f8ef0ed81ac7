import { TestKey } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { ChartHarness } from '../../charts/chart-harness';
import { loadedPeers } from '../testing/loaded-peers';
import { panelCompany, scatteredCompanies } from '../testing/panel-company';
import { PlaneSection } from './plane-section';

const companies = [
  ...scatteredCompanies(20),
  panelCompany('Aldren', { firstYear: 2020, measures: { logMarketValue: 7 } }),
];
const outside = ['Company 2', 'Company 3', 'Company 4', 'Aldren'];

describe('the picture of companies on the page', () => {
  async function shown() {
    const { candidates } = await loadedPeers(companies, 'Company 1', outside);
    const fixture = TestBed.createComponent(PlaneSection);
    fixture.componentRef.setInput('own', companies[0]);
    const page = fixture.nativeElement as HTMLElement;
    page.style.width = '760px';
    document.body.append(page);
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    const moves: unknown[] = [];
    fixture.componentInstance.moved.subscribe((move) => moves.push(move));
    const words = () => page.textContent.replace(/\s+/g, ' ');
    return { fixture, page, chart, candidates, moves, words };
  }

  it('has a finding as its title, and says who is not shown', async () => {
    const { chart, words } = await shown();
    expect(await chart.title()).toMatch(/of 20 companies.* standard deviations of Company 1/);
    expect(words()).toContain('Not shown: 1, which lack one of the two.');
    expect(words()).toContain(
      'Distance over market value, book equity, capex ÷ book equity, growth and volatility',
    );
  });

  it('takes in who was selected by keyboard', async () => {
    const { fixture, page, chart, moves } = await shown();
    const cloud = await chart.cloud();
    await cloud.sendKeys(TestKey.HOME);
    for (let step = 0; step < 19; step++)
      await cloud.sendKeys({ shift: true }, TestKey.RIGHT_ARROW);
    await fixture.whenStable();
    const takeIn = [...page.querySelectorAll('button')].find((button) =>
      button.textContent.includes('Take 3 in'),
    );
    takeIn?.click();
    const leaveOut = [...page.querySelectorAll('button')].find((button) =>
      button.textContent.includes('Leave 16 out'),
    );
    leaveOut?.click();
    expect(moves.length).toBe(2);
    const [first] = moves as {
      readonly companies: readonly string[];
      readonly isIncluded: boolean;
    }[];
    expect([...first.companies].sort()).toEqual(['Company 2', 'Company 3', 'Company 4']);
    expect(first.isIncluded).toBeTrue();
  });

  it('selects nobody whom the filters took out of the picture', async () => {
    const { fixture, page, chart, candidates, words } = await shown();
    const cloud = await chart.cloud();
    await cloud.sendKeys(TestKey.HOME, ' ');
    for (let step = 0; step < 19; step++) await cloud.sendKeys(TestKey.RIGHT_ARROW, ' ');
    await fixture.whenStable();
    expect(words()).toMatch(/\d+ companies selected/);
    const none = [...page.querySelectorAll('button')].find(
      (each) => each.textContent === 'Select none',
    );
    none?.focus();
    none?.click();
    await fixture.whenStable();
    expect(document.activeElement?.textContent).toContain('Draw a rectangle around companies');
    await cloud.sendKeys(TestKey.HOME, ' ', TestKey.RIGHT_ARROW, ' ');
    candidates.filter({ name: 'nobody' });
    await fixture.whenStable();
    expect(words()).not.toContain('selected');
  });

  it('shows other measures, money on round values of equal ratios', async () => {
    const { fixture, page, chart } = await shown();
    const up = page.querySelectorAll('select')[1];
    up.value = 'volatility';
    up.dispatchEvent(new Event('change'));
    await fixture.whenStable();
    await chart.toggle();
    expect(await chart.headers()).toEqual([
      'company',
      'side',
      'market value, EUR m',
      'volatility, %',
      'distance',
    ]);
    const [own] = await chart.table();
    expect(own[0]).toBe('Company 1');
    expect(own[1]).toBe('own company');
    expect(own[3]).toMatch(/^\d+\.\d %$/);
    expect(own[4]).toBe('n/a');
  });
});
