import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import type { ExpectedPathChoice, ExpectedPathData } from '@figures';
import type { OwnYear } from '@prediction';
import { ExpectedPath } from '../../charts/expected-path/expected-path';
import { type DrawnPlan, expectedPathData } from '../../ui/plan/plan-data';
import { PlanResults } from './plan-results';
import { bandName, expectedWords, noBandWords } from './result-words';

/** The expected value of the plan on the page with its interval and the band of the market value, after what happened. */
@Component({
  selector: 'kv-plan-path',
  imports: [ExpectedPath],
  template: `
    @if (path(); as data) {
      <kv-expected-path
        [text]="text()"
        [ownYears]="data.ownYears"
        [base]="data.base"
        [plans]="data.plans"
        [bandName]="bandName()"
        [note]="noBand()"
        (yearSelected)="yearSelected.emit($event)"
      >
        <div chartHeading>
          <h2>Expected value and market value</h2>
          <p class="kv-caption">{{ text().caption }}</p>
        </div>
      </kv-expected-path>
      @if (noBand() !== '') {
        <p class="kv-caption">{{ noBand() }}</p>
      }
    }
  `,
  styles: ':host { display: block; min-inline-size: 0; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanPath {
  readonly #results = inject(PlanResults);

  /** The finding in words. */
  readonly finding = input.required<string>();
  readonly ownYears = input.required<readonly OwnYear[]>();
  /** The one on the page first. */
  readonly plans = input.required<readonly DrawnPlan[]>();
  readonly yearSelected = output<ExpectedPathChoice>();

  protected readonly path = computed((): ExpectedPathData | null => {
    const shown = this.#results.shown();
    return shown === null
      ? null
      : expectedPathData(this.ownYears(), shown.reading.bases, this.plans());
  });
  protected readonly bandName = computed(() => {
    const shown = this.#results.shown();
    return shown === null ? '' : bandName(shown.outlook);
  });
  protected readonly noBand = computed(() => {
    const shown = this.#results.shown();
    return shown === null ? '' : noBandWords(shown.reading.years, shown.outlook);
  });
  protected readonly text = computed(() => {
    const shown = this.#results.shown();
    const words =
      shown === null ? 'expected value' : expectedWords(shown.basis.form, shown.outlook);
    return {
      title: this.finding(),
      caption: `Market value, ${this.#results.caption()} of the ${words}, ${this.bandName()} (dotted edge)`,
      source: this.#results.source(),
    };
  });
}
