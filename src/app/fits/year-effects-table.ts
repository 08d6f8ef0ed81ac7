import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { FitResult } from '@contract';
import { Figure } from '../ui/figure';
import { asDifference, differenceKind, differenceUnit } from '../ui/model-form';
import { NumberFormat } from '../ui/number-format';

/** What moved all companies alike, year by year; folded, for no standing holds it. */
@Component({
  selector: 'kv-year-effects-table',
  imports: [Figure],
  template: `
    <details>
      <summary>{{ summary() }}</summary>
      <div class="kv-table-scroll" tabindex="0" role="region" aria-label="Year effects, table">
        <table class="kv-table">
          <caption>
            {{
              caption()
            }}
          </caption>
          <thead>
            <tr>
              <th scope="col">Year</th>
              <th scope="col" class="kv-number">Year effect</th>
            </tr>
          </thead>
          <tbody>
            @for (row of rows(); track row.year) {
              <tr>
                <th scope="row">FY{{ row.year }}</th>
                <td class="kv-number">
                  <kv-figure
                    [kind]="kind()"
                    [value]="row.effect"
                    [digits]="digits()"
                    [hasPlus]="true"
                  />
                </td>
              </tr>
            }
          </tbody>
        </table>
      </div>
    </details>
  `,
  styles: `
    summary {
      min-block-size: 24px;
      cursor: pointer;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class YearEffectsTable {
  readonly #numbers = inject(NumberFormat);

  readonly years = input.required<NonNullable<FitResult['yearEffects']>>();
  readonly form = input.required<FitResult['specification']['form']>();

  protected readonly kind = computed(() => differenceKind(this.form()));
  protected readonly rows = computed(() =>
    this.years().map(({ year, estimate }) => ({
      year,
      effect: asDifference({ estimate, low: null, high: null }, this.form()).estimate,
    })),
  );
  protected readonly digits = computed(() =>
    this.#numbers.columnDigits(
      this.rows().map(({ effect }) => effect),
      this.kind(),
    ),
  );
  /** `From −120 in FY2009 to 340 in FY2021`. */
  protected readonly summary = computed(() => {
    const sorted = [...this.rows()].sort((a, b) => a.effect - b.effect);
    const [lowest, highest] = [sorted[0], sorted[sorted.length - 1]];
    const words = ({ year, effect }: (typeof sorted)[number]) =>
      `${this.#numbers.headline(effect, this.kind())} in FY${year}`;
    return `From ${words(lowest)} to ${words(highest)}, ${differenceUnit(this.form(), this.#numbers)}`;
  });
  protected readonly caption = computed(() => {
    const summed = this.form() === 'log' ? 'their logs' : 'they';
    const unit = differenceUnit(this.form(), this.#numbers);
    return `${unit}; what a year adds for all companies alike: ${summed} sum to zero over the years. Estimates alone: no interval is computed for a year effect by itself.`;
  });
}
