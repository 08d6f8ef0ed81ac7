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
  type ResidualGroupRow,
  type ResidualGroupsData,
  type ResidualSpread,
  diamondPath,
  residualGroupsLayout,
} from '@figures';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartPoint, ChartPoints } from '../chart-points';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { exactFigure, exactHeader } from '../exact-figure';
import { figureFormats, withUnit } from '../figure-formats';
import { TopAxis } from '../top-axis';

/** How far the residuals of each company, or of each year, lie from 0. */
@Component({
  selector: 'kv-residual-groups',
  imports: [ChartFrame, ChartPicture, ChartPoint, ChartPoints, TopAxis],
  templateUrl: './residual-groups.html',
  styleUrls: ['../chart-marks.css', './residual-groups.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResidualGroups {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  readonly groups = input.required<readonly ResidualSpread[]>();
  /** Null where the groups are years. */
  readonly ownCompany = input<string | null>(null);
  /** `widest` first for companies, as `given` for years. */
  readonly order = input<ResidualGroupsData['order']>('widest');
  readonly kind = input<FigureKind>('money');
  /** What a row is, as the table's header. */
  readonly rowName = input('company');
  /** How many rows are drawn, the widest; the table holds all. */
  readonly most = input(30);
  /** Whether a row leads somewhere. */
  readonly isChoice = input(false);

  readonly groupSelected = output<string>();

  protected readonly diamond = diamondPath(5);
  protected readonly width = signal(640);
  readonly #formats = computed(() => {
    const seen = this.groups().flatMap(({ standardDeviation, largest }) => [
      standardDeviation,
      largest,
    ]);
    return figureFormats(this.#numbers, this.kind(), seen);
  });
  protected readonly layout = computed(() =>
    residualGroupsLayout(
      {
        groups: this.groups(),
        ownCompany: this.ownCompany(),
        order: this.order(),
        most: this.most(),
      },
      this.width(),
      this.#formats(),
    ),
  );

  protected readonly note = computed(() => {
    const mean = this.#hasMeans() ? 'the mean' : '0';
    return `Line: one standard deviation to each side of ${mean}. Cross: the largest residual.`;
  });
  readonly #hasMeans = computed(() => this.groups().some(({ mean }) => mean !== undefined));
  protected readonly summary = computed(() => {
    const { rows, more } = this.layout();
    const spreads = [...rows];
    if (this.order() === 'given') spreads.sort((a, b) => widthOf(b) - widthOf(a));
    const widest = spreads.at(0);
    const own = rows.find(({ isOwn }) => isOwn);
    return [
      `Spread of residuals by ${this.rowName()}, ${this.groups().length} in all.`,
      widest === undefined ? '' : `Widest: ${this.label(widest)}.`,
      own === undefined || own === widest ? '' : `${this.label(own)}.`,
      more === null ? '' : `${more.text}.`,
    ]
      .filter((part) => part !== '')
      .join(' ');
  });
  protected readonly columns = computed((): ChartColumn[] => [
    { label: this.rowName(), isNumber: false },
    ...[...(this.#hasMeans() ? ['mean'] : []), 'standard deviation', 'largest'].map((label) => ({
      label: withUnit(label, this.#numbers, this.kind()),
      isNumber: true,
      headers: [exactHeader(label, this.#numbers, this.kind())],
    })),
    { label: 'rows', isNumber: true },
  ]);
  protected readonly tableRows = computed((): ChartRow[] => {
    const digits = this.#numbers.columnDigits(
      this.groups().flatMap(({ standardDeviation, largest }) => [standardDeviation, largest]),
      this.kind(),
    );
    const figure = (value: number | null | undefined) =>
      this.#numbers.figure(value, this.kind(), digits);
    return this.groups().map((group) => {
      const figures = [
        ...(this.#hasMeans() ? [group.mean] : []),
        ...[group.standardDeviation, group.largest],
      ];
      return {
        isOwn: group.label === this.ownCompany(),
        cells: [group.label, ...figures.map(figure), String(group.count)],
        values: [
          group.label,
          ...figures.map((value) => exactFigure(value, this.#numbers, this.kind())),
          group.count,
        ],
      };
    });
  });

  /** `2014: mean 30, standard deviation 60, largest 130`. */
  protected label({ label, mean, deviation, largest }: ResidualGroupRow): string {
    const ofMean = mean === '' ? '' : `mean ${mean}, `;
    return `${label}: ${ofMean}standard deviation ${deviation}, largest ${largest}`;
  }

  /** The row that narrow charts write out in full: the one asked for, else the own company's, else the first. */
  protected readout(shown: number): ResidualGroupRow | undefined {
    const { rows } = this.layout();
    return shown < 0 ? (rows.find(({ isOwn }) => isOwn) ?? rows.at(0)) : rows[shown];
  }
}

function widthOf({ spread }: ResidualGroupRow): number {
  return spread === null ? -1 : spread.to - spread.from;
}
