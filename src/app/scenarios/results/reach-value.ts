import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { type Reach, familiarRange, planRegressors, reachValue } from '@prediction';
import { Mark } from '../../ui/mark';
import { readNumber } from '../../ui/number-entry';
import { NumberFormat } from '../../ui/number-format';
import type { PlannedAmount } from '../../ui/plan/change-asked';
import { capitalised, familiarFinding, familiarReason } from '../../ui/plan/plan-words';
import { ChosenYear } from './chosen-year';
import { PlanResults } from './plan-results';
import { reachRangeWords, reachedWords } from './reach-words';
import { expectedWords } from './result-words';
import { YearChoice } from './year-choice';

/** What amount of one input in a year brings the expected value to a figure, the rest as planned. */
@Component({
  selector: 'kv-reach-value',
  imports: [Mark, MatButton, YearChoice],
  templateUrl: './reach-value.html',
  styleUrls: ['../fields.css', './results.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReachValue {
  readonly #results = inject(PlanResults);
  protected readonly numbers = inject(NumberFormat);

  /** The amount that reaches the value is to stand in the plan. */
  readonly amountWanted = output<PlannedAmount>();

  readonly #typed = signal<number | null>(null);
  protected readonly isUnreadable = signal(false);
  readonly #regressor = signal(0);
  protected readonly regressor = this.#regressor.asReadonly();
  /** What is told to those who cannot see it: the answer after a choice made here, not after every move of a slider. */
  protected readonly said = signal('');
  protected readonly labels = computed(() => this.#results.shown()?.labels.map(capitalised) ?? []);
  /** Years whose planned amounts the model reads, with what it reads. */
  readonly #readable = computed(() => {
    const shown = this.#results.shown();
    if (shown === null) return [];
    const asked = shown.plan.map(({ year, values }) => ({ year, regressors: values }));
    return planRegressors(shown.basis, asked).flatMap((read) =>
      read.regressors === null || read.of <= shown.basis.last.year ? [] : [read],
    );
  });
  protected readonly chosen = new ChosenYear(
    computed(() => this.#readable().map(({ year }) => year)),
    () => this.#readable().at(-1)?.year ?? null,
  );
  /** In the panel's unit; the last actual market value until one is typed. */
  readonly #target = computed(
    () => this.#typed() ?? this.#results.shown()?.basis.last.actual ?? null,
  );
  protected readonly targetText = computed(() => {
    const target = this.#target();
    return target === null ? '' : this.numbers.full(target);
  });
  protected readonly expectedName = computed(() => {
    const shown = this.#results.shown();
    return shown === null ? '' : capitalised(expectedWords(shown.basis.form, shown.outlook));
  });
  protected readonly answer = computed(() => {
    const [shown, target, regressor] = [this.#results.shown(), this.#target(), this.regressor()];
    const read = this.#readable().find(({ year }) => year === this.chosen.year());
    if (shown === null || read === undefined || target === null) return null;
    const { basis, labels, outlook } = shown;
    const { start, yearEffect, confidence } = outlook;
    const { year, of, regressors } = read;
    const reach = reachValue(basis, { target, regressor, regressors, year, start, yearEffect });
    const label = capitalised(labels[regressor]);
    const asked = { regressor, label, of, year, target, confidence };
    return {
      year,
      words: reachedWords(reach, asked, this.numbers),
      range: reachRangeWords(reach, asked, this.numbers),
      amount: reach.value === null ? null : { year: of, regressor, value: reach.value },
      cell: `${label} FY${of}`,
      isPlanned: shown.plan.some(
        (planned) => planned.year === of && planned.values[regressor] === reach.value,
      ),
      familiar: this.#familiarOf(reach, year, regressors.with(regressor, reach.value ?? NaN)),
    };
  });

  protected setRegressor(regressor: number): void {
    this.#regressor.set(regressor);
    this.#say();
  }

  protected setYear(year: number): void {
    this.chosen.choose(year);
    this.#say();
  }

  protected setTarget(text: string): void {
    const value = readNumber(text);
    this.isUnreadable.set(value === undefined);
    if (value === undefined) return;
    this.#typed.set(this.numbers.toPanelUnit(value));
    this.#say();
  }

  protected use(amount: PlannedAmount, cell: string): void {
    this.amountWanted.emit(amount);
    this.said.set(`${cell} is set in the plan.`);
  }

  #say(): void {
    const answer = this.answer();
    this.said.set(answer === null ? '' : `${answer.words} ${answer.range}`);
  }

  #familiarOf(reach: Reach, year: number, regressors: readonly number[]) {
    const shown = this.#results.shown();
    if (reach.value === null || shown === null) return null;
    const { basis, labels } = shown;
    const familiar = familiarRange(basis, regressors);
    return {
      kind: familiar.kind,
      finding: `With it, ${familiarFinding([year], familiar.kind)}.`,
      reason: familiarReason(basis, labels, familiar, this.numbers),
    };
  }
}
