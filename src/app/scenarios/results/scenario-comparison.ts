import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import type { IntervalRow } from '@figures';
import type { PredictionBasis } from '@prediction';
import { IntervalRows } from '../../charts/interval-rows/interval-rows';
import { Figure } from '../../ui/figure';
import { asDifference, differenceKind, differenceUnit } from '../../ui/model-form';
import { NumberFormat } from '../../ui/number-format';
import { confidenceText, listed, sentence } from '../../ui/phrases';
import { capitalised } from '../../ui/plan/plan-words';
import { tQuantile } from '../../ui/plan/t-quantile';
import { startWords, yearEffectWords } from '../text-differences';
import { ChosenYear } from './chosen-year';
import {
  type ComparedPlan,
  type ReadCompared,
  comparedDifferences,
  readCompared,
} from './compared-plans';
import { differenceWords, expectedWords, familiarRemark } from './result-words';
import { YearChoice } from './year-choice';

/** Scenarios of one fit side by side: expected values by year, and each less one of them with its own interval. */
@Component({
  selector: 'kv-scenario-comparison',
  imports: [Figure, IntervalRows, YearChoice],
  templateUrl: './scenario-comparison.html',
  styleUrls: ['../fields.css', './results.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScenarioComparison {
  readonly #numbers = inject(NumberFormat);

  /** As the fit has it; each scenario is read at the confidence of its own outlook. */
  readonly basis = input.required<PredictionBasis>();
  /** Two to four. */
  readonly plans = input.required<readonly ComparedPlan[]>();
  readonly source = input.required<string>();

  readonly #to = signal(0);
  readonly #read = computed(() => readCompared(this.basis(), this.plans(), tQuantile));
  protected readonly to = computed(() => Math.min(this.#to(), this.plans().length - 1));
  protected readonly columns = computed(() =>
    this.#read().map(({ name, outlook, refused }) => ({
      name,
      outlook: this.#outlookOf({ outlook }),
      refused: refused.map(({ reason }) => sentence(reason)),
    })),
  );
  protected readonly years = computed(() => {
    const all = this.#read().flatMap(({ years }) => years.map(({ year }) => year));
    return [...new Set(all)].sort((a, b) => a - b);
  });
  protected readonly rows = computed(() =>
    this.years().map((year) => ({
      year,
      cells: this.#read().map((plan) => plan.years.find((read) => read.year === year) ?? null),
    })),
  );
  protected readonly digits = computed(() =>
    this.#numbers.columnDigits(
      this.#read().flatMap(({ years }) => years.map(({ expected }) => expected.estimate)),
    ),
  );
  /** `Build-out: FY2028 outside the familiar range`. */
  protected readonly remarks = computed(() =>
    this.#read().flatMap(({ name, years }) =>
      (['edge', 'outside'] as const).flatMap((kind) => {
        const there = years.filter(({ familiar }) => familiar.kind === kind);
        return there.length === 0
          ? []
          : [`${name}: ${listed(there.map(({ year }) => `FY${year}`))} ${familiarRemark(kind)}.`];
      }),
    ),
  );
  readonly #reference = computed((): ReadCompared | undefined => this.#read().at(this.to()));
  readonly #differences = computed(() => {
    const to = this.#reference();
    return to === undefined ? [] : comparedDifferences(this.basis(), this.#read(), to, tQuantile);
  });
  protected readonly chosen = new ChosenYear(
    computed(() => [...new Set(this.#differences().map(({ year }) => year))]),
    () => Math.max(...this.#differences().map(({ year }) => year)),
  );
  protected readonly kind = computed(() => differenceKind(this.basis().form));
  protected readonly differences = computed(() => {
    const [to, year, { form }] = [this.#reference(), this.chosen.year(), this.basis()];
    const found = this.#differences().filter((difference) => difference.year === year);
    if (to === undefined || year === null || found.length === 0) return null;
    const rows = found.map(({ plan, difference }): IntervalRow => ({
      name: `${plan.name} less ${to.name}`,
      figure: asDifference(difference, form),
    }));
    const [first] = found;
    const unit = differenceUnit(form, this.#numbers);
    return {
      year,
      rows,
      text: {
        title: `FY${year}, ${first.plan.name} less ${to.name}: ${differenceWords(first.difference, form, this.#numbers)}`,
        caption: `${unit} · ${confidenceText(to.outlook.confidence)} intervals of the differences`,
        source: this.source(),
      },
      whose: whoseWords(found.map(({ plan, difference }) => ({ ...difference, name: plan.name }))),
    };
  });

  protected compareTo(place: number): void {
    this.#to.set(place);
  }

  #outlookOf({ outlook }: Pick<ReadCompared, 'outlook'>): string {
    const { form, yearEffects } = this.basis();
    return [
      capitalised(expectedWords(form, outlook)),
      startWords[outlook.start],
      ...(yearEffects == null ? [] : [`year effect ${yearEffectWords(outlook.yearEffect)}`]),
      confidenceText(outlook.confidence),
    ].join(' · ');
  }
}

/** What the interval of a difference leaves out, and where it cannot. */
function whoseWords(
  differences: readonly { readonly name: string; readonly kind: 'slopes' | 'calibrated' }[],
): string {
  const wider = differences.filter(({ kind }) => kind === 'calibrated').map(({ name }) => name);
  const narrow =
    'A difference of two scenarios has a narrower interval than either: intercept and noise cancel.';
  if (wider.length === 0) return narrow;
  const others = `${listed(wider)} ${wider.length === 1 ? 'starts' : 'start'} elsewhere or ${wider.length === 1 ? 'has' : 'have'} another year effect: there not all of it cancels.`;
  return wider.length === differences.length ? others : `${narrow} ${others}`;
}
