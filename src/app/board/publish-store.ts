import { Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type {
  EditionReply,
  FitReply,
  FitResult,
  FitSummary,
  PeerGroupReply,
  PublishEdition,
  ScenarioReply,
} from '@contract';
import {
  type Observable,
  Subject,
  catchError,
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
import { PeersApi } from '../api/peers-api';
import { ScenariosApi } from '../api/scenarios-api';

/** All that an edition of one fit can be made of. */
export interface PublishGround {
  readonly fit: FitReply;
  readonly result: FitResult;
  readonly peerGroup: PeerGroupReply;
  readonly scenarios: readonly ScenarioReply[];
  /** Finished fits, newest first. */
  readonly fits: readonly FitSummary[];
  readonly number: number;
  readonly peerGroupsTried: number;
}

export type PublishView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'no-fit' }
  | { readonly kind: 'ready'; readonly ground: PublishGround }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** Gathers what an edition would freeze, and publishes it. */
@Injectable()
export class PublishStore {
  readonly #editions = inject(EditionsApi);
  readonly #fits = inject(FitsApi);
  readonly #peers = inject(PeersApi);
  readonly #scenarios = inject(ScenariosApi);
  readonly #fitIds = new Subject<string | undefined>();
  readonly #view = signal<PublishView>({ kind: 'loading' });
  readonly #problem = signal<ApiProblem | null>(null);
  readonly #isPublishing = signal(false);

  readonly view = this.#view.asReadonly();
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
  }

  /** Without an id, the newest finished fit. */
  load(fitId: string | undefined): void {
    this.#problem.set(null);
    this.#fitIds.next(fitId);
  }

  /** @returns the edition, or null when it could not be published. */
  async publish(body: PublishEdition): Promise<EditionReply | null> {
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
    return this.#fits.read(fitId).pipe(
      switchMap((fit): Observable<PublishView> => {
        const { result } = fit;
        if (result === null) return of({ kind: 'no-fit' });
        return forkJoin({
          peerGroup: this.#peers.read(fit.peerGroup.id),
          peerGroups: this.#peers.list(),
          scenarios: this.#scenarios.list(fitId),
          editions: this.#editions.list(),
        }).pipe(
          map(({ peerGroup, peerGroups, scenarios, editions }) => ({
            kind: 'ready',
            ground: {
              fit,
              result,
              peerGroup,
              scenarios: scenarios.scenarios,
              fits,
              number: 1 + Math.max(0, ...editions.editions.map(({ number }) => number)),
              peerGroupsTried: peerGroups.versions.length,
            },
          })),
        );
      }),
    );
  }
}
