import { Injectable, computed, inject, signal } from '@angular/core';
import type { PlanOutlook, PlanRule } from '@contract';
import type { PredictionBasis } from '@prediction';
import { NumberFormat } from '../ui/number-format';
import { counted, listed } from '../ui/phrases';
import type { AskedPlan } from '../ui/plan/asked-plan';
import {
  type AskedChange,
  type PlannedAmount,
  heldAgain,
  withAmounts,
  withMove,
  withPlan,
  withRange,
  withRule,
  withYearMore,
  withoutMove,
} from '../ui/plan/change-asked';
import { type BadCell, pastedAmounts } from '../ui/plan/paste-amounts';
import { capitalised } from '../ui/plan/plan-words';
import type { PlannedYear, ReadYear } from '../ui/plan/read-plan';
import { regressorKind } from '../ui/plan/regressor-labels';
import { steppedInside } from '../ui/plan/slider-range';
import { UndoNotice } from '../ui/undo-notice';
import type { PastedText } from './grid/plan-grid';
import type { PlanStep } from './plan-history';
import { ScenarioEdits } from './scenario-edits';
import { ScenarioState } from './scenario-state';

/** Everything that changes the plan on the page by hand: one state for grid, sliders, rules and ranges. */
@Injectable()
export class PlanDesk {
  readonly #edits = inject(ScenarioEdits);
  readonly #numbers = inject(NumberFormat);
  readonly #state = inject(ScenarioState);
  readonly #undo = inject(UndoNotice);
  readonly #refusal = signal('');
  readonly #pasted = signal<{ readonly bad: readonly BadCell[]; readonly words: string } | null>(
    null,
  );

  /** Why the last change was not made; empty where it was. */
  readonly refusal = this.#refusal.asReadonly();
  /** What the last paste came to, until the next change. */
  readonly pasted = this.#pasted.asReadonly();
  /** Regressors whose amounts a rule gives. */
  readonly ruled = computed(() =>
    this.#state.text().rules.flatMap(({ rule }, k) => (rule === null ? [] : [k])),
  );

  setAmount(amount: PlannedAmount): void {
    this.#change((basis, asked) => withAmounts(basis, asked, [amount]), {
      words: this.#nameOf(amount.regressor, amount.year),
    });
  }

  /** The plan of the sliders; moves of one of them that follow each other are one step. */
  setPlan(plan: readonly PlannedYear[]): void {
    const { plan: before } = this.#state.text();
    const moved = plan.find(({ values }, index) =>
      values.some((value, k) => value !== before.at(index)?.values[k]),
    );
    const regressor = moved?.values.findIndex(
      (value, k) => value !== before.find(({ year }) => year === moved.year)?.values[k],
    );
    const isOne = plan.length === before.length && moved !== undefined && regressor !== undefined;
    const words = isOne ? this.#nameOf(regressor, moved.year) : 'the years of the plan';
    this.#change(
      (basis, asked) => withPlan(basis, asked, plan),
      isOne ? { words, key: words } : { words },
    );
  }

  resetToBase(): void {
    this.#change(heldAgain, { words: 'the reset to the base' });
  }

  paste({ text, at }: PastedText): void {
    const ground = this.#state.ground();
    if (ground === null) return;
    const { basis, labels } = ground;
    const pasted = pastedAmounts(text, at, {
      firstYear: basis.last.year + 1,
      regressors: labels.length,
      isAboveZero: basis.form === 'log',
      toPanel: (shown, k) =>
        regressorKind(k) === 'money' ? this.#numbers.toPanelUnit(shown) : shown,
    });
    const last = Math.max(0, ...pasted.amounts.map(({ year }) => year));
    const isMade =
      pasted.amounts.length === 0 ||
      this.#change(
        (ofBasis, asked) => {
          const longer = reaching(ofBasis, asked, last);
          return longer.kind === 'refused'
            ? longer
            : withAmounts(ofBasis, longer.asked, pasted.amounts);
        },
        { words: `${counted(pasted.amounts.length, 'cell')} pasted` },
      );
    if (isMade) this.#pasted.set({ bad: pasted.bad, words: pastedWords(pasted) });
  }

  setRule(regressor: number, rule: PlanRule | null): boolean {
    return this.#change((basis, asked) => withRule(basis, asked, regressor, rule), {
      words: `the rule of ${this.#labelOf(regressor)}`,
    });
  }

  setMove(regressor: number, year: number, amount: number): boolean {
    return this.#change((basis, asked) => withMove(basis, asked, regressor, { year, amount }), {
      words: `what moves ${this.#labelOf(regressor)}`,
    });
  }

  removeMove(regressor: number, year: number): void {
    this.#change((basis, asked) => withoutMove(basis, asked, regressor, year), {
      words: `what moves ${this.#labelOf(regressor)}`,
    });
  }

  setOutlook(outlook: PlanOutlook): void {
    this.#refusal.set('');
    this.#edits.change({ outlook }, { words: 'the outlook' });
  }

  setRange(year: number, regressor: number, range: { low: number; high: number } | null): void {
    const { uncertainty } = withRange(this.#state.text(), year, regressor, range);
    this.#edits.change(
      { uncertainty },
      { words: `low and high of ${this.#nameOf(regressor, year)}` },
    );
  }

  setSeed(seed: number): void {
    const { uncertainty } = this.#state.text();
    if (uncertainty === null) return;
    this.#edits.change(
      { uncertainty: { ...uncertainty, seed } },
      { words: 'the seed of the draws' },
    );
  }

  /** Every amount certain again. */
  dropRanges(): void {
    this.#edits.change({ uncertainty: null }, { words: 'low and high of all amounts' });
  }

  /** Years with the values that bring them inside. */
  takeInside(years: readonly PlannedYear[]): void {
    const amounts = years.flatMap(({ year, values }) =>
      values.map((value, regressor) => ({ year, regressor, value })),
    );
    this.#change((basis, asked) => withAmounts(basis, asked, amounts), {
      words: 'the nearest plan inside',
    });
  }

  /** Every year that is not inside, brought there where a plan can. */
  takeAllInside(read: readonly ReadYear[]): void {
    const basis = this.#state.ground()?.basis;
    if (basis === undefined) return;
    this.takeInside(
      read
        .filter(({ familiar, of }) => familiar.kind !== 'inside' && of > basis.last.year)
        .map(({ of, familiar }) => ({ year: of, values: steppedInside(basis, familiar, read) })),
    );
  }

  forgetPasted(): void {
    this.#pasted.set(null);
  }

  forgetRefusal(): void {
    this.#refusal.set('');
  }

  #change(
    make: (basis: PredictionBasis, asked: AskedPlan) => AskedChange,
    step: PlanStep,
  ): boolean {
    const ground = this.#state.ground();
    if (ground === null) return false;
    const before = this.#state.text();
    const change = make(ground.basis, before);
    this.#pasted.set(null);
    if (change.kind === 'refused') {
      this.#refusal.set(change.reason);
      return false;
    }
    this.#refusal.set('');
    this.#edits.change(change.asked, step);
    if (change.freed.length > 0) this.#sayFreed(change.freed, before);
    return true;
  }

  /** A rule that ended comes back by Undo, whatever was changed since. */
  #sayFreed(freed: readonly number[], before: AskedPlan): void {
    const names = listed(freed.map((k) => this.#labelOf(k)));
    const words =
      freed.length === 1
        ? `The rule of ${names} is dropped: an amount under it was changed.`
        : `The rules of ${names} are dropped: amounts under them were changed.`;
    void this.#undo.show(words, () => {
      for (const k of freed) this.setRule(k, before.rules[k].rule);
    });
  }

  #labelOf(regressor: number): string {
    return this.#state.ground()?.labels[regressor] ?? '';
  }

  #nameOf(regressor: number, year: number): string {
    return `${capitalised(this.#labelOf(regressor))} FY${year}`;
  }
}

/** With as many years as it takes to reach one. */
function reaching(basis: PredictionBasis, asked: AskedPlan, year: number): AskedChange {
  let change: AskedChange = { kind: 'changed', asked, freed: [] };
  while (change.kind === 'changed' && lastYear(change.asked) < year)
    change = withYearMore(basis, change.asked);
  return change;
}

function lastYear({ plan }: AskedPlan): number {
  return plan[plan.length - 1].year;
}

function pastedWords({
  amounts,
  bad,
  leftOut,
  isTurned,
}: ReturnType<typeof pastedAmounts>): string {
  return [
    `${counted(amounts.length, 'cell')} pasted${isTurned ? ', years read across' : ''}.`,
    ...(bad.length > 0 ? [`${counted(bad.length, 'cell')} kept as before.`] : []),
    ...(leftOut > 0 ? [`${counted(leftOut, 'cell')} left out: a plan has no room for them.`] : []),
  ].join(' ');
}
