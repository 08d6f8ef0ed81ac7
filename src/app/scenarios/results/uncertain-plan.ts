import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { type Fan, type MarketFan, fanPercents } from '@prediction';
import { debounceTime, of, switchMap } from 'rxjs';
import { PlanFan } from '../../charts/plan-fan/plan-fan';
import { NumberFormat } from '../../ui/number-format';
import { sentence } from '../../ui/phrases';
import { PlanResults } from './plan-results';
import { expectedWords } from './result-words';
import { UncertainDrawer } from './uncertain-drawer';
import {
  type UncertainQuestion,
  isSameQuestion,
  uncertainRequest,
  usualDraws,
} from './uncertain-request';

/** A drag of a slider is over after so long. */
const settledMs = 150;

/** Where the expected value and the market value of a plan may lie whose amounts have a low and a high. */
@Component({
  selector: 'kv-uncertain-plan',
  imports: [PlanFan],
  templateUrl: './uncertain-plan.html',
  styleUrl: './results.css',
  providers: [UncertainDrawer],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UncertainPlan {
  readonly #drawer = inject(UncertainDrawer);
  readonly #numbers = inject(NumberFormat);
  readonly #results = inject(PlanResults);

  protected readonly percents = fanPercents;
  readonly #question = computed(
    (): UncertainQuestion | null => {
      const shown = this.#results.shown();
      if (shown === null) return null;
      const { basis, plan, uncertainty, outlook } = shown;
      const request = uncertainRequest(plan, uncertainty, outlook);
      return request === null ? null : { basis, request };
    },
    { equal: isSameQuestion },
  );
  readonly #answer = toSignal(
    toObservable(this.#question).pipe(
      debounceTime(settledMs),
      switchMap((question) => (question === null ? of(null) : this.#drawer.draw(question))),
    ),
    { initialValue: null },
  );
  protected readonly isUncertain = computed(() => this.#question() !== null);
  protected readonly isDrawing = computed(
    () => this.#question() !== null && this.#answer()?.question !== this.#question(),
  );
  protected readonly drawn = computed(() => {
    const answer = this.#answer();
    if (answer === null) return null;
    const { basis, request } = answer.question;
    const { seed, draws = usualDraws, start = 'model-level' } = request;
    const read = answer.years.flatMap((year) => (year.expected === null ? [] : [year]));
    const refused = answer.years.flatMap((year) => (year.expected === null ? [year] : []));
    const [first, last] = [read.at(0), read.at(-1)];
    const how = `${draws.toLocaleString('en')} draws, seed ${seed}`;
    const source = `${this.#results.source()} · ${how}`;
    const span = first === undefined || last === undefined ? '' : spanText(first.year, last.year);
    const markets = read.map(({ year, market }) => ({ year, ...market }));
    return {
      how,
      last: { year: basis.last.year, actual: basis.last.actual },
      expected: read.map(({ year, expected }) => ({ year, percentiles: expected.percentiles })),
      market: markets.flatMap((year) =>
        isFan(year) ? [{ year: year.year, percentiles: year.percentiles }] : [],
      ),
      refused: reasonsOf([
        ...(answer.failure === undefined ? [] : [`The plan could not be drawn: ${answer.failure}`]),
        ...refused.map(({ reason }) => reason),
        ...markets.flatMap((year) => (isFan(year) ? [] : [`No market value: ${year.reason}`])),
      ]),
      expectedText: {
        title: `The ${expectedWords(basis.form, { start })} of ${span} through the plan’s ranges alone`,
        caption: `${this.#numbers.unitLabel()} · level, slopes and year effect as estimated · ${how}`,
        source,
      },
      marketText: {
        title: `The market value of ${span} with everything that is uncertain`,
        caption: `${this.#numbers.unitLabel()} · ranges of the plan, error of the estimates and the market value’s own · ${how}`,
        source,
      },
    };
  });
}

function isFan<T extends MarketFan>(fan: T): fan is T & Fan {
  return fan.percentiles !== null;
}

function spanText(first: number, last: number): string {
  return first === last ? `FY${first}` : `FY${first} to FY${last}`;
}

function reasonsOf(reasons: readonly string[]): readonly string[] {
  return [...new Set(reasons.map(sentence))];
}
