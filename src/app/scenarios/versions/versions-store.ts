import { Injectable, inject, signal } from '@angular/core';
import type { ScenarioVersion } from '@contract';
import { firstValueFrom } from 'rxjs';
import { ApiProblem } from '../../api/api-problem';
import { ScenariosApi } from '../../api/scenarios-api';

export type VersionsView =
  | { readonly kind: 'idle' }
  | { readonly kind: 'loading' }
  | { readonly kind: 'ready'; readonly versions: readonly ScenarioVersion[] }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** The stored versions of one scenario, read when they are asked for. */
@Injectable()
export class VersionsStore {
  readonly #api = inject(ScenariosApi);
  readonly #view = signal<VersionsView>({ kind: 'idle' });
  #asked = '';

  readonly view = this.#view.asReadonly();

  async read(scenarioId: string): Promise<void> {
    this.#asked = scenarioId;
    this.#view.set({ kind: 'loading' });
    const view = await this.#versionsOf(scenarioId);
    if (this.#asked === scenarioId) this.#view.set(view);
  }

  async #versionsOf(scenarioId: string): Promise<VersionsView> {
    try {
      const { versions } = await firstValueFrom(this.#api.versions(scenarioId));
      return { kind: 'ready', versions };
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      return { kind: 'failed', problem: error };
    }
  }
}
