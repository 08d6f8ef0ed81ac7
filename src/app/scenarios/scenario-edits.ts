import { Injectable, computed, inject } from '@angular/core';
import { type AskedPlan, isSameAsked } from '../ui/plan/asked-plan';
import { DraftKeeper } from './draft-keeper';
import { DraftOrigins } from './draft-origins';
import { type Moved, type PlanStep, redone, stepped, undone } from './plan-history';
import type { ScenarioGround } from './scenario-ground';
import { ScenarioState } from './scenario-state';
import { type ScenarioText, draftOf } from './scenario-text';

/** Changes of the plan on the page, the way back from them, and the draft that they are kept in. */
@Injectable()
export class ScenarioEdits {
  readonly #drafts = inject(DraftKeeper);
  readonly #origins = inject(DraftOrigins);
  readonly #state = inject(ScenarioState);

  /** What a step back would undo, and one forth do again; undefined where there is none. */
  readonly undoWords = computed(() => this.#state.history().past.at(-1)?.words);
  readonly redoWords = computed(() => this.#state.history().future.at(-1)?.words);

  rename(change: Partial<Pick<ScenarioText, 'name' | 'note'>>): void {
    this.#set({ ...this.#state.text(), ...change });
  }

  /** A change of the plan; one that changes nothing is no step. */
  change(change: Partial<AskedPlan>, step: PlanStep): void {
    const text = this.#state.text();
    const changed = { ...text, ...change };
    if (isSameAsked(text, changed)) return;
    this.#state.history.update((history) => stepped(history, text, step, performance.now()));
    this.#set(changed);
  }

  /** @returns what was undone, as `Capex FY2026`; null where there was nothing. */
  undo(): string | null {
    return this.#move(undone(this.#state.history(), this.#state.text()));
  }

  redo(): string | null {
    return this.#move(redone(this.#state.history(), this.#state.text()));
  }

  keepDraft(): void {
    const ground = this.#state.ground();
    if (ground === null || !this.#state.maySave()) return;
    this.#drafts.keep(draftOf(ground, this.#state.text()));
    const origin = this.#state.origin();
    if (ground.saved !== null && origin !== null) this.#origins.keep(ground.saved.id, origin);
  }

  /** Keeps the draft again that a failed change had dropped; `sent` when the page has gone on to another plan. */
  keepEdit(ground: ScenarioGround | null, sent?: ScenarioText): void {
    if (this.#state.isShown(ground)) {
      if (this.#state.isChanged()) this.keepDraft();
    } else if (ground !== null && sent !== undefined) {
      void this.#drafts.flush();
      this.#drafts.keep(draftOf(ground, sent));
      void this.#drafts.flush();
    }
  }

  #move(moved: Moved | null): string | null {
    if (moved === null) return null;
    const { plan, outlook, rules, uncertainty } = moved.plan;
    this.#state.history.set(moved.history);
    this.#set({ ...this.#state.text(), plan, outlook, rules, uncertainty });
    return moved.words;
  }

  #set(text: ScenarioText): void {
    this.#state.text.set(text);
    this.#state.confirmation.set(null);
    this.keepDraft();
  }
}
