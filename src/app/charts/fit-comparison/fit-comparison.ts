import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { type ComparedFit, diamondPath, fitComparisonLayout } from '@figures';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { ChartFrame } from '../chart-frame/chart-frame';
import { ChartPoint, ChartPoints } from '../chart-points';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { figureFormats, withUnit } from '../figure-formats';

/** The own company's standing under one fit and under another, on one scale. */
@Component({
  selector: 'kv-fit-comparison',
  imports: [ChartFrame, ChartPoint, ChartPoints],
  templateUrl: './fit-comparison.html',
  styleUrls: ['../chart-marks.css', './fit-comparison.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FitComparison {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  /** The fit in question first: its mark is filled. */
  readonly fits = input.required<readonly ComparedFit[]>();
  readonly kind = input<FigureKind>('money');

  protected readonly diamond = diamondPath(6);
  protected readonly width = signal(640);
  readonly #seen = computed(() =>
    this.fits().flatMap(({ standing }) =>
      standing === null ? [] : [standing.estimate, standing.low, standing.high],
    ),
  );
  protected readonly layout = computed(() =>
    fitComparisonLayout(
      this.fits(),
      this.width(),
      figureFormats(this.#numbers, this.kind(), this.#seen()),
    ),
  );

  protected readonly summary = computed(() =>
    this.layout()
      .rows.map(({ name, figures }) => `${name}: ${figures}.`)
      .join(' '),
  );
  protected readonly columns = computed((): ChartColumn[] => [
    { label: 'fit', isNumber: false },
    { label: withUnit('standing', this.#numbers, this.kind()), isNumber: true },
    { label: 'low', isNumber: true },
    { label: 'high', isNumber: true },
  ]);
  protected readonly rows = computed((): ChartRow[] => {
    const digits = this.#numbers.columnDigits(this.#seen(), this.kind());
    const figure = (value: number | null | undefined) =>
      this.#numbers.figure(value, this.kind(), digits);
    return this.fits().map(({ name, standing }) => ({
      cells: [name, figure(standing?.estimate), figure(standing?.low), figure(standing?.high)],
    }));
  });
}
