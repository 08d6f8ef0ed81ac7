import { DestroyRef, Injectable, computed, inject, signal } from '@angular/core';
import { type ScenarioReply, apiRoutes, mayCall } from '@contract';
import { ApiProblem } from '../api/api-problem';
import { SessionStore } from '../api/session-store';
import { ProblemBannerState } from '../ui/problem';
import { readPlan } from '../ui/plan/read-plan';
import { tQuantile } from '../ui/plan/t-quantile';
import { type PlanHistory, noHistory } from './plan-history';
import { type ScenarioGround, type ScenarioView, isSameGround } from './scenario-ground';
import { type ScenarioText, isSameText, noText, storedText, withScenario } from './scenario-text';

/** What the server said of the figures when the plan was saved. */
export type Confirmation =
  | { readonly kind: 'agrees'; readonly version: number }
  | { readonly kind: 'differs'; readonly version: number; readonly years: readonly number[] };

/** What stands on the page: the ground, the plan on it, and what there is to say of them. */
@Injectable()
export class ScenarioState {
  readonly #banner = inject(ProblemBannerState);
  readonly #page = inject(DestroyRef);
  readonly #sessions = inject(SessionStore);

  readonly view = signal<ScenarioView>({ kind: 'loading' });
  readonly text = signal<ScenarioText>(noText);
  readonly history = signal<PlanHistory>(noHistory);
  /** The version that the plan on the page began with; null while it is a new one. */
  readonly origin = signal<number | null>(null);
  /** When the draft that came back was kept; null when the page began with what is stored. */
  readonly restoredAt = signal<string | null>(null);
  readonly problem = signal<ApiProblem | null>(null);
  readonly confirmation = signal<Confirmation | null>(null);

  readonly maySave = computed(() => mayCall(apiRoutes.saveScenario, this.#sessions.roles()));
  readonly ground = computed(() => {
    const view = this.view();
    return view.kind === 'ready' ? view.ground : null;
  });
  readonly #plan = computed(() => this.text().plan);
  readonly #outlook = computed(() => this.text().outlook);
  readonly reading = computed(() => {
    const ground = this.ground();
    return ground === null
      ? null
      : readPlan(ground.basis, this.#plan(), tQuantile, this.#outlook());
  });
  readonly isChanged = computed(() => {
    const ground = this.ground();
    return ground !== null && !isSameText(this.text(), storedText(ground));
  });
  /** The version that somebody else stored since the plan on the page began, while the two differ. */
  readonly theirs = computed(() => {
    const [saved, origin] = [this.ground()?.saved ?? null, this.origin()];
    const isNewer = saved !== null && origin !== null && saved.version > origin;
    return isNewer && this.isChanged() ? saved : null;
  });

  /** Runs a change; its problem stays beside what was entered, and goes to the banner when the page has gone on. */
  async guarded(work: () => Promise<void>): Promise<boolean> {
    const ground = this.ground();
    this.problem.set(null);
    try {
      await work();
      return true;
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      if (this.isShown(ground)) this.problem.set(error);
      else this.#banner.report(error.shown);
      return false;
    }
  }

  /** Whether a reply for this ground still finds it on the page. */
  isShown(ground: ScenarioGround | null): boolean {
    return !this.#page.destroyed && isSameGround(ground, this.ground());
  }

  /** Puts what is stored now in the place of what was. */
  setSaved(saved: ScenarioReply): void {
    this.#patch((ground) => ({
      ...ground,
      saved,
      draft: null,
      scenarios: withScenario(ground.scenarios, saved),
    }));
  }

  setScenarios(change: (scenarios: readonly ScenarioReply[]) => readonly ScenarioReply[]): void {
    this.#patch((ground) => ({ ...ground, scenarios: change(ground.scenarios) }));
  }

  #patch(change: (ground: ScenarioGround) => ScenarioGround): void {
    this.view.update((view) =>
      view.kind === 'ready' ? { kind: 'ready', ground: change(view.ground) } : view,
    );
  }
}
