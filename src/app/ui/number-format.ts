import { Injectable, computed, inject, signal } from '@angular/core';
import {
  type FigureKind,
  type IntervalValue,
  type MoneyUnit,
  type NegativeStyle,
  NumberWriter,
} from '@figures';
import { PageContext } from './page-context';

export { type FigureKind, type IntervalValue, headlineDigits, tableDigits } from '@figures';

/**
 * How numbers are written, in one place: unit, sign, digits. All methods read signals, so that templates and
 * `computed`s follow the person's settings by themselves. Years are written as they are, not through here.
 */
@Injectable({ providedIn: 'root' })
export class NumberFormat {
  readonly #context = inject(PageContext);

  /** ISO 4217 code of the panel; empty where no money is shown. The page's context sets it. */
  readonly currency = this.#context.currency;
  /** The unit of the panel's numbers. The page's context sets it. */
  readonly panelUnit = this.#context.panelUnit;
  /** The unit in which the person wants to see money. Set by the shell from the preferences. */
  readonly unit = signal<MoneyUnit>('millions');
  readonly negatives = signal<NegativeStyle>('minus');
  readonly locale = signal('en');

  /** What writes with these settings. */
  readonly writer = computed(
    () =>
      new NumberWriter({
        currency: this.currency(),
        panelUnit: this.panelUnit(),
        unit: this.unit(),
        negatives: this.negatives(),
        locale: this.locale(),
      }),
  );
  /** What a number of the panel is multiplied by to be shown. */
  readonly factor = computed(() => this.writer().factor);
  /** Stands once in a header: `EUR m`. */
  readonly unitLabel = computed(() => this.writer().unitLabel);

  shown(value: number, kind?: FigureKind): number {
    return this.writer().shown(value, kind);
  }

  toPanelUnit(shown: number): number {
    return this.writer().toPanelUnit(shown);
  }

  columnDigits(values: readonly (number | null)[], kind?: FigureKind): number {
    return this.writer().columnDigits(values, kind);
  }

  figure(value: number | null | undefined, kind?: FigureKind, digits?: number): string {
    return this.writer().figure(value, kind, digits);
  }

  headline(value: number, kind?: FigureKind, significant?: number): string {
    return this.writer().headline(value, kind, significant);
  }

  interval(value: IntervalValue, kind?: FigureKind, significant?: number): string {
    return this.writer().interval(value, kind, significant);
  }

  bounds(value: IntervalValue, kind?: FigureKind, digits?: number): string {
    return this.writer().bounds(value, kind, digits);
  }

  full(value: number | null, kind?: FigureKind): string {
    return this.writer().full(value, kind);
  }
}
