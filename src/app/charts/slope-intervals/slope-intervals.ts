import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { intervalDigits, slopeIntervalsLayout } from '@figures';
import { type FigureKind, type IntervalValue, NumberFormat } from '../../ui/number-format';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartPoint, ChartPoints } from '../chart-points';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { exactFigure, exactHeader } from '../exact-figure';

type Slope = IntervalValue & { readonly name: string; readonly intervalReason?: string };

/** What one more of each regressor goes with, each with its interval and a mark at zero. */
@Component({
  selector: 'kv-slope-intervals',
  imports: [ChartFrame, ChartPicture, ChartPoint, ChartPoints],
  templateUrl: './slope-intervals.html',
  styleUrl: '../chart-marks.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SlopeIntervals {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  /** `name` as it is to be read: `1 more of capex`. */
  readonly slopes = input.required<readonly Slope[]>();
  /** A slope on a regressor in money is a plain ratio; on any other it is money. */
  readonly kind = input<FigureKind>('plain');

  protected readonly width = signal(330);
  protected readonly layout = computed(() =>
    slopeIntervalsLayout(this.slopes(), this.width(), (slope) => this.#format(slope)),
  );
  protected readonly labels = computed(() =>
    this.slopes().map((slope) => {
      const { value, bounds } = this.#format(slope);
      const reason = slope.intervalReason === undefined ? '' : `: ${slope.intervalReason}`;
      return `${slope.name}: ${value} (${bounds}${reason})`;
    }),
  );
  protected readonly summary = computed(() => `${this.labels().join('. ')}.`);

  protected readonly columns = computed((): ChartColumn[] => [
    { label: 'change', isNumber: false },
    ...['goes with', 'low', 'high'].map((label) => ({
      label,
      isNumber: true,
      headers: [exactHeader(label, this.#numbers, this.kind())],
    })),
  ]);
  protected readonly rows = computed((): ChartRow[] =>
    this.slopes().map((slope) => {
      const { unbounded } = slope;
      const digits = this.#digits(slope);
      const figure = (value: number | null) => this.#numbers.figure(value, this.kind(), digits);
      const exact = (value: number | null) => exactFigure(value, this.#numbers, this.kind());
      const row = <T>(written: (value: number | null) => T) => [
        slope.name,
        written(slope.estimate),
        unbounded === 'low' ? 'open' : written(slope.low),
        unbounded === 'high' ? 'open' : written(slope.high),
      ];
      return { cells: row(figure), values: row(exact) };
    }),
  );

  /** Each slope by itself: an estimate and its bounds have the same digits, and lines are read one by one. */
  #digits({ estimate, low, high }: IntervalValue): number {
    const shown = (value: number | null) =>
      value === null ? null : this.#numbers.shown(value, this.kind());
    return Math.max(0, intervalDigits(shown(estimate) ?? 0, shown(low), shown(high), 3));
  }

  #format(slope: IntervalValue): { value: string; bounds: string } {
    const digits = this.#digits(slope);
    return {
      value: this.#numbers.figure(slope.estimate, this.kind(), digits),
      bounds: this.#numbers.bounds(slope, this.kind(), digits),
    };
  }
}
