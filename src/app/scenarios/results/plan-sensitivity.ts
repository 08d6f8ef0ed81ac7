import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { planRegressors } from '@prediction';
import { SensitivityBars } from '../../charts/sensitivity-bars/sensitivity-bars';
import { NumberFormat } from '../../ui/number-format';
import { sentence } from '../../ui/phrases';
import { decidingYear } from '../../ui/plan/plan-words';
import { tQuantile } from '../../ui/plan/t-quantile';
import { ChosenYear } from './chosen-year';
import { PlanResults } from './plan-results';
import { expectedWords } from './result-words';
import { sensitivityFinding, sensitivityRows } from './sensitivity-rows';
import { YearChoice } from './year-choice';

/** Which input moves a planned year's expected value most over what its peers have shown. */
@Component({
  selector: 'kv-plan-sensitivity',
  imports: [SensitivityBars, YearChoice],
  template: `
    <div class="title">
      <h2>Which input moves it most</h2>
      @if (chosen.year(); as year) {
        <kv-year-choice
          [years]="chosen.years()"
          [year]="year"
          (yearChosen)="chosen.choose($event)"
        />
      }
    </div>
    @if (found(); as found) {
      @if (found.rows !== null) {
        <kv-sensitivity-bars
          [text]="found.text"
          [rows]="found.rows"
          [planned]="found.planned"
          [endNames]="endNames"
        >
          <div chartHeading>
            <h3>{{ found.text.title }}</h3>
            <p class="kv-caption">{{ found.text.caption }}</p>
          </div>
        </kv-sensitivity-bars>
      } @else {
        <p>{{ found.reason }}</p>
      }
    }
  `,
  styleUrl: './results.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanSensitivity {
  readonly #numbers = inject(NumberFormat);
  readonly #results = inject(PlanResults);

  protected readonly endNames = ['peers’ 10th percentile', 'peers’ 90th percentile'] as const;
  readonly #years = computed(() => this.#results.shown()?.reading.years ?? []);
  protected readonly chosen = new ChosenYear(
    computed(() => this.#years().map(({ year }) => year)),
    () => decidingYear(this.#years())?.year ?? null,
  );
  protected readonly found = computed(() => {
    const shown = this.#results.shown();
    const read = this.#years().find(({ year }) => year === this.chosen.year());
    if (shown === null || read === undefined) return null;
    const { basis, labels, plan, outlook } = shown;
    const asked = plan.map(({ year, values }) => ({ year, regressors: values }));
    const readable = planRegressors(basis, asked).find(({ year }) => year === read.year);
    if (readable === undefined || readable.regressors === null) return null;
    const words = { labels, numbers: this.#numbers };
    const found = sensitivityRows(basis, readable, outlook, words, tQuantile);
    if (found.rows === null) return { rows: null, reason: sentence(found.reason) };
    const title = sensitivityFinding(found.rows, read.year, this.#numbers);
    const what = expectedWords(basis.form, outlook);
    return {
      rows: found.rows,
      planned: read.expected.estimate,
      text: {
        title,
        caption: `${this.#results.caption()} of the ${what} · hollow at the peers’ 10th percentile, filled at their 90th, the rest as planned`,
        source: this.#results.source(),
      },
    };
  });
}
