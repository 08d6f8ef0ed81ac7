import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { uncertainPlan } from '@prediction';
import { ChartHarness } from '../../charts/chart-harness';
import { planBasis } from '../../ui/plan/testing/plan-basis';
import { UncertainPlan } from './uncertain-plan';
import { uncertainRequest } from './uncertain-request';
import { askedPlan, fullBasis, shownResult } from './testing/shown-plan';

const uncertainty = {
  seed: 7,
  ranges: [
    [{ low: 100, high: 180 }, null],
    [{ low: 100, high: 180 }, null],
  ],
};
const asked = { ...askedPlan, uncertainty };

describe('an uncertain plan', () => {
  async function drawn(basis = fullBasis) {
    const shown = await shownResult(UncertainPlan, { basis, asked });
    for (let tries = 0; tries < 100; tries += 1) {
      await new Promise((resolve) => setTimeout(resolve, 50));
      await shown.fixture.whenStable();
      if (shown.page.querySelector('kv-plan-fan') !== null) return shown;
    }
    throw new Error('expected the plan to be drawn within 5 s');
  }

  it('shows nothing while every amount is certain', async () => {
    const { page } = await shownResult(UncertainPlan);
    expect(page.textContent.trim()).toBe('');
  });

  it('draws both fans beside the page, and names seed and draws', async () => {
    const { fixture, page } = await drawn();
    expect(page.querySelector('[role="status"]')?.textContent).toBe('10,000 draws, seed 7');
    const [expected, market] =
      await TestbedHarnessEnvironment.loader(fixture).getAllHarnesses(ChartHarness);
    const request = uncertainRequest(asked.plan, uncertainty, asked.outlook)!;
    const [year] = uncertainPlan(fullBasis, request);
    await expected.toggle();
    await market.toggle();
    const median = Math.round(year.expected!.percentiles[3]!).toLocaleString('en');
    expect((await expected.table())[0][4]).toBe(median);
    expect((await market.table()).length).toBe(2);
  });

  it('says why there is no market value', async () => {
    const { page } = await drawn(planBasis);
    expect(page.querySelectorAll('kv-plan-fan').length).toBe(1);
    expect(page.textContent).toContain('No market value: This fit was made before');
  });
});
