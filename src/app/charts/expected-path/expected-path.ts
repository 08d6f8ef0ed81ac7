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
  type ExpectedPathChoice,
  type ExpectedPathData,
  type ExpectedPathPoint,
  type ExpectedPlan,
  expectedPathLayout,
} from '@figures';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartReadout } from '../chart-frame/chart-readout';
import { ChartPoint, ChartPoints } from '../chart-points';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { exactHeader } from '../exact-figure';
import { figureFormats, withUnit } from '../figure-formats';
import { expectedPathRows, hasBand } from './expected-path-rows';

/** Actual and expected value until now, and what the plans and the base would make of it. */
@Component({
  selector: 'kv-expected-path',
  imports: [ChartFrame, ChartPicture, ChartReadout, ChartPoint, ChartPoints],
  templateUrl: './expected-path.html',
  styleUrls: ['../chart-marks.css', './expected-path.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ExpectedPath {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  readonly ownYears = input.required<ExpectedPathData['ownYears']>();
  /** The last actual values held. */
  readonly base = input<ExpectedPathData['base']>([]);
  /** The one in question first: its interval is drawn as an area, those of the others at their ends. */
  readonly plans = input<readonly ExpectedPlan[]>([]);
  readonly kind = input<FigureKind>('money');
  /** What the band of the first plan is called beside it: `80 % band of the market value`. */
  readonly bandName = input('band of the market value');
  /** What an export has to say itself: why there is no band. */
  readonly note = input('');

  readonly yearSelected = output<ExpectedPathChoice>();

  protected readonly width = signal(640);
  readonly #data = computed((): ExpectedPathData => ({
    ownYears: this.ownYears(),
    base: this.base(),
    plans: this.plans(),
    bandName: this.bandName(),
  }));
  readonly #formats = computed(() => {
    const { ownYears, plans } = this.#data();
    const seen = ownYears.flatMap(({ actual, fitted }) => [actual, fitted]);
    const planned = plans.flatMap(({ years }) => years.map(({ estimate }) => estimate));
    return figureFormats(this.#numbers, this.kind(), [...seen, ...planned]);
  });
  protected readonly layout = computed(() =>
    expectedPathLayout(this.#data(), this.width(), this.#formats()),
  );

  protected readonly summary = computed(() => {
    const last = this.ownYears().at(-1);
    const { value } = this.#formats();
    const happened =
      last === undefined
        ? 'No year has happened yet.'
        : `In ${last.year} actual ${value(last.actual)}, expected ${value(last.fitted)}.`;
    const planned = this.layout().points.filter(
      ({ kind, plan }, place, all) =>
        kind !== 'own' && (all[place + 1]?.kind !== kind || all[place + 1].plan !== plan),
    );
    const ends = planned.map((point) => this.label(point));
    return [happened, ...ends.map((end) => `${end}.`)].join(' ');
  });
  protected readonly columns = computed((): ChartColumn[] => [
    { label: 'line', isNumber: false },
    { label: 'year', isNumber: false },
    this.#figureColumn('actual', withUnit('actual', this.#numbers, this.kind())),
    ...['expected', 'low', 'high'].map((label) => this.#figureColumn(label)),
    ...(hasBand(this.plans()) ? ['band low', 'band high'] : []).map((label) =>
      this.#figureColumn(label),
    ),
  ]);
  protected readonly rows = computed((): ChartRow[] =>
    expectedPathRows(this.#data(), this.#numbers, this.kind()),
  );

  protected choose({ kind, plan, year }: ExpectedPathPoint): void {
    this.yearSelected.emit({ kind: kind === 'own' ? 'actual' : kind, plan, year });
  }

  /** `2028, Plan B: expected 10,340 (9,600 to 11,080)`. */
  protected label(point: ExpectedPathPoint): string {
    switch (point.kind) {
      case 'own':
        return `${point.year}: actual ${point.actual}, expected ${point.expected}`;
      case 'base':
        return `${point.year}, base: expected ${point.expected}`;
      case 'plan':
        return `${point.year}, ${this.plans()[point.plan].name}: expected ${point.expected} (${point.bounds})${this.#bandOf(point)}`;
    }
  }

  #bandOf({ band }: ExpectedPathPoint): string {
    return band === '' ? '' : `, ${this.bandName()} ${band}`;
  }

  #figureColumn(name: string, label = name): ChartColumn {
    return { label, isNumber: true, headers: [exactHeader(name, this.#numbers, this.kind())] };
  }
}
