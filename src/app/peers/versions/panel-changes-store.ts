import { Injectable, inject, signal } from '@angular/core';
import type { PanelDifferencesReply } from '@contract';
import { firstValueFrom } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../../api/api-problem';
import { PanelsApi } from '../../api/panels-api';

export type PanelChangesView =
  | { readonly kind: 'idle' }
  | { readonly kind: 'loading' }
  | { readonly kind: 'ready'; readonly differences: PanelDifferencesReply }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** What a newer panel version changed, read when it is asked for. */
@Injectable()
export class PanelChangesStore {
  readonly #panels = inject(PanelsApi);
  readonly #view = signal<PanelChangesView>({ kind: 'idle' });
  /** Counts what was asked for, so that a reply that was overtaken changes nothing. */
  #turns = 0;

  readonly view = this.#view.asReadonly();

  async load(olderId: string, newerId: string): Promise<void> {
    const turn = ++this.#turns;
    this.#view.set({ kind: 'loading' });
    try {
      const differences = await firstValueFrom(this.#panels.differences(olderId, newerId));
      if (turn === this.#turns) this.#view.set({ kind: 'ready', differences });
    } catch (error) {
      const problem = toApiProblem(error);
      if (turn === this.#turns) this.#view.set({ kind: 'failed', problem });
    }
  }

  forget(): void {
    this.#turns++;
    this.#view.set({ kind: 'idle' });
  }
}
