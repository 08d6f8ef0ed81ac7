import { Injectable, inject } from '@angular/core';
import type { DeskReply, FitReply, ScenarioReply } from '@contract';
import { type Observable, catchError, forkJoin, map, of, switchMap } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../../api/api-problem';
import { DeskApi } from '../../api/desk-api';
import { FitsApi } from '../../api/fits-api';
import { ScenariosApi } from '../../api/scenarios-api';
import { mostCompared } from './compared-plans';

export type CompareView =
  | { readonly kind: 'loading' }
  /** The address names no scenario. */
  | { readonly kind: 'none' }
  | {
      readonly kind: 'ready';
      readonly fit: FitReply;
      readonly desk: DeskReply;
      /** All of the first one's fit. */
      readonly scenarios: readonly ScenarioReply[];
      /** What of the address is not compared, and why. */
      readonly leftOut: readonly string[];
    }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

const uuid = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

/** The scenarios that an address names by `id,id`: as many as can be compared, each once. */
export function idsIn(text: string | undefined): readonly string[] {
  const named = (text ?? '').split(',').filter((id) => uuid.test(id));
  return [...new Set(named.map((id) => id.toLowerCase()))].slice(0, mostCompared);
}

type Found = { readonly scenario: ScenarioReply } | { readonly problem: ApiProblem };

/** Reads the scenarios that are to be compared, and the fit that they are read through. */
@Injectable({ providedIn: 'root' })
export class CompareReader {
  readonly #desk = inject(DeskApi);
  readonly #fits = inject(FitsApi);
  readonly #scenarios = inject(ScenariosApi);

  read(ids: readonly string[]): Observable<CompareView> {
    if (ids.length === 0) return of({ kind: 'none' });
    return forkJoin({
      desk: this.#desk.read(),
      found: forkJoin(ids.map((id) => this.#find(id))),
    }).pipe(
      switchMap(({ desk, found }): Observable<CompareView> => {
        const read = found.flatMap((each) => ('scenario' in each ? [each.scenario] : []));
        const first = read.at(0);
        if (first === undefined) {
          const problem = found.flatMap((each) => ('problem' in each ? [each.problem] : [])).at(0);
          return of(problem === undefined ? { kind: 'none' } : { kind: 'failed', problem });
        }
        const scenarios = read.filter(({ fitId }) => fitId === first.fitId);
        const ofOthers = read.filter(({ fitId }) => fitId !== first.fitId);
        const missing = found.length - read.length;
        const leftOut = [
          ...ofOthers.map(
            ({ name }) => `${name} is read through another fit; copy it onto this one first.`,
          ),
          ...(missing === 0 ? [] : [missingWords(missing)]),
        ];
        return this.#fits
          .read(first.fitId)
          .pipe(map((fit) => ({ kind: 'ready', fit, desk, scenarios, leftOut })));
      }),
      catchError((error: unknown) =>
        of<CompareView>({ kind: 'failed', problem: toApiProblem(error) }),
      ),
    );
  }

  #find(id: string): Observable<Found> {
    return this.#scenarios.read(id).pipe(
      map((scenario) => ({ scenario })),
      catchError((error: unknown) => of({ problem: toApiProblem(error) })),
    );
  }
}

function missingWords(count: number): string {
  return count === 1
    ? 'One of the scenarios cannot be read: it may have been deleted.'
    : `${count} of the scenarios cannot be read: they may have been deleted.`;
}
