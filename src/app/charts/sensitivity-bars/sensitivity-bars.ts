import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { type PlacedSensitivityEnd, type SensitivityRow, sensitivityLayout } from '@figures';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartPoint, ChartPoints } from '../chart-points';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { figureFormats, withUnit } from '../figure-formats';

/** How far an expected value moves over the spread of each input: hollow to its low end, filled to its high one. */
@Component({
  selector: 'kv-sensitivity-bars',
  imports: [ChartFrame, ChartPicture, ChartPoint, ChartPoints],
  templateUrl: './sensitivity-bars.html',
  styleUrls: ['../chart-marks.css', './sensitivity-bars.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SensitivityBars {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  /** One an input, in the order in which they are to stand. */
  readonly rows = input.required<readonly SensitivityRow[]>();
  /** The expected value of the plan as it is, in the panel's unit. */
  readonly planned = input.required<number>();
  /** What the low and the high end are: `peers’ 10th percentile`. */
  readonly endNames = input.required<readonly [string, string]>();
  readonly kind = input<FigureKind>('money');

  protected readonly width = signal(560);
  readonly #values = computed(() => [
    this.planned(),
    ...this.rows().flatMap(({ low, high }) =>
      [low, high].flatMap(({ expected }) => (expected === null ? [] : [expected.estimate])),
    ),
  ]);
  readonly #formats = computed(() => figureFormats(this.#numbers, this.kind(), this.#values()));
  protected readonly layout = computed(() =>
    sensitivityLayout(this.rows(), this.planned(), this.width(), this.#formats()),
  );

  protected readonly summary = computed(() => {
    const ends = this.layout().rows.flatMap((row) =>
      row.ends.map((end) => `${this.label(row.name, end)}.`),
    );
    return [`As planned ${this.#formats().value(this.planned())}.`, ...ends].join(' ');
  });
  protected readonly columns = computed((): ChartColumn[] => [
    { label: 'input', isNumber: false },
    { label: 'end', isNumber: false },
    { label: 'its value', isNumber: true },
    { label: withUnit('expected', this.#numbers, this.kind()), isNumber: true },
    { label: 'interval', isNumber: true },
    { label: 'familiar range', isNumber: false },
  ]);
  protected readonly tableRows = computed((): ChartRow[] => {
    const { value, bounds } = this.#formats();
    return this.rows().flatMap(({ name, low, high }) =>
      [low, high].map(({ at, expected, reason, remark }, place) => ({
        cells: [
          name,
          this.endNames()[place],
          at,
          expected === null ? 'n/a' : value(expected.estimate),
          expected === null ? (reason ?? '') : bounds(expected),
          remark === '' ? 'inside' : remark,
        ],
      })),
    );
  });

  /** `Capex, peers’ 10th percentile at 20: 2,540 (2,400 to 2,700)`. */
  protected label(name: string, { end, words }: PlacedSensitivityEnd): string {
    return `${name}, ${this.endNames()[end === 'low' ? 0 : 1]} ${words}`;
  }
}
