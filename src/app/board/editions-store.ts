import { Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { EditionSummary } from '@contract';
import { type Observable, Subject, catchError, map, of, startWith, switchMap } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../api/api-problem';
import { EditionsApi } from '../api/editions-api';

export type EditionsView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'ready'; readonly editions: readonly EditionSummary[] }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** The editions that the person may see, newest first. */
@Injectable()
export class EditionsStore {
  readonly #api = inject(EditionsApi);
  readonly #wanted = new Subject<void>();
  readonly #view = signal<EditionsView>({ kind: 'loading' });
  readonly view = this.#view.asReadonly();

  constructor() {
    this.#wanted
      .pipe(
        switchMap(() => this.#read()),
        takeUntilDestroyed(),
      )
      .subscribe((view) => {
        this.#view.set(view);
      });
  }

  load(): void {
    this.#wanted.next();
  }

  #read(): Observable<EditionsView> {
    return this.#api.list().pipe(
      map(({ editions }): EditionsView => ({
        kind: 'ready',
        editions: [...editions].sort((left, right) => right.number - left.number),
      })),
      catchError((error: unknown) =>
        of<EditionsView>({ kind: 'failed', problem: toApiProblem(error) }),
      ),
      startWith<EditionsView>({ kind: 'loading' }),
    );
  }
}
