import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { ScenarioReply } from '@contract';
import type { PredictionBasis } from '@prediction';
import { Figure } from '../ui/figure';
import { asDifference, differenceKind } from '../ui/model-form';
import { NumberFormat } from '../ui/number-format';
import type { PlannedFigureWanted } from '../ui/plan/plan-table';
import { expectedName } from '../ui/plan/plan-words';
import { storedFigures } from './scenario-text';

/** The fit's other scenarios: what each comes to by its last year. */
@Component({
  selector: 'kv-scenario-list',
  imports: [Figure, RouterLink],
  template: `
    <div
      class="kv-table-scroll"
      tabindex="0"
      role="region"
      aria-label="Other scenarios of this fit"
    >
      <table class="kv-table">
        <caption>
          {{
            caption()
          }}
        </caption>
        <thead>
          <tr>
            <th scope="col">Scenario</th>
            <th scope="col">By</th>
            <th scope="col" class="kv-number">{{ expectedName() }}</th>
            <th scope="col" class="kv-number">Against base</th>
            <th scope="col">In the chart</th>
            @if (mayChange()) {
              <th scope="col"><span class="kv-visually-hidden">Change</span></th>
            }
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.scenario.id) {
            <tr>
              <th scope="row">
                <a [routerLink]="['/scenarios', row.scenario.id]">{{ row.scenario.name }}</a>
              </th>
              <td>FY{{ row.last.year }}</td>
              <td class="kv-number">
                <kv-figure
                  [value]="row.last.expected.estimate"
                  [low]="row.last.expected.low"
                  [high]="row.last.expected.high"
                  [digits]="expectedDigits()"
                  [figure]="'expected.' + row.last.year"
                  (opened)="opened.emit({ plan: row.plan, year: row.last, kind: 'expected' })"
                />
              </td>
              <td class="kv-number">
                <kv-figure
                  [kind]="differenceKind()"
                  [value]="row.difference.estimate"
                  [low]="row.difference.low"
                  [high]="row.difference.high"
                  [digits]="differenceDigits()"
                  [hasPlus]="true"
                  [figure]="'difference.' + row.last.year"
                  (opened)="opened.emit({ plan: row.plan, year: row.last, kind: 'difference' })"
                />
              </td>
              <td>
                <input
                  type="checkbox"
                  [checked]="drawn().includes(row.scenario.id)"
                  [disabled]="isFull() && !drawn().includes(row.scenario.id)"
                  [attr.aria-label]="'Draw ' + row.scenario.name + ' in the chart'"
                  (change)="drawnToggled.emit(row.scenario.id)"
                />
              </td>
              @if (mayChange()) {
                <td class="actions">
                  <button
                    type="button"
                    class="kv-link"
                    [attr.aria-label]="'Copy ' + row.scenario.name"
                    (click)="copyWanted.emit(row.scenario)"
                  >
                    Copy
                  </button>
                  <button
                    type="button"
                    class="kv-link"
                    [attr.aria-label]="'Delete ' + row.scenario.name"
                    (click)="removalWanted.emit(row.scenario)"
                  >
                    Delete
                  </button>
                </td>
              }
            </tr>
          }
        </tbody>
      </table>
    </div>
  `,
  styles: `
    :host {
      display: block;
      min-inline-size: 0;
    }
    .actions {
      white-space: nowrap;
    }
    .actions button + button {
      margin-inline-start: 12px;
    }
    input {
      inline-size: 24px;
      block-size: 24px;
      margin: -4px 0;
      vertical-align: middle;
      accent-color: var(--kv-plum);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScenarioList {
  readonly #numbers = inject(NumberFormat);

  readonly scenarios = input.required<readonly ScenarioReply[]>();
  readonly caption = input.required<string>();
  readonly form = input<PredictionBasis['form']>();
  /** Ids of those that the chart shows. */
  readonly drawn = input.required<readonly string[]>();
  /** Whether the chart has room for no more. */
  readonly isFull = input(false);
  readonly mayChange = input(false);
  readonly opened = output<PlannedFigureWanted>();
  readonly drawnToggled = output<string>();
  readonly copyWanted = output<ScenarioReply>();
  readonly removalWanted = output<ScenarioReply>();

  protected readonly expectedName = computed(() => expectedName(this.form()));
  protected readonly differenceKind = computed(() => differenceKind(this.form()));
  protected readonly rows = computed(() =>
    this.scenarios().map((scenario) => {
      const plan = storedFigures(scenario);
      const last = plan.years[plan.years.length - 1];
      return { scenario, plan, last, difference: asDifference(last.difference, this.form()) };
    }),
  );
  protected readonly expectedDigits = computed(() =>
    this.#numbers.columnDigits(this.rows().map(({ last }) => last.expected.estimate)),
  );
  protected readonly differenceDigits = computed(() =>
    this.#numbers.columnDigits(
      this.rows().map(({ difference }) => difference.estimate),
      this.differenceKind(),
    ),
  );
}
