import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { type CompanyLinesData, companyLinesLayout, diamondPath } from '@figures';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartPoint, ChartPoints } from '../chart-points';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { exactFigure } from '../exact-figure';
import { figureFormats } from '../figure-formats';
import { ValueAxes } from '../value-axes';

/** The outcome against one regressor: each company its own line, the one line for all across. */
@Component({
  selector: 'kv-company-lines',
  imports: [ChartFrame, ChartPicture, ChartPoint, ChartPoints, ValueAxes],
  templateUrl: './company-lines.html',
  styleUrls: ['../chart-marks.css', './company-lines.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CompanyLines {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  readonly companies = input.required<CompanyLinesData['companies']>();
  readonly pooled = input<CompanyLinesData['pooled']>(null);
  /** Rows of the panel. Of more than 600 only those of the own company are drawn. */
  readonly points = input<CompanyLinesData['points']>([]);
  readonly ownCompany = input.required<string>();
  /** Names of the axes with their units: `capex, EUR m`. */
  readonly xTitle = input.required<string>();
  readonly yTitle = input.required<string>();
  readonly xKind = input<FigureKind>('money');
  readonly yKind = input<FigureKind>('money');

  readonly companySelected = output<string>();

  protected readonly diamond = diamondPath(4.5);
  protected readonly width = signal(640);
  readonly #across = computed(() => this.#formatsOf(0, this.xKind()));
  readonly #up = computed(() => this.#formatsOf(1, this.yKind()));
  protected readonly layout = computed(() =>
    companyLinesLayout(
      {
        companies: this.companies(),
        pooled: this.pooled(),
        points: this.points(),
        ownCompany: this.ownCompany(),
      },
      {
        across: { title: this.xTitle(), tick: this.#across().tick },
        up: { title: this.yTitle(), tick: this.#up().tick },
      },
      this.width(),
    ),
  );

  /** What is not drawn, in words; the export says it as well. */
  protected readonly note = computed(() => {
    const { hiddenPoints, lines } = this.layout();
    const hidden =
      hiddenPoints > 0
        ? `Lines only: the ${this.#numbers.figure(hiddenPoints, 'count')} rows of peers are not drawn.`
        : '';
    const all = this.companies().length;
    const unnamed = lines.length < all ? `${lines.length} of ${all} lines can be pointed at.` : '';
    return [hidden, unnamed].filter((part) => part !== '').join(' ');
  });
  readonly #words = computed(
    () => new Map(this.companies().map((line) => [line.company, this.#ends(line)])),
  );
  protected readonly summary = computed(() => {
    const own = this.#words().get(this.ownCompany());
    const pooled = this.pooled();
    return [
      `${this.yTitle()} against ${this.xTitle()}, ${this.companies().length} companies with a line each.`,
      own === undefined
        ? `${this.ownCompany()} is not among them.`
        : `${this.ownCompany()}: ${own}.`,
      pooled === null ? '' : `One line for all: ${this.#ends(pooled)}.`,
      this.note(),
    ]
      .filter((part) => part !== '')
      .join(' ');
  });
  protected readonly columns = computed((): ChartColumn[] => [
    { label: 'line', isNumber: false },
    { label: `from ${this.xTitle()}`, isNumber: true },
    { label: `to ${this.xTitle()}`, isNumber: true },
    { label: `from ${this.yTitle()}`, isNumber: true },
    { label: `to ${this.yTitle()}`, isNumber: true },
  ]);
  protected readonly rows = computed((): ChartRow[] => {
    const [across, up] = [this.#across().value, this.#up().value];
    const row = (
      name: string,
      { from, to }: Pick<CompanyLinesData['companies'][number], 'from' | 'to'>,
    ) => ({
      cells: [name, across(from[0]), across(to[0]), up(from[1]), up(to[1])],
      values: [
        name,
        ...[from[0], to[0]].map((value) => exactFigure(value, this.#numbers, this.xKind())),
        ...[from[1], to[1]].map((value) => exactFigure(value, this.#numbers, this.yKind())),
      ],
    });
    const pooled = this.pooled();
    return [
      ...this.companies().map((line) => ({
        isOwn: line.company === this.ownCompany(),
        ...row(line.company, line),
      })),
      ...(pooled === null ? [] : [{ isTotal: true, ...row('one line for all', pooled) }]),
    ];
  });

  protected label(company: string): string {
    return `${company}, ${this.#words().get(company) ?? ''}`;
  }

  /** `from 420 at 10 to 450 at 30`: the outcome at both ends of the line. */
  #ends({ from, to }: Pick<CompanyLinesData['companies'][number], 'from' | 'to'>): string {
    const [across, up] = [this.#across().value, this.#up().value];
    return `from ${up(from[1])} at ${across(from[0])} to ${up(to[1])} at ${across(to[0])}`;
  }

  #formatsOf(axis: 0 | 1, kind: FigureKind) {
    const pooled = this.pooled();
    const lines = pooled === null ? this.companies() : [...this.companies(), pooled];
    const seen = lines.flatMap(({ from, to }) => [from[axis], to[axis]]);
    return figureFormats(this.#numbers, kind, seen);
  }
}
