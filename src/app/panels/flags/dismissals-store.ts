import { Injectable, inject, signal } from '@angular/core';
import type { FlagDismissal } from '@contract';
import type { Flag } from '@panel-data';
import { firstValueFrom } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../../api/api-problem';
import { PanelsApi } from '../../api/panels-api';
import { dismissalOf, sortedFlags } from './dismissed-flags';

/** The flags of a panel that somebody looked at and found to be right. */
@Injectable()
export class DismissalsStore {
  readonly #panels = inject(PanelsApi);
  readonly #dismissals = signal<readonly FlagDismissal[]>([]);
  readonly #problem = signal<ApiProblem | null>(null);
  #panelId = '';

  readonly dismissals = this.#dismissals.asReadonly();
  /** Why they could not be read or taken back. */
  readonly problem = this.#problem.asReadonly();

  async open(panelId: string): Promise<void> {
    if (panelId !== this.#panelId) this.#dismissals.set([]);
    this.#panelId = panelId;
    await this.#try(async () => {
      const { dismissals } = await firstValueFrom(this.#panels.dismissals(panelId));
      if (panelId === this.#panelId) this.#dismissals.set(dismissals);
    });
  }

  async reload(): Promise<void> {
    await this.open(this.#panelId);
  }

  /**
   * Says of each flag why it is right, one after the other.
   *
   * @returns the problem at the first one that was not taken; those before it are.
   */
  async dismiss(flags: readonly Flag[], reason: string): Promise<ApiProblem | null> {
    try {
      // After a failure in the midst, the rest is asked for again: not what was taken already.
      for (const flag of sortedFlags(flags, this.#dismissals()).open) {
        const request = this.#panels.dismissFlag(this.#panelId, dismissalOf(flag, reason));
        const dismissal = await firstValueFrom(request);
        this.#dismissals.update((known) => [...known, dismissal]);
      }
      return null;
    } catch (error) {
      return toApiProblem(error);
    }
  }

  /** @returns whether it is taken back. */
  async takeBack({ id }: FlagDismissal): Promise<boolean> {
    return this.#try(async () => {
      await firstValueFrom(this.#panels.takeBackDismissal(this.#panelId, id), {
        defaultValue: undefined,
      });
      this.#dismissals.update((known) => known.filter((each) => each.id !== id));
    });
  }

  /** @returns whether it could be done. */
  async #try(work: () => Promise<void>): Promise<boolean> {
    this.#problem.set(null);
    try {
      await work();
      return true;
    } catch (error) {
      this.#problem.set(toApiProblem(error));
      return false;
    }
  }
}
