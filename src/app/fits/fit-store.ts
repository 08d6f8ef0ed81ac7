import { Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { DeskReply, FitReply, FitResult } from '@contract';
import {
  type Observable,
  Subject,
  catchError,
  combineLatest,
  firstValueFrom,
  map,
  of,
  startWith,
  switchMap,
} from 'rxjs';
import { type ApiProblem, toApiProblem } from '../api/api-problem';
import { DeskApi } from '../api/desk-api';
import { FitsApi } from '../api/fits-api';

export type FitView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'running'; readonly reply: FitReply; readonly desk: DeskReply }
  | {
      readonly kind: 'done';
      readonly reply: FitReply;
      readonly result: FitResult;
      readonly desk: DeskReply;
    }
  /** It failed or was cancelled; `reply.fit.state` says which. */
  | { readonly kind: 'ended'; readonly reply: FitReply; readonly desk: DeskReply }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** One fit from its start to its result. */
@Injectable()
export class FitStore {
  readonly #fits = inject(FitsApi);
  readonly #desk = inject(DeskApi);
  readonly #wanted = new Subject<string>();
  readonly #view = signal<FitView>({ kind: 'loading' });
  readonly #problem = signal<ApiProblem | null>(null);

  readonly view = this.#view.asReadonly();
  /** Why the fit could not be cancelled. */
  readonly problem = this.#problem.asReadonly();

  constructor() {
    this.#wanted
      .pipe(
        switchMap((fitId) => this.#follow(fitId)),
        takeUntilDestroyed(),
      )
      .subscribe((view) => {
        this.#view.set(view);
      });
  }

  /** Shows the fit as it is, and follows it while it is queued or running. */
  show(fitId: string): void {
    this.#problem.set(null);
    this.#wanted.next(fitId);
  }

  /** Stops the fit; the view follows by itself. */
  async cancel(fitId: string): Promise<void> {
    try {
      await firstValueFrom(this.#fits.cancel(fitId), { defaultValue: undefined });
    } catch (error) {
      this.#problem.set(toApiProblem(error));
    }
  }

  #follow(fitId: string): Observable<FitView> {
    return combineLatest([this.#fits.follow(fitId), this.#desk.read()]).pipe(
      map(([reply, desk]) => toView(reply, desk)),
      catchError((error: unknown) => of<FitView>({ kind: 'failed', problem: toApiProblem(error) })),
      startWith<FitView>({ kind: 'loading' }),
    );
  }
}

function toView(reply: FitReply, desk: DeskReply): FitView {
  const { state } = reply.fit;
  if (state === 'queued' || state === 'running') return { kind: 'running', reply, desk };
  return reply.result === null
    ? { kind: 'ended', reply, desk }
    : { kind: 'done', reply, result: reply.result, desk };
}
