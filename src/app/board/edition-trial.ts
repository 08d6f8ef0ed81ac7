import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import type { EditionContent } from '@contract';
import type { PredictionBasis } from '@prediction';
import { NumberFormat } from '../ui/number-format';
import { withYearSet } from '../ui/plan/change-plan';
import { FamiliarNotes } from '../ui/plan/familiar-notes';
import { PlanAssumptions } from '../ui/plan/plan-assumptions';
import { PlanEditor } from '../ui/plan/plan-editor';
import { PlanTable, type PlannedFigureWanted } from '../ui/plan/plan-table';
import { decidingYear, planFinding } from '../ui/plan/plan-words';
import { planLineage } from '../ui/plan/planned-figure';
import { type PlannedYear, readPlan } from '../ui/plan/read-plan';
import { tQuantile } from '../ui/plan/t-quantile';
import type { EditionFigure } from './edition-sheet';
import { labelsOf, shareText } from './edition-words';

/** Moves the plans of an edition without saving: the same prediction on the frozen fit, and no part of the edition. */
@Component({
  selector: 'kv-edition-trial',
  imports: [FamiliarNotes, PlanAssumptions, PlanEditor, PlanTable],
  template: `
    @if (scenarios().length > 1) {
      <p role="group" aria-label="Scenario to try">
        @for (scenario of scenarios(); track scenario.id; let index = $index) {
          <button
            type="button"
            class="kv-link"
            [attr.aria-pressed]="index === chosen()"
            (click)="chosen.set(index)"
          >
            {{ scenario.name }}
          </button>
        }
      </p>
    }
    <h3>{{ finding() }}</h3>
    <kv-plan-editor
      [basis]="basis()"
      [labels]="labels()"
      [plan]="plan()"
      (planChanged)="plan.set($event)"
    />
    <kv-plan-assumptions [basis]="basis()" [years]="plan().length" [refused]="reading().refused" />
    <div class="figures">
      <kv-plan-table
        [plans]="plans()"
        [labels]="labels()"
        [caption]="caption()"
        [form]="basis().form"
        label="Figures of the tried plan by year"
        (opened)="openPlanned($event)"
      />
      <kv-familiar-notes
        [basis]="basis()"
        [labels]="labels()"
        [years]="reading().years"
        (insideWanted)="setInside($event)"
      />
    </div>
  `,
  styles: `
    :host {
      display: grid;
      gap: 12px;
    }
    p {
      display: flex;
      flex-wrap: wrap;
      gap: 16px;
    }
    [aria-pressed='true'] {
      color: var(--kv-plum);
      font-weight: 500;
      text-decoration: underline;
    }
    .figures {
      display: grid;
      gap: 16px;
      align-content: start;
      min-inline-size: 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditionTrial {
  readonly #numbers = inject(NumberFormat);

  readonly content = input.required<EditionContent>();
  /** The frozen fit's prediction. */
  readonly basis = input.required<PredictionBasis>();
  readonly figureOpened = output<EditionFigure>();

  protected readonly scenarios = computed(() => this.content().scenarios);
  protected readonly labels = computed(() => labelsOf(this.content()));
  protected readonly chosen = linkedSignal({ source: this.content, computation: () => 0 });
  protected readonly plan = linkedSignal<readonly PlannedYear[]>(
    () => this.scenarios()[this.chosen()].plan,
  );
  protected readonly reading = computed(() => readPlan(this.basis(), this.plan(), tQuantile));
  readonly #name = computed(() => `${this.scenarios()[this.chosen()].name} as tried`);
  protected readonly plans = computed(() => [
    {
      name: this.#name(),
      years: this.reading().years.map((year) => ({ ...year, familiar: year.familiar.kind })),
    },
  ]);
  protected readonly finding = computed(() => {
    const last = decidingYear(this.reading().years);
    return last === undefined
      ? this.#name()
      : planFinding(this.#name(), this.basis(), last, this.#numbers);
  });
  protected readonly caption = computed(
    () => `${this.#numbers.unitLabel()} · ${shareText(this.basis().confidence)} intervals`,
  );

  protected setInside({ year, values }: PlannedYear): void {
    this.plan.set(withYearSet(this.plan(), year, values));
  }

  protected openPlanned(wanted: PlannedFigureWanted): void {
    const { key, ...planned } = planLineage(wanted, this.labels(), this.basis());
    this.figureOpened.emit({ key, planned });
  }
}
