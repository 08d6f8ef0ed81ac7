import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { DifferenceBars } from '../../charts/difference-bars/difference-bars';
import { levelKind, logUnit } from '../../ui/model-form';
import { NumberFormat } from '../../ui/number-format';
import { confidenceText } from '../../ui/phrases';
import { decidingYear } from '../../ui/plan/plan-words';
import { ChosenYear } from './chosen-year';
import { gapWords, partsFromLast, partsToBase } from './parts-data';
import { PlanResults } from './plan-results';
import { differenceWords } from './result-words';
import { YearChoice } from './year-choice';

/** What a planned year differs by from the base and from the last actual market value, as bars that add up. */
@Component({
  selector: 'kv-plan-parts',
  imports: [DifferenceBars, YearChoice],
  templateUrl: './plan-parts.html',
  styleUrl: './results.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanParts {
  readonly #numbers = inject(NumberFormat);
  readonly #results = inject(PlanResults);

  readonly #read = computed(() => this.#results.shown()?.reading.years ?? []);
  protected readonly chosen = new ChosenYear(
    computed(() => this.#read().map(({ year }) => year)),
    () => decidingYear(this.#read())?.year ?? null,
  );
  protected readonly parts = computed(() => {
    const shown = this.#results.shown();
    const year = this.#read().find((read) => read.year === this.chosen.year());
    if (shown === null || year === undefined) return null;
    const { basis, labels } = shown;
    const [toBase, fromLast] = [
      partsToBase(year, labels, basis),
      partsFromLast(year, labels, basis),
    ];
    const words = (value: typeof toBase.total) => differenceWords(value, basis.form, this.#numbers);
    const rest = { caption: this.#caption(), source: this.#results.source() };
    return {
      year: year.year,
      toBase,
      fromLast,
      toBaseText: {
        title: `FY${year.year} against the base: ${words(toBase.total)}`,
        ...rest,
      },
      fromLastText: {
        title: `FY${year.year} against FY${basis.last.year} as it was, ${this.#numbers.headline(basis.last.actual)}: ${words(fromLast.total)}`,
        ...rest,
      },
      gap: gapWords(year, basis, this.#numbers),
      kind: levelKind(basis.form),
      figureName: basis.form === 'log' ? `difference, ${logUnit}` : 'difference',
    };
  });
  // Shares do not add up, logs do.
  readonly #caption = computed(() => {
    const shown = this.#results.shown();
    return shown?.basis.form === 'log'
      ? `${logUnit}, whose parts add up: 0.1 is 10.5 % more · ${confidenceText(shown.outlook.confidence)} intervals`
      : this.#results.caption();
  });
}
