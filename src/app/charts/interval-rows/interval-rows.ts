import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { type IntervalRow, diamondPath, intervalRowsLayout } from '@figures';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartPoint, ChartPoints } from '../chart-points';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { exactFigure, exactHeader } from '../exact-figure';
import { figureFormats, withUnit } from '../figure-formats';
import { digitsBy, openBounds } from './open-bounds';

/** One figure found in several ways, a row each: its estimate and interval on one scale with zero. */
@Component({
  selector: 'kv-interval-rows',
  imports: [ChartFrame, ChartPicture, ChartPoint, ChartPoints],
  templateUrl: './interval-rows.html',
  styleUrls: ['../chart-marks.css', './interval-rows.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class IntervalRows {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  readonly rows = input.required<readonly IntervalRow[]>();
  /** `own` for the own company's figures, copper diamonds; `model` for the model's, circles in ink. */
  readonly marks = input<'own' | 'model'>('model');
  readonly kind = input<FigureKind>('plain');
  /** What a row is and what its figure is, as the table's headers: `fit` and `standing`. */
  readonly rowName = input('way');
  readonly figureName = input('estimate');

  protected readonly diamond = diamondPath(6);
  protected readonly width = signal(640);
  readonly #decisive = computed(() =>
    this.rows().map(({ figure }) => (figure === null ? null : digitsBy(figure))),
  );
  readonly #digits = computed(() => this.#numbers.columnDigits(this.#decisive(), this.kind()));
  protected readonly layout = computed(() =>
    intervalRowsLayout(this.rows(), this.width(), {
      ...figureFormats(this.#numbers, this.kind(), this.#decisive()),
      bounds: (figure) =>
        openBounds(figure, this.#numbers, { kind: this.kind(), digits: this.#digits() }),
    }),
  );

  protected readonly labels = computed(() =>
    this.layout().rows.map(({ name, note, figures }, place) => {
      const why = this.rows()[place].figure?.intervalReason;
      const called = note === '' ? name : `${name}, ${note}`;
      return `${called}: ${figures}${why === undefined ? '' : `, ${why}`}`;
    }),
  );
  protected readonly summary = computed(() =>
    this.labels()
      .map((label) => `${label}.`)
      .join(' '),
  );
  readonly #hasRemarks = computed(() => this.rows().some((row) => remarkOf(row) !== ''));
  protected readonly columns = computed((): ChartColumn[] => [
    { label: this.rowName(), isNumber: false },
    {
      label: withUnit(this.figureName(), this.#numbers, this.kind()),
      isNumber: true,
      headers: [this.#header(this.figureName())],
    },
    { label: 'low', isNumber: true, headers: [this.#header('low')] },
    { label: 'high', isNumber: true, headers: [this.#header('high')] },
    ...(this.#hasRemarks() ? [{ label: 'remark', isNumber: false }] : []),
  ]);
  protected readonly tableRows = computed((): ChartRow[] => {
    const written = (value: number | null | undefined) =>
      this.#numbers.figure(value, this.kind(), this.#digits());
    const exact = (value: number | null | undefined) =>
      exactFigure(value, this.#numbers, this.kind());
    return this.rows().map((row) => {
      const { name, figure } = row;
      const [isLowOpen, isHighOpen] = (['low', 'high'] as const).map(
        (end) => figure?.unbounded === end || figure?.unbounded === 'both',
      );
      const cellsBy = <T>(form: (value: number | null | undefined) => T) => [
        name,
        form(figure?.estimate),
        isLowOpen ? 'open' : form(figure?.low),
        isHighOpen ? 'open' : form(figure?.high),
        ...(this.#hasRemarks() ? [remarkOf(row)] : []),
      ];
      return { cells: cellsBy(written), values: cellsBy(exact) };
    });
  });

  #header(label: string): string {
    return exactHeader(label, this.#numbers, this.kind());
  }
}

function remarkOf({ note, figure, reason }: IntervalRow): string {
  return [note, figure === null ? reason : figure.intervalReason]
    .filter((part) => part !== undefined && part !== '')
    .join('; ');
}
