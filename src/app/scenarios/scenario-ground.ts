import { Injectable, inject } from '@angular/core';
import {
  type DeskReply,
  type DraftReply,
  type FitReply,
  type ScenarioReply,
  apiRoutes,
  mayCall,
} from '@contract';
import type { PredictionBasis } from '@prediction';
import { type Observable, catchError, forkJoin, map, of, switchMap } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../api/api-problem';
import { DeskApi } from '../api/desk-api';
import { FitsApi } from '../api/fits-api';
import { ScenariosApi } from '../api/scenarios-api';
import { SessionStore } from '../api/session-store';
import { regressorLabels } from '../ui/plan/regressor-labels';

/** What the address names: a saved scenario, or a fit for a new one; neither means the newest fit. */
export interface ScenarioAddress {
  readonly scenarioId: string | null;
  readonly fitId: string | null;
}

/** All that a plan stands on. */
export interface ScenarioGround {
  readonly fit: FitReply;
  readonly basis: PredictionBasis;
  /** The regressors in words. */
  readonly labels: readonly string[];
  /** The scenario that is open as it is stored; null while it is a new one. */
  readonly saved: ScenarioReply | null;
  /** All scenarios of the fit. */
  readonly scenarios: readonly ScenarioReply[];
  /** One's own unsaved plan, where one was kept. */
  readonly draft: DraftReply['draft'];
  readonly desk: DeskReply;
}

/** Whether two grounds are of the same scenario on the same fit, in whatever version. */
export function isSameGround(left: ScenarioGround | null, right: ScenarioGround | null): boolean {
  return left?.fit.fit.id === right?.fit.fit.id && left?.saved?.id === right?.saved?.id;
}

export type ScenarioView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'no-fit' }
  /** The fit cannot read a plan, and why. */
  | { readonly kind: 'unreadable'; readonly reason: string; readonly fit: FitReply }
  | { readonly kind: 'ready'; readonly ground: ScenarioGround }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** Brings together the fit, its scenarios and the person's own draft. */
@Injectable({ providedIn: 'root' })
export class ScenarioGrounds {
  readonly #desk = inject(DeskApi);
  readonly #fits = inject(FitsApi);
  readonly #scenarios = inject(ScenariosApi);
  readonly #sessions = inject(SessionStore);

  read(address: ScenarioAddress): Observable<ScenarioView> {
    const { scenarioId, fitId } = address;
    const found =
      scenarioId === null
        ? this.#onFit(fitId, null)
        : this.#scenarios
            .read(scenarioId)
            .pipe(switchMap((saved) => this.#onFit(saved.fitId, saved)));
    return found.pipe(
      catchError((error: unknown) =>
        of<ScenarioView>({ kind: 'failed', problem: toApiProblem(error) }),
      ),
    );
  }

  #onFit(fitId: string | null, saved: ScenarioReply | null): Observable<ScenarioView> {
    return this.#desk.read().pipe(
      switchMap((desk): Observable<ScenarioView> => {
        const id = fitId ?? desk.fit?.id;
        return id === undefined ? of({ kind: 'no-fit' }) : this.#ready(id, saved, desk);
      }),
    );
  }

  #ready(fitId: string, saved: ScenarioReply | null, desk: DeskReply): Observable<ScenarioView> {
    const keepsDrafts = mayCall(apiRoutes.readDraft, this.#sessions.roles());
    return this.#fits.read(fitId).pipe(
      switchMap((fit): Observable<ScenarioView> => {
        const basis = fit.result?.prediction ?? null;
        if (basis === null) return of({ kind: 'unreadable', reason: reasonOf(fit), fit });
        return forkJoin({
          list: this.#scenarios.list(fitId),
          draft: keepsDrafts
            ? this.#scenarios.readDraft(fitId, saved?.id ?? null)
            : of<DraftReply>({ draft: null }),
        }).pipe(
          map(({ list, draft }) => ({
            kind: 'ready',
            ground: {
              fit,
              basis,
              labels: regressorLabels(basis.regressors),
              saved,
              scenarios: list.scenarios,
              draft: draft.draft,
              desk,
            },
          })),
        );
      }),
    );
  }
}

function reasonOf(fit: FitReply): string {
  if (fit.result === null)
    return 'This fit is not finished, so no plan can be read through it yet.';
  return fit.result.predictionReason ?? 'The own company has no rows in this fit.';
}
