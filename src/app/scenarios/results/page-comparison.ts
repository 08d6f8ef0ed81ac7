import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { ScenarioReply } from '@contract';
import { ScenarioState } from '../scenario-state';
import { type ComparedPlan, mostCompared } from './compared-plans';
import { PlanResults } from './plan-results';
import { ScenarioComparison } from './scenario-comparison';

/** The plan on the page beside saved scenarios of its fit, with the address under which others see the saved ones. */
@Component({
  selector: 'kv-page-comparison',
  imports: [RouterLink, ScenarioComparison],
  template: `
    @if (plans(); as plans) {
      @if (plans.length > 1) {
        <h3>Side by side</h3>
        <kv-scenario-comparison [basis]="basis()!" [plans]="plans" [source]="source()" />
        @if (saved().length > 1) {
          <p>
            <a routerLink="/scenarios/compare" [queryParams]="{ of: saved().join(',') }">
              Open the saved ones on a page of their own
            </a>
            <span class="kv-caption"> whose address others can open; it holds no amounts</span>
          </p>
        } @else {
          <p class="kv-caption">Save this plan to share the comparison as a link.</p>
        }
      } @else {
        <p class="kv-caption">
          Mark up to {{ mostCompared - 1 }} scenarios to see them beside this plan.
        </p>
      }
    }
  `,
  styleUrl: './results.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PageComparison {
  readonly #results = inject(PlanResults);
  readonly #state = inject(ScenarioState);

  /** The saved ones to stand beside the plan. */
  readonly beside = input.required<readonly ScenarioReply[]>();

  protected readonly mostCompared = mostCompared;
  protected readonly basis = computed(() => this.#state.ground()?.basis ?? null);
  protected readonly source = computed(() => this.#results.source());
  protected readonly plans = computed((): readonly ComparedPlan[] | null => {
    const shown = this.#results.shown();
    if (shown === null) return null;
    const { name, plan, outlook } = shown;
    const id = this.#state.ground()?.saved?.id ?? null;
    return [{ id, name, plan, outlook }, ...this.beside()].slice(0, mostCompared);
  });
  /** Ids in the order of the comparison. */
  protected readonly saved = computed(() =>
    (this.plans() ?? []).flatMap(({ id }) => (id === null ? [] : [id])),
  );
}
