import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { type FanData, type FanPoint, planFanLayout } from '@figures';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartPoint, ChartPoints } from '../chart-points';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { figureFormats, withUnit } from '../figure-formats';

/** Where the draws of an uncertain plan lie, year by year. */
@Component({
  selector: 'kv-plan-fan',
  imports: [ChartFrame, ChartPicture, ChartPoint, ChartPoints],
  templateUrl: './plan-fan.html',
  styleUrls: ['../chart-marks.css', './plan-fan.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanFan {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  readonly percents = input.required<FanData['percents']>();
  readonly years = input.required<FanData['years']>();
  readonly last = input<FanData['last']>(null);
  readonly kind = input<FigureKind>('money');

  protected readonly width = signal(560);
  readonly #formats = computed(() =>
    figureFormats(
      this.#numbers,
      this.kind(),
      this.years().flatMap(({ percentiles }) => percentiles),
    ),
  );
  protected readonly layout = computed(() =>
    planFanLayout(
      { percents: this.percents(), years: this.years(), last: this.last() },
      this.width(),
      this.#formats(),
    ),
  );

  protected readonly summary = computed(() => {
    const { points } = this.layout();
    return this.years()
      .flatMap(({ year }) => {
        const at = points.filter((point) => point.year === year);
        const [low, high] = [at.at(0), at.at(-1)];
        const median = at.find(({ percent }) => percent === 50);
        return low === undefined || high === undefined || median === undefined
          ? []
          : [
              `${year}: median ${median.value}, from ${low.value} (${low.percent} %) to ${high.value} (${high.percent} %).`,
            ];
      })
      .join(' ');
  });
  protected readonly columns = computed((): ChartColumn[] => [
    { label: withUnit('year', this.#numbers, this.kind()), isNumber: false },
    ...this.percents().map((percent) => ({ label: `${percent} %`, isNumber: true })),
  ]);
  protected readonly rows = computed((): ChartRow[] =>
    this.years().map(({ year, percentiles }) => ({
      cells: [
        String(year),
        ...percentiles.map((value) => (value === null ? 'n/a' : this.#formats().value(value))),
      ],
    })),
  );

  /** `2027, 90 % of the draws below 3,000`. */
  protected label({ year, percent, value }: FanPoint): string {
    return `${year}, ${percent} % of the draws below ${value}`;
  }
}
