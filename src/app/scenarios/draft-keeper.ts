import { DestroyRef, Injectable, inject, signal } from '@angular/core';
import type { SaveDraft } from '@contract';
import { firstValueFrom } from 'rxjs';
import { ApiProblem } from '../api/api-problem';
import { ScenariosApi } from '../api/scenarios-api';
import { ProblemBannerState } from '../ui/problem';

const waitMs = 800;

export type DraftState = 'none' | 'keeping' | 'kept' | 'failed';

export interface Draft {
  readonly fitId: string;
  readonly body: SaveDraft;
}

/**
 * Keeps an unsaved plan on the server, a moment after the last change. One request at a time: a draft that arrived
 * after the scenario it belongs to was saved would come back as unsaved.
 */
@Injectable()
export class DraftKeeper {
  readonly #api = inject(ScenariosApi);
  readonly #banner = inject(ProblemBannerState);
  readonly #state = signal<DraftState>('none');
  #waiting: Draft | null = null;
  #timer: ReturnType<typeof setTimeout> | undefined;
  #sent: Promise<void> = Promise.resolve();

  readonly state = this.#state.asReadonly();

  constructor() {
    inject(DestroyRef).onDestroy(() => void this.flush());
  }

  keep(draft: Draft): void {
    this.#waiting = draft;
    this.#state.set('keeping');
    clearTimeout(this.#timer);
    this.#timer = setTimeout(() => void this.flush(), waitMs);
  }

  /** Sends what waits, and ends when everything is with the server. */
  flush(): Promise<void> {
    clearTimeout(this.#timer);
    const draft = this.#waiting;
    this.#waiting = null;
    if (draft !== null) this.#sent = this.#sent.then(() => this.#send(draft));
    return this.#sent;
  }

  /** Forgets what waits, and ends when nothing is on its way any more. */
  drop(): Promise<void> {
    clearTimeout(this.#timer);
    this.#waiting = null;
    this.#state.set('none');
    return this.#sent;
  }

  /** Takes the stored draft away; one of another plan that waits stays. @throws {ApiProblem} */
  async discard(fitId: string, scenarioId: string | null): Promise<void> {
    const waiting = this.#waiting;
    const isOfAnother =
      waiting !== null && (waiting.fitId !== fitId || waiting.body.scenarioId !== scenarioId);
    await (isOfAnother ? this.#sent : this.drop());
    await firstValueFrom(this.#api.discardDraft(fitId, scenarioId), { defaultValue: undefined });
  }

  async #send({ fitId, body }: Draft): Promise<void> {
    try {
      await firstValueFrom(this.#api.saveDraft(fitId, body));
      if (this.#waiting === null) this.#state.set('kept');
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.#state.set('failed');
      this.#banner.report({
        ...error.shown,
        title: 'Your unsaved plan could not be kept on the server',
        whatToDo: 'It stays on this page: save it, or change it again to try once more.',
      });
    }
  }
}
