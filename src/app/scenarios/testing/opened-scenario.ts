import { provideHttpClient } from '@angular/common/http';
import { provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { ScenarioReply } from '@contract';
import type { PredictionBasis } from '@prediction';
import { SessionStore } from '../../api/session-store';
import { NumberFormat } from '../../ui/number-format';
import { planBasis } from '../../ui/plan/testing/plan-basis';
import { DraftKeeper } from '../draft-keeper';
import { PlanDesk } from '../plan-desk';
import { ScenarioEdits } from '../scenario-edits';
import { ScenarioShelf } from '../scenario-shelf';
import { ScenarioState } from '../scenario-state';
import { ScenarioStore } from '../scenario-store';
import { storedText } from '../scenario-text';
import {
  deskReply,
  fitId,
  fitReply,
  heldReading,
  sessionOf,
  storedYears,
} from './scenario-replies';

/** A stored scenario of one planned year. */
export function savedScenario(version: number, capex: number): ScenarioReply {
  const plan = [{ year: 2026, values: [capex, 1000] }];
  return {
    id: '00000000-0000-4000-8000-000000000009',
    fitId,
    name: 'Build-out',
    note: '',
    version,
    ...heldReading,
    plan,
    years: storedYears(plan),
    copiedFrom: null,
    createdBy: 'M. Oduya',
    updatedBy: 'I. Vandresson',
    updatedAt: '2026-11-14T09:00:00.000Z',
  };
}

/** A plan on the page without any request: of a CFO, whose plans are kept nowhere, or of an analyst. */
export function openScenario(
  given: {
    readonly basis?: PredictionBasis;
    readonly saved?: ScenarioReply;
    readonly role?: 'analyst' | 'cfo';
  } = {},
): { readonly state: ScenarioState; readonly desk: PlanDesk; readonly edits: ScenarioEdits } {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      provideRouter([]),
      DraftKeeper,
      ScenarioState,
      ScenarioEdits,
      ScenarioShelf,
      ScenarioStore,
      PlanDesk,
    ],
  });
  const numbers = TestBed.inject(NumberFormat);
  numbers.currency.set('EUR');
  numbers.panelUnit.set('millions');
  TestBed.inject(SessionStore).accept(sessionOf(given.role ?? 'cfo'));
  const state = TestBed.inject(ScenarioState);
  const saved = given.saved ?? null;
  const ground = {
    fit: fitReply,
    basis: given.basis ?? planBasis,
    labels: ['capex', 'book equity'],
    saved,
    scenarios: saved === null ? [] : [saved],
    draft: null,
    desk: deskReply,
  };
  state.view.set({ kind: 'ready', ground });
  state.text.set(storedText(ground));
  state.origin.set(saved?.version ?? null);
  return { state, desk: TestBed.inject(PlanDesk), edits: TestBed.inject(ScenarioEdits) };
}
