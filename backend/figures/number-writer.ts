import {
  type MoneyUnit,
  type NegativeStyle,
  boundsText,
  columnDigits,
  columnText,
  digitsFor,
  fixedText,
  fullText,
  intervalDigits,
  intervalText,
  missingText,
  tickDigits,
  unitRatio,
  unitText,
} from './number-text';
import type { FigureFormats } from './figure-types';

/**
 * `money` is in the panel's unit and follows the unit switch; `plain` is a ratio, a slope or a statistic and does
 * not; `percent` is a share, 0.62 for 62 %; `count` is a whole number.
 */
export type FigureKind = 'money' | 'plain' | 'percent' | 'count';

/** An estimate with its bounds; `unbounded` says which of them do not exist because nothing there is ruled out. */
export interface IntervalValue {
  readonly estimate: number;
  readonly low: number | null;
  readonly high: number | null;
  readonly unbounded?: 'low' | 'high' | 'both';
}

/** Significant digits by place. */
export const headlineDigits = 3;
export const tableDigits = 4;

export interface NumberSettings {
  /** ISO 4217 code of the panel; empty where no money is shown. */
  readonly currency: string;
  /** The unit of the panel's numbers. */
  readonly panelUnit: MoneyUnit;
  /** The unit in which money is shown. */
  readonly unit: MoneyUnit;
  readonly negatives: NegativeStyle;
  readonly locale: string;
}

/** How numbers are written, on screen and on paper: unit, sign, digits. Years are written as they are, not through here. */
export class NumberWriter {
  /** What a number of the panel is multiplied by to be shown. */
  readonly factor: number;
  /** Stands once in a header: `EUR m`. */
  readonly unitLabel: string;

  constructor(readonly settings: NumberSettings) {
    this.factor = unitRatio(settings.panelUnit, settings.unit);
    this.unitLabel = unitText(settings.currency, settings.unit);
  }

  /** The number as it is shown before rounding: money in the shown unit, a percentage times 100. */
  shown(value: number, kind: FigureKind = 'money'): number {
    if (kind === 'money') return value * this.factor;
    return kind === 'percent' ? value * 100 : value;
  }

  /** Back from what a person typed in the shown unit to the panel's unit. */
  toPanelUnit(shown: number): number {
    return shown / this.factor;
  }

  /** Digits after the point that align a column of figures of one kind. */
  columnDigits(values: readonly (number | null)[], kind: FigureKind = 'money'): number {
    if (kind === 'count') return 0;
    if (kind === 'percent') return 1;
    return columnDigits(
      values.map((value) => (value === null ? null : this.shown(value, kind))),
      tableDigits,
    );
  }

  /** A figure of a table: 4 significant digits, or `digits` after the point to align a column. */
  figure(value: number | null | undefined, kind: FigureKind = 'money', digits?: number): string {
    if (value === null || value === undefined || !Number.isFinite(value)) return missingText;
    const shown = this.shown(value, kind);
    const text = columnText(
      shown,
      digits ?? this.#digits(shown, kind, tableDigits),
      this.settings.negatives,
      this.settings.locale,
    );
    return kind === 'percent' && shown !== 0 ? `${text} %` : text;
  }

  /** A figure of a sentence or a headline: 3 significant digits, minus sign, zero as 0. */
  headline(value: number, kind: FigureKind = 'money', significant = headlineDigits): string {
    const shown = this.shown(value, kind);
    const text = fixedText(shown, this.#digits(shown, kind, significant), this.settings.locale);
    return kind === 'percent' ? `${text} %` : text;
  }

  /**
   * `2,410 (1,280 to 3,540)`: an estimate with its interval, 3 significant digits in headlines, 4 in tables; a share is
   * `34.2 % (12.1 to 60.4 %)`.
   */
  interval(value: IntervalValue, kind: FigureKind = 'money', significant = tableDigits): string {
    const [estimate, low, high] = this.#shownInterval(value, kind);
    const digits = intervalDigits(estimate, low, high, significant);
    if (kind !== 'percent' && value.unbounded === undefined)
      return intervalText(estimate, low, high, digits, this.settings.locale);
    const shownDigits = kind === 'percent' ? Math.min(1, digits) : digits;
    const text = fixedText(estimate, shownDigits, this.settings.locale);
    const bounds = this.bounds(value, kind, shownDigits);
    return `${kind === 'percent' ? `${text} %` : text} (${bounds})`;
  }

  /** `1,275 to 3,539`, with the digits of its estimate; `no interval` where there is none, `1,275 and up` with no upper end. */
  bounds(value: IntervalValue, kind: FigureKind = 'money', digits?: number): string {
    const [estimate, low, high] = this.#shownInterval(value, kind);
    const shownDigits =
      digits ?? (kind === 'percent' ? 1 : intervalDigits(estimate, low, high, tableDigits));
    const mark = kind === 'percent' ? ' %' : '';
    const end = (bound: number) => fixedText(bound, shownDigits, this.settings.locale) + mark;
    if (low !== null && value.unbounded === 'high') return `${end(low)} and up`;
    if (high !== null && value.unbounded === 'low') return `${end(high)} and down`;
    if (low === null || high === null) return 'no interval';
    return boundsText(low, high, shownDigits, this.settings.locale) + mark;
  }

  /** Every digit, for the lineage drawer and copies. */
  full(value: number | null, kind: FigureKind = 'money'): string {
    return fullText(value === null ? null : this.shown(value, kind), this.settings.locale);
  }

  #shownInterval(value: IntervalValue, kind: FigureKind): [number, number | null, number | null] {
    const { estimate, low, high } = value;
    return [
      this.shown(estimate, kind),
      low === null ? null : this.shown(low, kind),
      high === null ? null : this.shown(high, kind),
    ];
  }

  #digits(shown: number, kind: FigureKind, significant: number): number {
    if (kind === 'count') return 0;
    if (kind === 'percent') return 1;
    const digits = digitsFor(shown, significant);
    // In tables no whole number is rounded away: 12,345 stays 12,345.
    return significant >= tableDigits ? Math.max(0, digits) : digits;
  }
}

/** How a figure writes its numbers, aligned on the digits that `values` need together. */
export function figureFormats(
  numbers: NumberWriter,
  kind: FigureKind,
  values: readonly (number | null)[],
): FigureFormats {
  const digits = numbers.columnDigits(values, kind);
  return {
    value: (value) => numbers.figure(value, kind, digits),
    bounds: (interval) => numbers.bounds(interval, kind, digits),
    tick: (value, step) =>
      fixedText(
        numbers.shown(value, kind),
        tickDigits(numbers.shown(step, kind)),
        numbers.settings.locale,
      ),
  };
}
