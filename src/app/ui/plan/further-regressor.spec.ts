import { TestBed } from '@angular/core/testing';
import { type PredictionBasis, familiarRange } from '@prediction';
import { NumberFormat } from '../number-format';
import { PlanEditor } from './plan-editor';
import { PlanTable } from './plan-table';
import { familiarReason } from './plan-words';
import { planLineage } from './planned-figure';
import type { PlannedYear } from './read-plan';
import { planBasis } from './testing/plan-basis';

/** The basis with the number of employees as its third regressor, seen between 9,000 and 14,000. */
const basis: PredictionBasis = {
  ...planBasis,
  regressors: [...planBasis.regressors, 'employees'],
  coefficients: [...planBasis.coefficients, 0.01],
  ownMeans: [...planBasis.ownMeans, 11000],
  last: { ...planBasis.last, regressors: [110, 1000, 12000] },
  inverseCrossProduct: [
    [0.0001, 0, 0],
    [0, 0.000001, 0],
    [0, 0, 0.0000001],
  ],
  ownRange: [...planBasis.ownRange, { low: 10000, high: 12000 }],
  peerRange: [...planBasis.peerRange, { low: 9000, high: 14000 }],
};
const labels = ['capex', 'book equity', 'employees'];
const plan: readonly PlannedYear[] = [{ year: 2026, values: [1000, 2000, 12000] }];
const none = { estimate: 0, standardError: 0, low: 0, high: 0 };

describe('a further regressor of a plan, which is no money', () => {
  beforeEach(() => {
    const numbers = TestBed.inject(NumberFormat);
    numbers.currency.set('EUR');
    numbers.panelUnit.set('millions');
    numbers.unit.set('billions');
  });

  it('stays 12,000 in its box under billions, and 13,000 typed plans 13,000', async () => {
    const fixture = TestBed.createComponent(PlanEditor);
    for (const [name, value] of Object.entries({ basis, labels, plan }))
      fixture.componentRef.setInput(name, value);
    await fixture.whenStable();
    const planned: (readonly PlannedYear[])[] = [];
    fixture.componentInstance.planChanged.subscribe((changed) => planned.push(changed));
    const boxes = (fixture.nativeElement as HTMLElement).querySelectorAll<HTMLInputElement>(
      'input[type=text]',
    );
    expect([...boxes].map(({ value }) => value)).toEqual(['1.000', '2.00', '12,000']);
    boxes[2].value = '13,000';
    boxes[2].dispatchEvent(new Event('change'));
    expect(planned).toEqual([[{ year: 2026, values: [1000, 2000, 13000] }]]);
  });

  it('stays 12,000 in the table of figures under billions', async () => {
    const fixture = TestBed.createComponent(PlanTable);
    const years = [{ ...plan[0], expected: none, difference: none, familiar: 'inside' }];
    fixture.componentRef.setInput('plans', [{ name: 'Build-out', years }]);
    fixture.componentRef.setInput('labels', labels);
    fixture.componentRef.setInput('caption', 'EUR bn');
    await fixture.whenStable();
    const cells = (fixture.nativeElement as HTMLElement).querySelectorAll('td.kv-number');
    expect([...cells].slice(0, 3).map(({ textContent }) => textContent.trim())).toEqual([
      '1.000',
      '2.000',
      '12,000',
    ]);
  });

  it('is measured against its range in its own unit', () => {
    const far = familiarRange(basis, [110, 1000, 20000]);
    expect(familiarReason(basis, labels, far, TestBed.inject(NumberFormat))).toContain(
      'Employees 20,000 is above Velmara’s own range (10,000 to 12,000) and above its peers’ (9,000 to 14,000).',
    );
  });

  it('is no money among the inputs of a planned figure', () => {
    const year = { ...plan[0], expected: none, difference: none, familiar: 'inside' as const };
    const wanted = { plan: { name: 'Build-out', years: [year] }, year, kind: 'expected' as const };
    expect(planLineage(wanted, labels, basis).inputs).toEqual([
      { label: 'Capex planned', value: 1000, isMoney: true, figure: null },
      { label: 'Book equity planned', value: 2000, isMoney: true, figure: null },
      { label: 'Employees planned', value: 12000, isMoney: false, figure: null },
    ]);
  });
});
