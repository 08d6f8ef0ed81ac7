import { Injectable, inject, signal } from '@angular/core';
import type { ScenarioCopyReply, ScenarioReply } from '@contract';
import { firstValueFrom } from 'rxjs';
import { ScenariosApi } from '../api/scenarios-api';
import { DraftKeeper } from './draft-keeper';
import { ScenarioEdits } from './scenario-edits';
import { ScenarioState } from './scenario-state';
import { withScenario } from './scenario-text';

/** The stored scenarios of a fit: taken away, put back, copied. */
@Injectable()
export class ScenarioShelf {
  readonly #api = inject(ScenariosApi);
  readonly #drafts = inject(DraftKeeper);
  readonly #edits = inject(ScenarioEdits);
  readonly #state = inject(ScenarioState);
  readonly #copied = signal<ScenarioCopyReply | null>(null);

  /** The last copy onto another fit, with what it could not take over. */
  readonly copied = this.#copied.asReadonly();

  /** @returns whether it is gone. */
  async remove(scenario: ScenarioReply): Promise<boolean> {
    const ground = this.#state.ground();
    const isGone = await this.#state.guarded(async () => {
      if (scenario.id === ground?.saved?.id) await this.#drafts.drop();
      await firstValueFrom(this.#api.delete(scenario.id), { defaultValue: undefined });
    });
    if (!isGone) this.#edits.keepEdit(ground);
    else this.#state.setScenarios((scenarios) => scenarios.filter(({ id }) => id !== scenario.id));
    return isGone;
  }

  /** @returns whether it is back. */
  restore(scenario: ScenarioReply): Promise<boolean> {
    return this.#state.guarded(async () => {
      const back = await firstValueFrom(this.#api.restore(scenario.id));
      if (this.#state.ground()?.fit.fit.id !== back.fitId) return;
      this.#state.setScenarios((scenarios) => withScenario(scenarios, back));
    });
  }

  /** @returns the copy on the same fit, or null when there is none. */
  async copy(scenario: ScenarioReply): Promise<ScenarioReply | null> {
    const reply = await this.#copy(scenario.id);
    return reply?.scenario ?? null;
  }

  /** @returns the copy on another fit, or null when there is none; `copied` has what it could not take over. */
  async copyOnto(scenario: ScenarioReply, fitId: string): Promise<ScenarioReply | null> {
    const reply = await this.#copy(scenario.id, fitId);
    this.#copied.set(reply);
    return reply?.scenario ?? null;
  }

  forgetCopied(): void {
    this.#copied.set(null);
  }

  async #copy(id: string, fitId?: string): Promise<ScenarioCopyReply | null> {
    let reply: ScenarioCopyReply | null = null;
    await this.#state.guarded(async () => {
      reply = await firstValueFrom(this.#api.copy(id, fitId === undefined ? {} : { fitId }));
    });
    return reply;
  }
}
