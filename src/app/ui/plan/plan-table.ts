import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import type { FamiliarRange, IntervalEstimate, PredictionBasis } from '@prediction';
import { Figure } from '../figure';
import { type Bounded, asDifference, differenceKind } from '../model-form';
import { NumberFormat } from '../number-format';
import { capitalised, expectedName } from './plan-words';
import type { PlannedYear } from './planned-year';
import { regressorKind } from './regressor-labels';

/** A planned year with its figures, from the screen or as they were stored. */
export interface PlanTableYear extends PlannedYear {
  readonly expected: IntervalEstimate;
  readonly difference: IntervalEstimate;
  readonly familiar: FamiliarRange['kind'];
}

export interface PlanTablePlan {
  readonly name: string;
  readonly years: readonly PlanTableYear[];
}

/** A figure of a plan that the person wants to see through. */
export interface PlannedFigureWanted {
  readonly plan: PlanTablePlan;
  readonly year: PlanTableYear;
  readonly kind: 'expected' | 'difference';
}

const familiarWords: Readonly<Record<FamiliarRange['kind'], string>> = {
  inside: 'inside',
  edge: 'at the edge',
  outside: 'outside',
};

/** The figures of plans by year; each opens its lineage. */
@Component({
  selector: 'kv-plan-table',
  imports: [Figure],
  template: `
    <div class="kv-table-scroll" tabindex="0" role="region" [attr.aria-label]="label()">
      <table class="kv-table">
        <caption>
          {{
            caption()
          }}
        </caption>
        <thead>
          <tr>
            @if (plans().length > 1) {
              <th scope="col">Scenario</th>
            }
            <th scope="col">Year</th>
            @for (name of regressors(); track name) {
              <th scope="col" class="kv-number">{{ name }}</th>
            }
            <th scope="col" class="kv-number">{{ expectedName() }}</th>
            <th scope="col" class="kv-number">Against base</th>
            <th scope="col">Familiar range</th>
          </tr>
        </thead>
        <tbody>
          @for (plan of plans(); track $index) {
            @for (year of plan.years; track year.year; let first = $first) {
              <tr>
                @if (plans().length > 1 && first) {
                  <th scope="rowgroup" class="kv-plan" [attr.rowspan]="plan.years.length">
                    {{ plan.name }}
                  </th>
                }
                <th scope="row">FY{{ year.year }}</th>
                @for (value of year.values; track $index) {
                  <td class="kv-number">
                    {{ numbers.figure(value, regressorKind($index), valueDigits()[$index]) }}
                  </td>
                }
                <td class="kv-number">
                  <kv-figure
                    [value]="year.expected.estimate"
                    [low]="year.expected.low"
                    [high]="year.expected.high"
                    [digits]="expectedDigits()"
                    [figure]="'expected.' + year.year"
                    (opened)="opened.emit({ plan, year, kind: 'expected' })"
                  />
                </td>
                <td class="kv-number">
                  <kv-figure
                    [kind]="differenceKind()"
                    [value]="differenceOf(year).estimate"
                    [low]="boundOf(year, 'low')"
                    [high]="boundOf(year, 'high')"
                    [digits]="differenceDigits()"
                    [hasPlus]="true"
                    [figure]="'difference.' + year.year"
                    (opened)="opened.emit({ plan, year, kind: 'difference' })"
                  />
                </td>
                <td>{{ familiarWords[year.familiar] }}</td>
              </tr>
            }
          }
        </tbody>
      </table>
    </div>
    @for (reason of reasons(); track reason) {
      <p class="kv-caption">{{ reason }}</p>
    }
  `,
  styles: `
    :host {
      display: block;
      min-inline-size: 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanTable {
  protected readonly numbers = inject(NumberFormat);

  readonly plans = input.required<readonly PlanTablePlan[]>();
  /** The regressors in words. */
  readonly labels = input.required<readonly string[]>();
  /** Unit and confidence level: `EUR m · 95 % intervals`. */
  readonly caption = input.required<string>();
  /** Of the fit: in logs an expected value is a mean and a difference a percentage. */
  readonly form = input<PredictionBasis['form']>();
  readonly label = input('Figures of the plan by year');
  readonly opened = output<PlannedFigureWanted>();

  protected readonly familiarWords = familiarWords;
  protected readonly regressorKind = regressorKind;
  protected readonly expectedName = computed(() => expectedName(this.form()));
  protected readonly differenceKind = computed(() => differenceKind(this.form()));
  protected readonly regressors = computed(() => this.labels().map(capitalised));
  readonly #years = computed(() => this.plans().flatMap(({ years }) => years));
  protected readonly valueDigits = computed(() =>
    this.labels().map((_, k) =>
      this.numbers.columnDigits(
        this.#years().map((year) => year.values[k]),
        regressorKind(k),
      ),
    ),
  );
  protected readonly expectedDigits = computed(() =>
    this.numbers.columnDigits(this.#years().map(({ expected }) => expected.estimate)),
  );
  protected readonly differenceDigits = computed(() =>
    this.numbers.columnDigits(
      this.#years().map((year) => this.differenceOf(year).estimate),
      this.differenceKind(),
    ),
  );
  /** Why figures have no interval, each reason once. */
  protected readonly reasons = computed(() => [
    ...new Set(
      this.#years()
        .flatMap(({ expected, difference }) => [expected, difference])
        .flatMap(({ intervalReason }) => intervalReason ?? []),
    ),
  ]);

  /** At the base there is nothing to be unsure about, and no interval to show. */
  protected boundOf(year: PlanTableYear, end: 'low' | 'high'): number | null | undefined {
    const { estimate, standardError } = year.difference;
    return estimate === 0 && standardError === 0 ? undefined : this.differenceOf(year)[end];
  }

  protected differenceOf({ difference }: PlanTableYear): Bounded {
    return asDifference(difference, this.form());
  }
}
