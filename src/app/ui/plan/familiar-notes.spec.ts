import { TestBed } from '@angular/core/testing';
import type { PredictionBasis } from '@prediction';
import { FamiliarNotes } from './familiar-notes';
import { type PlannedYear, readPlan } from './read-plan';
import { lagBasis, quantileOfTen } from './testing/plan-basis';

describe('FamiliarNotes with regressors of the year before', () => {
  async function shown(basis: PredictionBasis, plan: readonly PlannedYear[]) {
    const fixture = TestBed.createComponent(FamiliarNotes);
    const { years } = readPlan(basis, plan, quantileOfTen);
    const inputs = { basis, labels: ['capex', 'book equity'], years };
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    const wanted: PlannedYear[] = [];
    fixture.componentInstance.insideWanted.subscribe((year) => wanted.push(year));
    await fixture.whenStable();
    return { page: fixture.nativeElement as HTMLElement, wanted };
  }

  it('leads the plan of the year before back inside', async () => {
    const plan = [
      { year: 2026, values: [190, 1000] },
      { year: 2027, values: [110, 1000] },
    ];
    const { page, wanted } = await shown(lagBasis, plan);
    expect(page.textContent).toContain('FY2027 is at the edge of the familiar range');
    page.querySelector('button')?.click();
    expect(wanted.map(({ year }) => year)).toEqual([2026]);
    expect(wanted[0].values[0]).toBeLessThanOrEqual(150);
  });

  it('offers no way back where the last actual values themselves are far', async () => {
    const far = { ...lagBasis, held: [190, 1000] };
    const { page } = await shown(far, [{ year: 2026, values: [110, 1000] }]);
    expect(page.textContent).toContain('It reads FY2025 as it was, which no plan changes.');
    expect(page.querySelector('button')).toBeNull();
  });
});
