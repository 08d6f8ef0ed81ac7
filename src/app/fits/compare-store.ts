import { Injectable, inject, signal } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../api/api-problem';
import { FitsApi } from '../api/fits-api';
import type { FinishedFit } from './compare-words';

export type CompareView =
  | { readonly kind: 'loading' }
  /** The address names fewer than two fits, or one that has no result. */
  | { readonly kind: 'unfinished' }
  | { readonly kind: 'ready'; readonly a: FinishedFit; readonly b: FinishedFit }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** Two fits side by side. */
@Injectable()
export class CompareStore {
  readonly #fits = inject(FitsApi);
  readonly #view = signal<CompareView>({ kind: 'loading' });
  readonly view = this.#view.asReadonly();
  /** Counts the loads, so that a reply that was overtaken changes nothing. */
  #loads = 0;

  async load(a: string | undefined, b: string | undefined): Promise<void> {
    const turn = ++this.#loads;
    this.#view.set({ kind: 'loading' });
    if (a === undefined || b === undefined) {
      this.#view.set({ kind: 'unfinished' });
      return;
    }
    const view = await this.#readBoth(a, b).catch((error: unknown): CompareView => ({
      kind: 'failed',
      problem: toApiProblem(error),
    }));
    if (turn === this.#loads) this.#view.set(view);
  }

  async #readBoth(a: string, b: string): Promise<CompareView> {
    const [first, second] = await Promise.all([this.#read(a), this.#read(b)]);
    return first === null || second === null
      ? { kind: 'unfinished' }
      : { kind: 'ready', a: first, b: second };
  }

  async #read(fitId: string): Promise<FinishedFit | null> {
    const reply = await firstValueFrom(this.#fits.read(fitId));
    return reply.result === null ? null : { reply, result: reply.result };
  }
}
