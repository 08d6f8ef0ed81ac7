import {
  ChangeDetectionStrategy,
  Component,
  LOCALE_ID,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { type Observable, startWith, switchMap } from 'rxjs';
import { ExpectedPath } from '../../charts/expected-path/expected-path';
import { CautionLine } from '../../ui/caution-line';
import { EmptyState } from '../../ui/empty-state';
import { NumberFormat } from '../../ui/number-format';
import { PageContext } from '../../ui/page-context';
import { PageHeader } from '../../ui/page-header';
import { listed, shortHash } from '../../ui/phrases';
import { isSameOutlook } from '../../ui/plan/asked-plan';
import { expectedPathData } from '../../ui/plan/plan-data';
import { readPlan } from '../../ui/plan/read-plan';
import { tQuantile } from '../../ui/plan/t-quantile';
import { ProblemNotice } from '../../ui/problem-notice';
import { contextOf } from '../scenario-words';
import { CompareReader, type CompareView, idsIn } from './compare-reader';
import type { ComparedPlan } from './compared-plans';
import { bandName, noBandWords } from './result-words';
import { resultCaption, resultSource } from './plan-results';
import { ScenarioComparison } from './scenario-comparison';

/** How do our scenarios differ? The address names them, and nothing else. */
@Component({
  selector: 'kv-compare-page',
  imports: [
    CautionLine,
    EmptyState,
    ExpectedPath,
    MatButton,
    PageHeader,
    ProblemNotice,
    RouterLink,
    ScenarioComparison,
  ],
  templateUrl: './compare-page.html',
  styleUrl: './compare-page.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComparePage {
  readonly #context = inject(PageContext);
  readonly #locale = inject(LOCALE_ID);
  readonly #numbers = inject(NumberFormat);
  readonly #reader = inject(CompareReader);

  /** Ids of scenarios with commas between, from the query. */
  readonly of = input<string>();

  readonly #ids = computed(() => idsIn(this.of()));
  protected readonly view = toSignal(
    toObservable(this.#ids).pipe(
      switchMap((ids): Observable<CompareView> =>
        this.#reader.read(ids).pipe(startWith<CompareView>({ kind: 'loading' })),
      ),
    ),
    { initialValue: { kind: 'loading' } satisfies CompareView },
  );
  protected readonly compared = computed(() => {
    const view = this.view();
    const basis = view.kind === 'ready' ? (view.fit.result?.prediction ?? null) : null;
    if (view.kind !== 'ready' || basis === null) return null;
    const { scenarios, fit } = view;
    const [first] = scenarios;
    const { outlook } = first;
    const plans = scenarios.map(({ id, name, plan, outlook }): ComparedPlan => ({
      id,
      name,
      plan,
      outlook,
    }));
    const readings = plans.map((each) => readPlan(basis, each.plan, tQuantile, each.outlook));
    const hasOneOutlook = plans.every((each) => isSameOutlook(each.outlook, outlook));
    const caption = resultCaption(this.#numbers.unitLabel(), outlook);
    const source = hasOneOutlook
      ? resultSource(this.#numbers.unitLabel(), basis, { outlook, hash: fit.fit.hash })
      : `${this.#numbers.unitLabel()} · each in its own outlook, standing held fixed · fit ${shortHash(fit.fit.hash)}`;
    const names = listed(plans.map(({ name }) => name));
    return {
      basis,
      plans,
      source,
      finding: `${names} side by side`,
      path: expectedPathData(
        fit.result?.ownYears ?? [],
        readings[0].bases,
        plans.map(({ name }, index) => ({ name, years: readings[index].years })),
      ),
      bandName: bandName(outlook),
      noBand: noBandWords(readings[0].years, outlook),
      text: {
        title: `Expected values of ${names}`,
        caption: `${hasOneOutlook ? caption : this.#numbers.unitLabel()} · base, interval area and ${bandName(outlook)} as ${first.name} has them`,
        source,
      },
    };
  });

  constructor() {
    effect(() => {
      const view = this.view();
      if (view.kind !== 'ready') return;
      const { fit, desk } = view;
      untracked(() => this.#context.show(contextOf({ fit, desk, saved: null }, this.#locale)));
    });
  }
}
