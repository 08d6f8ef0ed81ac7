import { Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { Bootstrap, Evidence, EvidenceReply } from '@contract';
import { type Observable, Subject, catchError, firstValueFrom, map, of, switchMap } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../../api/api-problem';
import { FitsApi } from '../../api/fits-api';

export type EvidenceView =
  | { readonly kind: 'idle' }
  | { readonly kind: 'loading' }
  /** It is being computed; the view follows by itself. */
  | { readonly kind: 'computing' }
  | {
      readonly kind: 'ready';
      readonly evidence: Evidence;
      /** The newest bootstrap that was asked for. */
      readonly bootstrap: Bootstrap | null;
    }
  | { readonly kind: 'unavailable'; readonly reason: string }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** The evidence of one fit, and the bootstrap that can be run beside it. */
@Injectable()
export class EvidenceStore {
  readonly #fits = inject(FitsApi);
  readonly #wanted = new Subject<string>();
  readonly #view = signal<EvidenceView>({ kind: 'idle' });
  readonly #problem = signal<ApiProblem | null>(null);
  #fitId = '';

  readonly view = this.#view.asReadonly();
  /** Why the bootstrap could not be started, followed or cancelled. */
  readonly problem = this.#problem.asReadonly();

  constructor() {
    this.#wanted
      .pipe(
        switchMap((fitId) => this.#follow(fitId)),
        takeUntilDestroyed(),
      )
      .subscribe((view) => {
        this.#show(view);
      });
  }

  /** Shows the evidence of a fit, and follows it while it is being computed. */
  show(fitId: string): void {
    this.#fitId = fitId;
    this.#problem.set(null);
    this.#view.set({ kind: 'loading' });
    this.#wanted.next(fitId);
  }

  /** Runs the wild bootstrap of the shown fit by draws; what is shown stays until its intervals come. */
  async startBootstrap(seed: number): Promise<void> {
    const fitId = this.#fitId;
    await this.#change(fitId, this.#fits.startBootstrap(fitId, { seed }));
  }

  async cancelBootstrap(): Promise<void> {
    const fitId = this.#fitId;
    await this.#change(fitId, this.#fits.cancelBootstrap(fitId));
  }

  async #change(fitId: string, call: Observable<unknown>): Promise<void> {
    this.#problem.set(null);
    try {
      await firstValueFrom(call, { defaultValue: undefined });
      if (fitId === this.#fitId) this.#wanted.next(fitId);
    } catch (error) {
      if (fitId === this.#fitId) this.#problem.set(toApiProblem(error));
    }
  }

  #follow(fitId: string): Observable<EvidenceView> {
    return this.#fits.followEvidence(fitId).pipe(
      map(toView),
      catchError((error: unknown) =>
        of<EvidenceView>({ kind: 'failed', problem: toApiProblem(error) }),
      ),
    );
  }

  /** Evidence that is on the screen is not taken away because a later look at it failed. */
  #show(view: EvidenceView): void {
    if (view.kind === 'failed' && this.#view().kind === 'ready') this.#problem.set(view.problem);
    else this.#view.set(view);
  }
}

function toView(reply: EvidenceReply): EvidenceView {
  if (reply.state === 'computing') return { kind: 'computing' };
  if (reply.state === 'unavailable') return { kind: 'unavailable', reason: reply.reason };
  return { kind: 'ready', evidence: reply.evidence, bootstrap: reply.bootstrap };
}
