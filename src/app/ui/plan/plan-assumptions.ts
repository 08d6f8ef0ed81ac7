import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { PlanOutlook } from '@contract';
import type { PredictionBasis } from '@prediction';
import { planAssumptions } from './plan-words';

/** What a plan's figures take for granted beyond its amounts, and the years that have none. */
@Component({
  selector: 'kv-plan-assumptions',
  template: `
    @for (assumption of assumptions(); track assumption) {
      <p class="kv-caption">{{ assumption }}</p>
    }
    @for (year of refused(); track year.year) {
      <p role="alert">FY{{ year.year }} has no figures. {{ year.reason }}</p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 4px;
    }
    :host:empty {
      display: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanAssumptions {
  readonly basis = input.required<PredictionBasis>();
  /** How many years the longest plan has. */
  readonly years = input.required<number>();
  /** How the plan is looked at; the model's level and the last year effect unless told otherwise. */
  readonly outlook = input<Pick<PlanOutlook, 'start' | 'yearEffect'>>();
  /** Planned years that the model cannot read, and why. */
  readonly refused = input<readonly { readonly year: number; readonly reason: string }[]>([]);

  protected readonly assumptions = computed(() =>
    planAssumptions(this.basis(), this.years(), this.outlook()),
  );
}
