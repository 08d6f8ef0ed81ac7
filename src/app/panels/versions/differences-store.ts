import { Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { PanelDifferencesReply } from '@contract';
import { type Observable, Subject, catchError, map, of, startWith, switchMap } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../../api/api-problem';
import { PanelsApi } from '../../api/panels-api';

export type DifferencesView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'ready'; readonly differences: PanelDifferencesReply }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** What changed between two versions of a panel. */
@Injectable()
export class DifferencesStore {
  readonly #panels = inject(PanelsApi);
  readonly #wanted = new Subject<readonly [olderId: string, newerId: string]>();
  readonly #view = signal<DifferencesView>({ kind: 'loading' });

  readonly view = this.#view.asReadonly();

  constructor() {
    this.#wanted
      .pipe(
        switchMap(([olderId, newerId]) => this.#read(olderId, newerId)),
        takeUntilDestroyed(),
      )
      .subscribe((view) => {
        this.#view.set(view);
      });
  }

  open(olderId: string, newerId: string): void {
    this.#wanted.next([olderId, newerId]);
  }

  #read(olderId: string, newerId: string): Observable<DifferencesView> {
    return this.#panels.differences(olderId, newerId).pipe(
      map((differences): DifferencesView => ({ kind: 'ready', differences })),
      catchError((error: unknown) =>
        of<DifferencesView>({ kind: 'failed', problem: toApiProblem(error) }),
      ),
      startWith<DifferencesView>({ kind: 'loading' }),
    );
  }
}
