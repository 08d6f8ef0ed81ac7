import { chosenFigure } from './chosen-figure';
import type { PlanTablePlan } from './plan-table';
import { planLineage } from './planned-figure';
import { readPlan } from './read-plan';
import { planBasis, quantileOfTen } from './testing/plan-basis';

describe('the figure behind a point of the expected path', () => {
  const plan = (name: string, capex: number, years: readonly number[]): PlanTablePlan => {
    const planned = years.map((year) => ({ year, values: [capex, 1000] }));
    return {
      name,
      years: readPlan(planBasis, planned, quantileOfTen).years.map((year) => ({
        ...year,
        familiar: year.familiar.kind,
      })),
    };
  };
  const plans = [plan('Build-out', 150, [2026]), plan('Hold back', 80, [2026, 2027])];
  const lineage = (kind: 'actual' | 'base' | 'plan', index: number, year: number) => {
    const wanted = chosenFigure(planBasis, plans, { kind, plan: index, year });
    return wanted && planLineage(wanted, ['capex', 'book equity'], planBasis);
  };

  it('is of the plan whose line was chosen, not of the first', () => {
    const found = lineage('plan', 1, 2026);
    expect(found?.label).toBe('Hold back: expected value in 2026');
    expect(found?.value.estimate).toBe(2660);
    expect(found?.inputs[0].value).toBe(80);
  });

  it('is of the last actual values for a point of the base', () => {
    const found = lineage('base', 0, 2027);
    expect(found?.label).toBe('Base: expected value in 2027');
    expect(found?.value.estimate).toBe(2720);
    expect(found?.inputs.map(({ value }) => value)).toEqual([110, 1000]);
  });

  it('is none for a year that happened or that the plan does not have', () => {
    expect(lineage('actual', 0, 2025)).toBeUndefined();
    expect(lineage('plan', 0, 2027)).toBeUndefined();
    expect(lineage('plan', 2, 2026)).toBeUndefined();
  });
});
