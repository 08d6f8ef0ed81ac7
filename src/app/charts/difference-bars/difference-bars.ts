import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import {
  type DifferenceData,
  type IntervalFigure,
  differenceBarsLayout,
  sumsAsShown,
} from '@figures';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartPoint, ChartPoints } from '../chart-points';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { exactFigure, exactHeader } from '../exact-figure';
import { figureFormats, withUnit } from '../figure-formats';

const roundingNote = 'Figures are rounded one by one and may not sum to the total as shown.';

/** A difference taken apart: bars that add up to the total, and a note where their rounded figures do not. */
@Component({
  selector: 'kv-difference-bars',
  imports: [ChartFrame, ChartPicture, ChartPoint, ChartPoints],
  templateUrl: './difference-bars.html',
  styleUrls: ['../chart-marks.css', './difference-bars.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DifferenceBars {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  readonly terms = input.required<DifferenceData['terms']>();
  readonly total = input.required<IntervalFigure>();
  readonly kind = input<FigureKind>('money');
  /** The table's header over the figures. */
  readonly figureName = input('difference');

  protected readonly width = signal(560);
  readonly #formats = computed(() =>
    figureFormats(this.#numbers, this.kind(), [
      ...this.terms().map(({ estimate }) => estimate),
      this.total().estimate,
    ]),
  );
  protected readonly note = computed(() => {
    const parts = this.terms().map(({ estimate }) => estimate);
    const total = this.total().estimate;
    const digits = this.#numbers.columnDigits([...parts, total], this.kind());
    const shown = (value: number) => this.#numbers.shown(value, this.kind());
    return sumsAsShown(parts.map(shown), shown(total), digits) ? '' : roundingNote;
  });
  protected readonly layout = computed(() =>
    differenceBarsLayout(
      { terms: this.terms(), total: this.total() },
      this.width(),
      this.#formats(),
    ),
  );

  protected readonly summary = computed(() =>
    this.layout()
      .bars.map(({ name, value, bounds }) => `${name} ${value} (${bounds}).`)
      .join(' '),
  );
  protected readonly columns = computed((): ChartColumn[] => [
    { label: 'part', isNumber: false },
    {
      label: withUnit(this.figureName(), this.#numbers, this.kind()),
      isNumber: true,
      headers: [this.#header(this.figureName())],
    },
    { label: 'interval', isNumber: true, headers: [this.#header('low'), this.#header('high')] },
  ]);
  protected readonly rows = computed((): ChartRow[] => {
    const figures = [...this.terms(), this.total()];
    return this.layout().bars.map(({ name, value, bounds, isTotal }, place) => {
      const { estimate, low, high } = figures[place];
      return {
        cells: [name, value, bounds],
        values: [
          name,
          ...[estimate, low, high].map((each) => exactFigure(each, this.#numbers, this.kind())),
        ],
        isTotal,
      };
    });
  });

  #header(label: string): string {
    return exactHeader(label, this.#numbers, this.kind());
  }
}
