import { provideHttpClient } from '@angular/common/http';
import { provideHttpClientTesting } from '@angular/common/http/testing';
import type { Type } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { PredictionBasis } from '@prediction';
import { NumberFormat } from '../../../ui/number-format';
import { type AskedPlan, heldAsked } from '../../../ui/plan/asked-plan';
import { planBasis } from '../../../ui/plan/testing/plan-basis';
import { ScenarioState } from '../../scenario-state';
import { deskReply, fitReply } from '../../testing/scenario-replies';
import { PlanResults } from '../plan-results';

/** The plain basis with the own company's errors of ten years and the peers' spread; figures made up. */
export const fullBasis: PredictionBasis = {
  ...planBasis,
  ownErrors: {
    persistence: 0.5,
    years: [2016, 2017, 2018, 2019, 2020, 2021, 2022, 2023, 2024, 2025],
    variance: 10_000,
  },
  peerSpread: [
    { low: 50, high: 300 },
    { low: 900, high: 1100 },
  ],
};

/** Two years of a plan that differs from the base. */
export const askedPlan: AskedPlan = {
  ...heldAsked(fullBasis, 2),
  plan: [
    { year: 2026, values: [130, 1000] },
    { year: 2027, values: [140, 1100] },
  ],
};

/** A component that shows a result of the plan on the page, with the state that it reads. */
export async function shownResult<T>(
  component: Type<T>,
  {
    basis = fullBasis,
    asked = askedPlan,
    inputs = {},
  }: {
    readonly basis?: PredictionBasis;
    readonly asked?: AskedPlan;
    readonly inputs?: Readonly<Record<string, unknown>>;
  } = {},
) {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      provideRouter([]),
      ScenarioState,
      PlanResults,
    ],
  });
  TestBed.inject(NumberFormat).unit.set('units');
  const state = TestBed.inject(ScenarioState);
  state.view.set({
    kind: 'ready',
    ground: {
      fit: fitReply,
      basis,
      labels: ['capex', 'book equity'],
      saved: null,
      scenarios: [],
      draft: null,
      desk: deskReply,
    },
  });
  state.text.set({ name: 'Build-out', note: '', ...asked });
  const fixture = TestBed.createComponent(component);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return { fixture, state, page: fixture.nativeElement as HTMLElement };
}

/** Chooses an option of the list with this place on the page. */
export function choose(page: HTMLElement, list: number, option: number): void {
  const box = page.querySelectorAll('select')[list];
  box.selectedIndex = option;
  box.dispatchEvent(new Event('change'));
}
