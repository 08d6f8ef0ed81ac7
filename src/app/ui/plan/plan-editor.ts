import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { type PredictionBasis, heldRegressors } from '@prediction';
import { PlanSlider } from '../plan-slider/plan-slider';
import { heldPlan, mostYears, withValue, withYearAdded, withYearRemoved } from './change-plan';
import { capitalised } from './plan-words';
import type { PlannedYear } from './planned-year';
import { regressorKind } from './regressor-labels';
import { sliderRange } from './slider-range';

/**
 * The plan by year: a slider and a box for each regressor. Emits the whole plan as it is moved.
 *
 * `<kv-plan-editor [basis]="basis" [labels]="['capex', 'book equity']" [plan]="plan" (planChanged)="…" />`
 */
@Component({
  selector: 'kv-plan-editor',
  imports: [PlanSlider],
  template: `
    <div class="actions kv-no-print">
      @if (plan().length < mostYears) {
        <button type="button" class="kv-link" (click)="addYear()">Add FY{{ nextYear() }}</button>
      }
      @if (plan().length > 1) {
        <button type="button" class="kv-link" (click)="removeYear()">
          Remove FY{{ nextYear() - 1 }}
        </button>
      }
      <button type="button" class="kv-link" (click)="holdLast()">Reset to base</button>
    </div>
    @for (row of rows(); track row.year) {
      <div class="year" role="group" [attr.aria-label]="'Plan of FY' + row.year">
        <span class="label">FY{{ row.year }}</span>
        @for (cell of row.cells; track cell.regressor) {
          <div class="cell">
            <span class="kv-caption" aria-hidden="true">{{ cell.label }}</span>
            <kv-plan-slider
              [label]="cell.name"
              [value]="cell.value"
              [base]="cell.base"
              [min]="cell.range.min"
              [max]="cell.range.max"
              [step]="cell.range.step"
              [familiar]="cell.range.familiar"
              [kind]="cell.kind"
              [isAboveZero]="basis().form === 'log'"
              (valueChanged)="setValue(row.year, cell.regressor, $event)"
            />
          </div>
        }
      </div>
    }
    <p class="kv-caption">
      Upright mark: the base, which holds FY{{ basis().last.year }}. Thick stretch: what
      {{ basis().company }} and its peers have shown.
    </p>
  `,
  styleUrl: './plan-editor.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanEditor {
  readonly basis = input.required<PredictionBasis>();
  /** The regressors in words. */
  readonly labels = input.required<readonly string[]>();
  readonly plan = input.required<readonly PlannedYear[]>();
  readonly planChanged = output<readonly PlannedYear[]>();
  /** Before the plan changes to the base, for who keeps more than amounts: rules, ranges. */
  readonly heldAgain = output();

  protected readonly mostYears = mostYears;
  protected readonly nextYear = computed(() => this.basis().last.year + 1 + this.plan().length);
  readonly #ranges = computed(() =>
    this.labels().map((_, regressor) => sliderRange(this.basis(), regressor, this.plan())),
  );
  protected readonly rows = computed(() =>
    this.plan().map(({ year, values }) => ({
      year,
      cells: this.labels().map((label, regressor) => ({
        regressor,
        label,
        kind: regressorKind(regressor),
        name: `${capitalised(label)} FY${year}`,
        value: values[regressor],
        base: heldRegressors(this.basis())[regressor],
        range: this.#ranges()[regressor],
      })),
    })),
  );

  protected setValue(year: number, regressor: number, value: number): void {
    this.planChanged.emit(withValue(this.plan(), year, regressor, value));
  }

  protected addYear(): void {
    this.planChanged.emit(withYearAdded(this.plan()));
  }

  protected removeYear(): void {
    this.planChanged.emit(withYearRemoved(this.plan()));
  }

  protected holdLast(): void {
    this.heldAgain.emit();
    this.planChanged.emit(heldPlan(this.basis(), this.plan().length));
  }
}
