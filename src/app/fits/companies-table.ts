import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import type { FitResult } from '@contract';
import { Figure } from '../ui/figure';
import { asDifference, differenceKind, levelKind, logUnit } from '../ui/model-form';
import { NumberFormat } from '../ui/number-format';

import { regressorsText } from './fit-words';
import { shownText } from './standing-words';
import { confidenceText } from '../ui/phrases';

/** Every company's level with its interval, and the own company's difference to it. */
@Component({
  selector: 'kv-companies-table',
  imports: [Figure],
  templateUrl: './companies-table.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CompaniesTable {
  readonly #numbers = inject(NumberFormat);

  readonly result = input.required<FitResult>();
  readonly ownCompany = input.required<string>();
  /** Key of the figure whose lineage is wanted. */
  readonly opened = output<string>();

  readonly #form = computed(() => this.result().specification.form);
  protected readonly isLog = computed(() => this.#form() === 'log');
  protected readonly levelKind = computed(() => levelKind(this.#form()));
  protected readonly differenceKind = computed(() => differenceKind(this.#form()));
  protected readonly units = computed(() =>
    this.isLog() ? `Levels in ${logUnit}, differences in percent` : this.#numbers.unitLabel(),
  );
  protected readonly outcome = computed(() =>
    this.isLog() ? 'the log of market value' : 'market value',
  );
  protected readonly confidence = computed(() =>
    confidenceText(this.result().specification.confidence),
  );
  protected readonly regressors = computed(() => {
    const { effects } = this.result().specification;
    const years = effects === 'company' ? '' : ' and year effects';
    return regressorsText(this.result()) + years;
  });
  readonly #pairs = computed(() =>
    (this.result().pairs ?? []).map((pair, index) => ({
      company: pair.company,
      shown: asDifference(pair, this.#form()),
      figure: `pair.${index}`,
      words: shownText(pair.shown),
    })),
  );
  protected readonly digits = computed(() => ({
    intercepts: this.#numbers.columnDigits(
      this.result().intercepts.map(({ estimate }) => estimate),
      this.levelKind(),
    ),
    pairs: this.#numbers.columnDigits(
      this.#pairs().map(({ shown }) => shown.estimate),
      this.differenceKind(),
    ),
  }));
  /** Highest first, as in the chart. */
  protected readonly rows = computed(() => {
    const digits = this.digits();
    const pairOf = new Map(
      this.#pairs().map((pair) => [
        pair.company,
        {
          ...pair,
          bounds: this.#numbers.bounds(pair.shown, this.differenceKind(), digits.pairs),
        },
      ]),
    );
    return this.result()
      .intercepts.map((intercept, index) => ({
        ...intercept,
        bounds: this.#numbers.bounds(intercept, this.levelKind(), digits.intercepts),
        figure: `intercept.${index}`,
        isOwn: intercept.company === this.ownCompany(),
        pair: pairOf.get(intercept.company),
      }))
      .sort((a, b) => b.estimate - a.estimate);
  });
}
