import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import type { ScenarioReply } from '@contract';
import { ChartHarness } from '../../charts/chart-harness';
import { fitId, storedYears } from '../testing/scenario-replies';
import { PageComparison } from './page-comparison';
import { ScenarioComparison } from './scenario-comparison';
import { askedPlan, choose, fullBasis, shownResult } from './testing/shown-plan';

const uuid = (last: number) => `00000000-0000-4000-8000-00000000000${last}`;

function saved(last: number, name: string, capex: number): ScenarioReply {
  const plan = [{ year: 2026, values: [capex, 1000] }];
  const { outlook } = askedPlan;
  return {
    id: uuid(last),
    fitId,
    name,
    note: '',
    version: 1,
    plan,
    outlook,
    rules: [],
    uncertainty: null,
    years: storedYears(plan),
    copiedFrom: null,
    createdBy: 'M. Oduya',
    updatedBy: 'M. Oduya',
    updatedAt: '2026-11-14T09:00:00.000Z',
  };
}

describe('a comparison of scenarios', () => {
  const plans = [
    { id: null, name: 'This plan', plan: askedPlan.plan, outlook: askedPlan.outlook },
    saved(1, 'Build-out', 160),
    saved(2, 'Lower payout', 100),
  ];
  const compared = () =>
    shownResult(ScenarioComparison, { inputs: { basis: fullBasis, plans, source: 'Fit 6f3a91' } });

  it('has the expected values by year, and none where a scenario ends', async () => {
    const { page } = await compared();
    const rows = [...page.querySelectorAll('.kv-table')][0].querySelectorAll('tbody tr');
    const cells = [...rows].map((row) =>
      [...row.children].map((cell) => cell.textContent.trim().split(' ')[0].split('\n')[0]),
    );
    expect(cells[0].map((text) => /^[\w,]+/.exec(text)?.[0])).toEqual([
      'FY2026',
      '2,760',
      '2,820',
      '2,700',
    ]);
    expect(cells[1].slice(2)).toEqual(['n/a', 'n/a']);
  });

  it('has differences with their own intervals, to the one chosen', async () => {
    const { fixture, page } = await compared();
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    const names = async () => (await chart.points()).map((label) => label!.split(' (')[0]);
    expect(await names()).toEqual([
      'Build-out less This plan: 60.00',
      'Lower payout less This plan: −60.00',
    ]);
    choose(page, 0, 1);
    expect(await names()).toEqual([
      'This plan less Build-out: −60.0',
      'Lower payout less Build-out: −120.0',
    ]);
    expect(page.textContent).toContain('intercept and noise cancel');
  });

  it('says where a scenario leaves the familiar range', async () => {
    const { page } = await compared();
    expect(page.textContent).toContain('Build-out: FY2026 at the edge of the familiar range.');
  });
});

describe('a comparison on the page of a plan', () => {
  it('links to the saved ones by their ids and nothing else', async () => {
    const beside = [saved(1, 'Build-out', 160), saved(2, 'Lower payout', 100)];
    const { page } = await shownResult(PageComparison, { inputs: { beside } });
    expect(page.querySelector('a')?.getAttribute('href')).toBe(
      `/scenarios/compare?of=${uuid(1)},${uuid(2)}`,
    );
  });

  it('says how to begin where none is marked', async () => {
    const { page } = await shownResult(PageComparison, { inputs: { beside: [] } });
    expect(page.textContent).toContain('Mark up to 3 scenarios');
    expect(page.querySelector('table')).toBeNull();
  });
});
