import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { type GapYear, type IntervalFigure, diamondPath, gapPathLayout } from '@figures';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartPoint, ChartPoints } from '../chart-points';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { exactFigure, exactHeader } from '../exact-figure';
import { figureFormats, inWords, withUnit } from '../figure-formats';

/** The own company's gap to its peers, year by year, beside its standing. */
@Component({
  selector: 'kv-gap-path',
  imports: [ChartFrame, ChartPicture, ChartPoint, ChartPoints],
  templateUrl: './gap-path.html',
  styleUrls: ['../chart-marks.css', './gap-path.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GapPath {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  /** In the order of the years; a null gap breaks the line. */
  readonly years = input.required<readonly GapYear[]>();
  readonly standing = input<IntervalFigure | null>(null);
  readonly kind = input<FigureKind>('money');

  readonly yearSelected = output<number>();

  protected readonly diamond = diamondPath(5);
  protected readonly width = signal(640);
  readonly #formats = computed(() => {
    const standing = this.standing();
    const ofStanding = standing === null ? [] : [standing.estimate, standing.low, standing.high];
    const gaps = this.years().map(({ gap }) => gap);
    return figureFormats(this.#numbers, this.kind(), [...gaps, ...ofStanding]);
  });
  protected readonly layout = computed(() =>
    gapPathLayout(this.years(), this.standing(), this.width(), this.#formats()),
  );

  protected readonly summary = computed(() => {
    const { points } = this.layout();
    const [first, last] = [points.at(0), points.at(-1)];
    const standing = this.standing();
    const path =
      first === undefined || last === undefined
        ? 'No year has a gap.'
        : `Gap to peers ${first.value} in ${first.year}, ${last.value} in ${last.year}.`;
    return standing === null ? path : `${path} Standing ${inWords(standing, this.#formats())}.`;
  });
  protected readonly columns = computed((): ChartColumn[] => [
    { label: 'year', isNumber: false },
    {
      label: withUnit('gap to peers', this.#numbers, this.kind()),
      isNumber: true,
      headers: [exactHeader('gap to peers', this.#numbers, this.kind())],
    },
    { label: 'peers present', isNumber: true },
  ]);
  protected readonly rows = computed((): ChartRow[] => {
    const gaps = this.years().map(({ gap }) => gap);
    const digits = this.#numbers.columnDigits(gaps, this.kind());
    return this.years().map(({ year, gap, peers }) => ({
      cells: [String(year), this.#numbers.figure(gap, this.kind(), digits), String(peers)],
      values: [year, exactFigure(gap, this.#numbers, this.kind()), peers],
    }));
  });
}
