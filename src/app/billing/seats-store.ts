import { Injectable, inject, signal } from '@angular/core';
import type { SeatsReply } from '@contract';
import { firstValueFrom } from 'rxjs';
import { ApiProblem } from '../api/api-problem';
import { SeatsApi } from '../api/seats-api';
import type { ShownProblem } from '../ui/problem';

export type SeatsView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'ready'; readonly seats: SeatsReply }
  | { readonly kind: 'failed'; readonly problem: ShownProblem };

/** What the payment provider says about the workspace's seats; one for each visit of the page. */
@Injectable()
export class SeatsStore {
  readonly #api = inject(SeatsApi);
  readonly #view = signal<SeatsView>({ kind: 'loading' });

  readonly view = this.#view.asReadonly();

  async load(): Promise<void> {
    this.#view.set({ kind: 'loading' });
    try {
      this.#view.set({ kind: 'ready', seats: await firstValueFrom(this.#api.read()) });
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.#view.set({ kind: 'failed', problem: error.shown });
    }
  }
}
