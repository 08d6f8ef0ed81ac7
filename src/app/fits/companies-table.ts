import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import type { FitResult } from '@contract';
import { Figure } from '../ui/figure';
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

  protected readonly unit = this.#numbers.unitLabel;
  protected readonly confidence = computed(() =>
    confidenceText(this.result().specification.confidence),
  );
  protected readonly regressors = computed(() => regressorsText(this.result()));
  protected readonly digits = computed(() => {
    const { intercepts, pairs } = this.result();
    return {
      intercepts: this.#numbers.columnDigits(intercepts.map(({ estimate }) => estimate)),
      pairs: this.#numbers.columnDigits((pairs ?? []).map(({ estimate }) => estimate)),
    };
  });
  /** Highest first, as in the chart. */
  protected readonly rows = computed(() => {
    const { intercepts, pairs } = this.result();
    const pairOf = new Map(
      (pairs ?? []).map((pair, index) => [
        pair.company,
        { ...pair, figure: `pair.${index}`, words: shownText(pair.shown) },
      ]),
    );
    return intercepts
      .map((intercept, index) => ({
        ...intercept,
        figure: `intercept.${index}`,
        isOwn: intercept.company === this.ownCompany(),
        pair: pairOf.get(intercept.company),
      }))
      .sort((a, b) => b.estimate - a.estimate);
  });

  protected bounds(value: Parameters<NumberFormat['bounds']>[0], digits: number): string {
    return this.#numbers.bounds(value, 'money', digits);
  }
}
