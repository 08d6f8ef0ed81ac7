import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import type { FitResult } from '@contract';
import { Figure } from '../ui/figure';
import { NumberFormat } from '../ui/number-format';
import { covarianceName } from '../ui/covariance-words';
import { pText, readRegressor, regressorWord } from './fit-words';
import { confidenceText } from '../ui/phrases';

/** The slopes as a table: estimate, interval, standard error, t with its degrees of freedom, p. */
@Component({
  selector: 'kv-slopes-table',
  imports: [Figure],
  template: `
    <div class="kv-table-scroll" tabindex="0" role="region" aria-label="Slopes, table">
      <table class="kv-table">
        <caption>
          {{
            reading()
          }}; intervals at
          {{
            confidence()
          }},
          {{
            covariance()
          }}
        </caption>
        <thead>
          <tr>
            <th scope="col">Of</th>
            <th scope="col" class="kv-number">Slope</th>
            <th scope="col" class="kv-number">Interval</th>
            <th scope="col" class="kv-number">Standard error</th>
            <th scope="col" class="kv-number">t</th>
            <th scope="col" class="kv-number">Degrees of freedom</th>
            <th scope="col" class="kv-number">p</th>
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.figure) {
            <tr>
              <th scope="row">
                {{ row.word }}
                @if (row.header) {
                  <span class="kv-caption">{{ row.header }}</span>
                }
              </th>
              <td class="kv-number">
                <kv-figure
                  kind="plain"
                  [value]="row.estimate"
                  [figure]="row.figure"
                  (opened)="opened.emit($event)"
                />
              </td>
              <td class="kv-number">{{ row.bounds }}</td>
              <td class="kv-number">{{ row.error }}</td>
              <td class="kv-number">{{ row.t }}</td>
              <td class="kv-number">{{ row.degrees }}</td>
              <td class="kv-number">{{ row.p }}</td>
            </tr>
          }
        </tbody>
      </table>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SlopesTable {
  readonly #numbers = inject(NumberFormat);

  readonly result = input.required<FitResult>();
  /** Key of the figure whose lineage is wanted. */
  readonly opened = output<string>();

  protected readonly confidence = computed(() =>
    confidenceText(this.result().specification.confidence),
  );
  protected readonly reading = computed(() =>
    this.result().specification.form === 'log'
      ? 'Percent of market value that go with 1 % more of each'
      : 'Market value that goes with 1 more of each',
  );
  protected readonly covariance = computed(() => {
    const name = covarianceName(this.result().specification.slopes);
    return name.charAt(0).toLowerCase() + name.slice(1);
  });
  protected readonly rows = computed(() =>
    this.result().slopes.map((slope, index) => ({
      word: readRegressor(slope.name, index, this.result().specification.lag),
      header: regressorWord(slope.name, index) === slope.name ? '' : slope.name,
      estimate: slope.estimate,
      figure: `slope.${index}`,
      bounds: this.#numbers.bounds(slope, 'plain'),
      error: this.#numbers.figure(slope.standardError, 'plain'),
      t: this.#numbers.figure(slope.statistic, 'plain'),
      degrees: slope.degreesOfFreedom === null ? 'n/a' : this.#degrees(slope.degreesOfFreedom),
      p: pText(slope.pValue).replace(/^p /, ''),
    })),
  );

  #degrees(value: number): string {
    return Number.isInteger(value) ? this.#numbers.headline(value, 'count') : value.toFixed(2);
  }
}
