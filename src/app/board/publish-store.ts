import { Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type {
  ComposeEdition,
  EditionPreviewReply,
  EditionReply,
  EditionSummary,
  FitSummary,
  ScenarioReply,
} from '@contract';
import {
  type Observable,
  Subject,
  catchError,
  debounceTime,
  firstValueFrom,
  forkJoin,
  map,
  of,
  startWith,
  switchMap,
} from 'rxjs';
import { ApiProblem, toApiProblem } from '../api/api-problem';
import { EditionsApi } from '../api/editions-api';
import { FitsApi } from '../api/fits-api';
import { ScenariosApi } from '../api/scenarios-api';

/** What an edition of one fit can be made of. */
export interface PublishGround {
  readonly fitId: string;
  readonly scenarios: readonly ScenarioReply[];
  /** Finished fits, newest first. */
  readonly fits: readonly FitSummary[];
  /** Editions that were returned, newest first. */
  readonly returned: readonly EditionSummary[];
}

export type PublishView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'no-fit' }
  | { readonly kind: 'ready'; readonly ground: PublishGround }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** The edition as the server would freeze it; the last one stays while the next is made. */
export interface PreviewView {
  readonly reply: EditionPreviewReply | null;
  readonly isMaking: boolean;
  readonly problem: ApiProblem | null;
}

/** A person who types is not answered at every letter. */
const restMs = 250;

/** Gathers what an edition can be made of, has the server compose it, and publishes it. */
@Injectable()
export class PublishStore {
  readonly #editions = inject(EditionsApi);
  readonly #fits = inject(FitsApi);
  readonly #scenarios = inject(ScenariosApi);
  readonly #fitIds = new Subject<string | undefined>();
  readonly #requests = new Subject<ComposeEdition>();
  readonly #view = signal<PublishView>({ kind: 'loading' });
  readonly #preview = signal<PreviewView>({ reply: null, isMaking: false, problem: null });
  readonly #problem = signal<ApiProblem | null>(null);
  readonly #isPublishing = signal(false);

  readonly view = this.#view.asReadonly();
  readonly preview = this.#preview.asReadonly();
  readonly problem = this.#problem.asReadonly();
  readonly isPublishing = this.#isPublishing.asReadonly();

  constructor() {
    this.#fitIds
      .pipe(
        switchMap((fitId) => this.#read(fitId)),
        takeUntilDestroyed(),
      )
      .subscribe((view) => {
        this.#view.set(view);
      });
    this.#requests
      .pipe(
        debounceTime(restMs),
        switchMap((request) => this.#compose(request)),
        takeUntilDestroyed(),
      )
      .subscribe((change) => {
        this.#preview.update((now) => ({ ...now, ...change }));
      });
  }

  /** Without an id, the newest finished fit. */
  load(fitId: string | undefined): void {
    this.#problem.set(null);
    this.#preview.set({ reply: null, isMaking: false, problem: null });
    this.#fitIds.next(fitId);
  }

  /** Asks for the edition as these choices make it, once they rest for a moment. */
  compose(request: ComposeEdition): void {
    this.#preview.update((now) => ({ ...now, isMaking: true }));
    this.#requests.next(request);
  }

  /** @returns the edition, or null when it could not be published. */
  async publish(body: ComposeEdition): Promise<EditionReply | null> {
    this.#isPublishing.set(true);
    this.#problem.set(null);
    try {
      return await firstValueFrom(this.#editions.publish(body));
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.#problem.set(error);
      return null;
    } finally {
      this.#isPublishing.set(false);
    }
  }

  #compose(request: ComposeEdition): Observable<Partial<PreviewView>> {
    return this.#editions.preview(request).pipe(
      map((reply) => ({ reply, isMaking: false, problem: null })),
      catchError((error: unknown) => of({ isMaking: false, problem: toApiProblem(error) })),
    );
  }

  #read(fitId: string | undefined): Observable<PublishView> {
    return this.#fits.list().pipe(
      switchMap(({ fits }): Observable<PublishView> => {
        const done = fits.filter(({ state }) => state === 'done');
        const id = fitId ?? done.at(0)?.id;
        return id === undefined ? of({ kind: 'no-fit' }) : this.#ground(id, done);
      }),
      catchError((error: unknown) =>
        of<PublishView>({ kind: 'failed', problem: toApiProblem(error) }),
      ),
      startWith<PublishView>({ kind: 'loading' }),
    );
  }

  #ground(fitId: string, fits: readonly FitSummary[]): Observable<PublishView> {
    return forkJoin({
      scenarios: this.#scenarios.list(fitId),
      editions: this.#editions.list(),
    }).pipe(
      map(({ scenarios, editions }) => ({
        kind: 'ready',
        ground: {
          fitId,
          scenarios: scenarios.scenarios,
          fits,
          returned: editions.editions
            .filter(({ state }) => state === 'returned')
            .sort((left, right) => right.number - left.number),
        },
      })),
    );
  }
}
