import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { readNumber } from '../../ui/number-entry';
import { isUncertain, usualSeed } from '../../ui/plan/change-asked';
import { capitalised } from '../../ui/plan/plan-words';
import { regressorKind } from '../../ui/plan/regressor-labels';
import { PlanDesk } from '../plan-desk';
import { ScenarioStore } from '../scenario-store';

interface RangeCell {
  readonly year: number;
  readonly regressor: number;
  readonly name: string;
  readonly kind: FigureKind;
  readonly likely: number;
  readonly low: number | null;
  readonly high: number | null;
}

/** Low and high of planned amounts; the amount itself is the likely one, and without the two it is certain. */
@Component({
  selector: 'kv-range-entry',
  templateUrl: './range-entry.html',
  styleUrls: ['../fields.css', './range-entry.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RangeEntry {
  readonly #store = inject(ScenarioStore);
  protected readonly desk = inject(PlanDesk);
  protected readonly numbers = inject(NumberFormat);

  protected readonly complaint = signal('');
  protected readonly hasRanges = computed(() => isUncertain(this.#store.text()));
  protected readonly seed = computed(() => this.#store.text().uncertainty?.seed ?? usualSeed);
  protected readonly cells = computed(() => {
    const { plan, uncertainty } = this.#store.text();
    const labels = this.#store.ground()?.labels ?? [];
    return plan.flatMap(({ year, values }, index) =>
      labels.map((label, regressor): RangeCell => {
        const range = uncertainty?.ranges[index][regressor] ?? null;
        return {
          year,
          regressor,
          name: `${capitalised(label)} FY${year}`,
          kind: regressorKind(regressor),
          likely: values[regressor],
          low: range?.low ?? null,
          high: range?.high ?? null,
        };
      }),
    );
  });

  protected text(value: number | null, kind: FigureKind): string {
    return value === null ? '' : String(Number(this.numbers.shown(value, kind).toPrecision(15)));
  }

  /** Takes what stands in both boxes; one that is empty is the amount itself, both empty make it certain. */
  protected take(cell: RangeCell, lowText: string, highText: string): void {
    const [low, high] = [lowText, highText].map((text) => this.#read(text, cell));
    if (low === undefined || high === undefined) {
      this.complaint.set(`${cell.name}: expected a low and a high amount, or nothing.`);
      return;
    }
    if (low > cell.likely || high < cell.likely) {
      const likely = this.numbers.full(cell.likely, cell.kind);
      this.complaint.set(`${cell.name}: expected low and high around the planned ${likely}.`);
      return;
    }
    if (this.#isLog() && !(low > 0)) {
      this.complaint.set(`${cell.name}: expected amounts above zero, for the fit reads logs.`);
      return;
    }
    this.complaint.set('');
    const isCertain = low === high;
    this.desk.setRange(cell.year, cell.regressor, isCertain ? null : { low, high });
  }

  protected setSeed(text: string): void {
    const seed = readNumber(text);
    if (seed === undefined || !Number.isSafeInteger(seed) || seed < 0) {
      this.complaint.set(`Seed: expected a whole number, 0 or more; found ${text || 'nothing'}.`);
      return;
    }
    this.complaint.set('');
    this.desk.setSeed(seed);
  }

  #read(text: string, { kind, likely }: RangeCell): number | undefined {
    if (text.trim() === '') return likely;
    const shown = readNumber(text);
    if (shown === undefined) return undefined;
    return kind === 'money' ? this.numbers.toPanelUnit(shown) : shown;
  }

  #isLog(): boolean {
    return this.#store.ground()?.basis.form === 'log';
  }
}
