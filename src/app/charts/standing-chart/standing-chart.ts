import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { type IntervalFigure, type StandingRow, diamondPath, standingChartLayout } from '@figures';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartPoint, ChartPoints } from '../chart-points';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { exactFigure, exactHeader } from '../exact-figure';
import { figureFormats, inWords, withUnit } from '../figure-formats';
import { TopAxis } from '../top-axis';

type Intercept = IntervalFigure & { readonly company: string };

/** Company intercepts with their intervals, highest first, the own company among its peers. */
@Component({
  selector: 'kv-standing-chart',
  imports: [ChartFrame, ChartPicture, ChartPoint, ChartPoints, TopAxis],
  templateUrl: './standing-chart.html',
  styleUrl: '../chart-marks.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StandingChart {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  /** Any order, in the panel's unit. */
  readonly intercepts = input.required<readonly Intercept[]>();
  readonly ownCompany = input.required<string>();
  readonly meanOfPeers = input<number | null>(null);
  readonly kind = input<FigureKind>('money');

  readonly companySelected = output<string>();

  protected readonly width = signal(640);
  readonly #formats = computed(() => {
    const seen = this.intercepts().flatMap(({ estimate, low, high }) => [estimate, low, high]);
    return figureFormats(this.#numbers, this.kind(), seen);
  });
  readonly #words = computed(
    () => new Map(this.intercepts().map((row) => [row.company, inWords(row, this.#formats())])),
  );
  protected readonly layout = computed(() =>
    standingChartLayout(
      {
        intercepts: this.intercepts(),
        ownCompany: this.ownCompany(),
        meanOfPeers: this.meanOfPeers(),
      },
      this.width(),
      this.#formats(),
    ),
  );

  protected readonly diamond = computed(() => diamondPath(this.layout().markRadius + 2.5));
  protected readonly summary = computed(() => {
    const rows = this.layout().rows;
    const place = rows.findIndex((row) => row.isOwn);
    const mean = this.meanOfPeers();
    const own =
      place < 0
        ? `${this.ownCompany()} is not among them.`
        : `${this.ownCompany()} comes ${place + 1} of ${rows.length} by estimate: ${this.words(this.ownCompany())}.`;
    const peers = mean === null ? '' : ` Mean of the peers: ${this.#formats().value(mean)}.`;
    return `${rows.length} companies with their intervals, highest first. ${own}${peers}`;
  });

  readonly #hasReasons = computed(() =>
    this.intercepts().some((row) => row.intervalReason !== undefined),
  );
  protected readonly columns = computed((): ChartColumn[] => [
    { label: 'company', isNumber: false },
    {
      label: withUnit('value', this.#numbers, this.kind()),
      isNumber: true,
      headers: [this.#header('value')],
    },
    { label: 'low', isNumber: true, headers: [this.#header('low')] },
    { label: 'high', isNumber: true, headers: [this.#header('high')] },
    ...(this.#hasReasons() ? [{ label: 'why no interval', isNumber: false }] : []),
  ]);
  protected readonly tableRows = computed((): ChartRow[] => {
    const byCompany = new Map(this.intercepts().map((row) => [row.company, row]));
    const digits = this.#numbers.columnDigits(
      this.intercepts().flatMap(({ estimate, low, high }) => [estimate, low, high]),
      this.kind(),
    );
    const figure = (value: number | null) => this.#numbers.figure(value, this.kind(), digits);
    return this.layout().rows.flatMap(({ company, isOwn }) => {
      const row = byCompany.get(company);
      if (row === undefined) return [];
      const reason = this.#hasReasons() ? [row.intervalReason ?? ''] : [];
      const figures = [row.estimate, row.low, row.high];
      return [
        {
          isOwn,
          cells: [company, ...figures.map(figure), ...reason],
          values: [company, ...figures.map((value) => this.#exact(value)), ...reason],
        },
      ];
    });
  });

  /** Value and interval of a company: `2,970 (1,570 to 4,270)`. */
  protected words(company: string): string {
    return this.#words().get(company) ?? '';
  }

  #exact(value: number | null): number | null {
    return exactFigure(value, this.#numbers, this.kind());
  }

  #header(label: string): string {
    return exactHeader(label, this.#numbers, this.kind());
  }

  /** The row that narrow charts write out in full: the one asked for, else the own company's. */
  protected readout(shown: number): StandingRow | undefined {
    const { rows } = this.layout();
    return shown < 0 ? rows.find((row) => row.isOwn) : rows[shown];
  }

  /** Rows too low for names show that of the own company and the one asked for; the latter wins where both meet. */
  protected isWritten(place: number, shown: number): boolean {
    const { rows } = this.layout();
    const row = rows[place];
    if (place === shown || !row.isLabelled) return place === shown;
    return shown < 0 || rows[shown].isLabelled || Math.abs(rows[shown].y - row.y) > 15;
  }
}
