import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import {
  type IntervalFigure,
  type LeaveOneOutRow,
  type LeftOut,
  changeText,
  diamondPath,
  leaveOneOutLayout,
} from '@figures';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartPoint, ChartPoints } from '../chart-points';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { exactFigure, exactHeader } from '../exact-figure';
import { figureFormats, inWords, withUnit } from '../figure-formats';
import { TopAxis } from '../top-axis';

/** What a figure would be without each company, or each year, before the figure with all and its interval. */
@Component({
  selector: 'kv-leave-one-out',
  imports: [ChartFrame, ChartPicture, ChartPoint, ChartPoints, TopAxis],
  templateUrl: './leave-one-out.html',
  styleUrls: ['../chart-marks.css', './leave-one-out.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LeaveOneOut {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  /** In the order in which they are to stand: the most influential first, or the years. */
  readonly leftOut = input.required<readonly LeftOut[]>();
  readonly full = input.required<IntervalFigure>();
  /** What the line of the full figure is called. */
  readonly fullName = input('with all');
  /** `own` for the own company's standing, copper diamonds; `model` for a slope, circles in ink. */
  readonly marks = input<'own' | 'model'>('own');
  readonly kind = input<FigureKind>('money');
  /** What is left out, and what its figure is, as the table's headers. */
  readonly rowName = input('company');
  readonly figureName = input('standing');
  /** How many rows are drawn; the table holds all. */
  readonly most = input(25);
  /** Whether a row leads somewhere. */
  readonly isChoice = input(true);

  readonly companySelected = output<string>();

  protected readonly diamond = diamondPath(5.5);
  protected readonly width = signal(640);
  readonly #seen = computed(() => {
    const { estimate, low, high } = this.full();
    return [estimate, low, high, ...this.leftOut().map((row) => row.estimate)];
  });
  readonly #formats = computed(() => figureFormats(this.#numbers, this.kind(), this.#seen()));
  protected readonly layout = computed(() =>
    leaveOneOutLayout(
      {
        leftOut: this.leftOut(),
        full: this.full(),
        fullName: this.fullName(),
        most: this.most(),
      },
      this.width(),
      this.#formats(),
    ),
  );

  protected readonly summary = computed(() => {
    const full = `${this.figureName()} ${this.fullName()} ${inWords(this.full(), this.#formats())}.`;
    const known = this.leftOut().filter(({ estimate }) => estimate !== null);
    const estimates = known.map(({ estimate }) => estimate ?? 0);
    if (estimates.length === 0) return `${full} Nothing was left out.`;
    const { value } = this.#formats();
    return `${full} Without one ${this.rowName()} at a time, ${known.length} in all, it lies between ${value(Math.min(...estimates))} and ${value(Math.max(...estimates))}.`;
  });
  readonly #hasReasons = computed(() => this.leftOut().some(({ estimate }) => estimate === null));
  protected readonly columns = computed((): ChartColumn[] => [
    { label: `without ${this.rowName()}`, isNumber: false },
    {
      label: withUnit(this.figureName(), this.#numbers, this.kind()),
      isNumber: true,
      headers: [this.figureName(), 'low', 'high'].map((label) => this.#header(label)),
    },
    { label: 'change', isNumber: true, headers: [this.#header('change')] },
    ...(this.#hasReasons() ? [{ label: 'why none', isNumber: false }] : []),
  ]);
  protected readonly tableRows = computed((): ChartRow[] => {
    const formats = this.#formats();
    const { estimate: all, low, high } = this.full();
    const missing = this.#numbers.figure(null);
    const rows = this.leftOut().map(({ name, estimate, reason }) =>
      estimate === null
        ? [name, missing, missing, reason ?? '']
        : [name, formats.value(estimate), changeText(estimate - all, formats), ''],
    );
    const interval = low === null || high === null ? '' : ` (${formats.bounds(this.full())})`;
    const full = [`${this.fullName()}${interval}`, formats.value(all), '', ''];
    const shown = <T>(cells: readonly T[]) => (this.#hasReasons() ? cells : cells.slice(0, -1));
    const exact = (value: number | null) => exactFigure(value, this.#numbers, this.kind());
    return [
      ...this.leftOut().map(({ name, estimate, reason }, place) => ({
        cells: shown(rows[place]),
        values: shown([
          ...[name, exact(estimate), null, null],
          ...(estimate === null ? [null, reason ?? ''] : [exact(estimate - all), '']),
        ]),
      })),
      {
        isTotal: true,
        cells: shown(full),
        values: shown([this.fullName(), exact(all), exact(low), exact(high), null, '']),
      },
    ];
  });

  #header(label: string): string {
    return exactHeader(label, this.#numbers, this.kind());
  }

  protected label({ name, x, value, change, reason }: LeaveOneOutRow): string {
    return `without ${name}: ${x === null ? reason : `${value}, ${change}`}`;
  }

  /** The row that narrow charts write out in full: the one asked for, else the first. */
  protected readout(shown: number): LeaveOneOutRow | undefined {
    return this.layout().rows.at(Math.max(shown, 0));
  }
}
