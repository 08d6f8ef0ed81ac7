import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ChartHarness } from '../../charts/chart-harness';
import { planBasis } from '../../ui/plan/testing/plan-basis';
import { readPlan } from '../../ui/plan/read-plan';
import { tQuantile } from '../../ui/plan/t-quantile';
import { PlanParts } from './plan-parts';
import { PlanPath } from './plan-path';
import { PlanSensitivity } from './plan-sensitivity';
import { askedPlan, choose, fullBasis, shownResult } from './testing/shown-plan';

describe('the path of a plan', () => {
  const pathOf = (basis = fullBasis) =>
    shownResult(PlanPath, {
      basis,
      inputs: {
        finding: 'A finding',
        ownYears: [basis.last],
        plans: [{ name: 'Build-out', years: readPlan(basis, askedPlan.plan, tQuantile).years }],
      },
    });

  it('always has the band of the market value with its level', async () => {
    const { page } = await pathOf();
    expect(page.querySelector('.band-area')?.getAttribute('d')).not.toBe('');
    expect(page.querySelector('svg')?.textContent).toContain('80 % band of the market value');
  });

  it('says why there is no band', async () => {
    const { page } = await pathOf(planBasis);
    expect(page.querySelector('.band-area')?.getAttribute('d')).toBe('');
    expect(page.textContent).toContain(
      'No 80 % band of the market value: This fit was made before',
    );
  });
});

describe('the parts of a plan', () => {
  it('add up to both totals, in the year that is chosen', async () => {
    const { fixture, page } = await shownResult(PlanParts);
    const [toBase, fromLast] =
      await TestbedHarnessEnvironment.loader(fixture).getAllHarnesses(ChartHarness);
    await toBase.toggle();
    await fromLast.toggle();
    // Capex 2 × 30, book equity −0.5 × 100, and of the gap of 30 all fades.
    expect((await toBase.table()).map((row) => row.slice(0, 2))).toEqual([
      ['Capex', '+60.00'],
      ['Book equity', '\u221250.00'],
      ['Together', '+10.00'],
    ]);
    expect((await fromLast.table()).map((row) => row.slice(0, 2))).toEqual([
      ['Capex', '+60.00'],
      ['Book equity', '\u221250.00'],
      ['Gap of FY2025 that fades', '\u221230.00'],
      ['Together', '\u221220.00'],
    ]);
    choose(page, 0, 0);
    expect((await toBase.table()).at(-1)?.slice(0, 2)).toEqual(['Together', '+40.00']);
    expect(page.textContent).toContain('standing is held fixed');
  });

  it('say how much of the gap is left where it is carried', async () => {
    const asked = {
      ...askedPlan,
      outlook: { ...askedPlan.outlook, start: 'carry-the-gap' as const },
    };
    const { page } = await shownResult(PlanParts, { asked });
    expect(page.textContent).toContain('25.0 % is left in FY2027');
  });

  it('follow the plan at once', async () => {
    const { fixture, state, page } = await shownResult(PlanParts);
    state.text.update((text) => ({
      ...text,
      plan: [text.plan[0], { year: 2027, values: [210, 1000] }],
    }));
    await fixture.whenStable();
    expect(page.querySelector('h3')?.textContent).toContain('FY2027 against the base: +200');
  });
});

describe('the sensitivity of a plan', () => {
  it('stands for the deciding year, the input that moves most first', async () => {
    const { fixture, page } = await shownResult(PlanSensitivity);
    const chart = await TestbedHarnessEnvironment.loader(fixture).getHarness(ChartHarness);
    const points = await chart.points();
    expect(points.length).toBe(4);
    expect(points[0]).toContain('Capex, peers’ 10th percentile at 50.0: 2,550 (');
    expect(points[1]).toContain('outside the familiar range');
    expect(page.querySelector('h3')?.textContent).toContain('Capex moves the expected value');
  });

  it('says why there is none', async () => {
    const { page } = await shownResult(PlanSensitivity, { basis: planBasis });
    expect(page.querySelector('svg')).toBeNull();
    expect(page.textContent).toContain('run it again');
  });
});
