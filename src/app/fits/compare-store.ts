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

  async load(a: string | undefined, b: string | undefined): Promise<void> {
    this.#view.set({ kind: 'loading' });
    if (a === undefined || b === undefined) {
      this.#view.set({ kind: 'unfinished' });
      return;
    }
    try {
      const [first, second] = await Promise.all([this.#read(a), this.#read(b)]);
      this.#view.set(
        first === null || second === null
          ? { kind: 'unfinished' }
          : { kind: 'ready', a: first, b: second },
      );
    } catch (error) {
      this.#view.set({ kind: 'failed', problem: toApiProblem(error) });
    }
  }

  async #read(fitId: string): Promise<FinishedFit | null> {
    const reply = await firstValueFrom(this.#fits.read(fitId));
    return reply.result === null ? null : { reply, result: reply.result };
  }
}
