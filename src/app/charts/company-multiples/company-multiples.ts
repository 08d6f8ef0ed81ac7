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
  type CompanyMultiplesData,
  type MultiplesPoint,
  type MultiplesRow,
  companyMultiplesLayout,
  diamondPath,
} from '@figures';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartReadout } from '../chart-frame/chart-readout';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { exactFigure } from '../exact-figure';
import { withUnit } from '../figure-formats';
import { type GridPlace, gridMove } from '../grid-move';

export interface MultiplesVariable {
  readonly name: string;
  readonly kind: FigureKind;
}

/** A figure that was chosen; `variable` is its position among the variables. */
export interface ChosenFigure {
  readonly company: string;
  readonly year: number;
  readonly variable: number;
}

let charts = 0;

/** Every company's variables over time, a line each: a grid of figures that arrow keys walk, one tab stop. */
@Component({
  selector: 'kv-company-multiples',
  imports: [ChartFrame, ChartPicture, ChartReadout],
  templateUrl: './company-multiples.html',
  styleUrls: ['../chart-marks.css', './company-multiples.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CompanyMultiples {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  readonly rows = input.required<CompanyMultiplesData['rows']>();
  readonly variables = input.required<readonly MultiplesVariable[]>();
  readonly ownCompany = input<string | null>(null);
  readonly years = input.required<readonly [number, number]>();
  readonly scale = input<'common' | 'own'>('own');

  readonly figureSelected = output<ChosenFigure>();

  protected readonly cellId = `kv-multiples-figure-${charts++}`;
  protected readonly diamond = diamondPath(5.5);
  protected readonly width = signal(640);
  protected readonly isFocused = signal(false);
  readonly #place = signal<GridPlace>({ row: 0, column: 0 });
  readonly #hovered = signal<GridPlace | null>(null);

  readonly #digits = computed(() =>
    this.variables().map(({ kind }, variable) =>
      this.#numbers.columnDigits(
        this.rows().map(({ values }) => values[variable]),
        kind,
      ),
    ),
  );
  readonly #names = computed(() =>
    this.variables().map(({ name, kind }) => withUnit(name, this.#numbers, kind)),
  );
  protected readonly layout = computed(() =>
    companyMultiplesLayout(
      {
        rows: this.rows(),
        variables: this.#names(),
        ownCompany: this.ownCompany(),
        years: this.years(),
        scale: this.scale(),
      },
      { width: this.width(), value: (value, variable) => this.#figure(value, variable) },
    ),
  );
  readonly #yearCount = computed(() => this.years()[1] - this.years()[0] + 1);
  protected readonly columnCount = computed(() => this.#yearCount() * this.variables().length);
  protected readonly current = computed(() => this.#at(this.#place()));
  /** The figure that the line under the chart speaks of. */
  protected readonly asked = computed(() => {
    const place = this.#hovered() ?? (this.isFocused() ? this.#place() : null);
    return place === null ? null : this.#at(place);
  });
  protected readonly askedWords = computed(() => {
    const at = this.asked();
    return at === null ? '' : this.describe(at);
  });

  protected readonly summary = computed(() => {
    const [first, last] = this.years();
    const scale = this.scale() === 'own' ? 'each on its own scale' : 'on one scale a variable';
    return `${this.layout().rows.length} companies, ${this.#names().join(', ')}, ${first} to ${last}, ${scale}.`;
  });
  protected readonly note = computed(() => {
    const scale =
      this.scale() === 'own'
        ? 'Each line on its own scale, which need not begin at zero.'
        : 'Lines of a variable on one scale.';
    return `${scale} First and last figure beside each line. Small triangle: flagged.`;
  });
  protected readonly columns = computed((): ChartColumn[] => [
    { label: 'company', isNumber: false },
    { label: 'variable', isNumber: false },
    ...Array.from({ length: this.#yearCount() }, (_, step) => ({
      label: String(this.years()[0] + step),
      isNumber: true,
    })),
  ]);
  protected readonly tableRows = computed((): ChartRow[] =>
    this.layout().rows.flatMap(({ company, isOwn, lines }) =>
      lines.map(({ variable, points }) => ({
        isOwn,
        cells: [
          company,
          this.#names()[variable],
          ...points.map(({ value }) => this.#figure(value, variable)),
        ],
        values: [
          company,
          this.#names()[variable],
          ...points.map(({ value }) =>
            exactFigure(value, this.#numbers, this.variables()[variable].kind),
          ),
        ],
      })),
    ),
  );

  protected describe({ row, variable, point }: AtFigure): string {
    const flag = point.isFlagged ? ', flagged' : '';
    const figure = this.#figure(point.value, variable);
    return `${row.company} ${point.year} ${this.#names()[variable]}: ${figure}${flag}`;
  }

  protected move(event: KeyboardEvent): void {
    if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      this.#select(this.#place());
      return;
    }
    const next = gridMove(event, this.#place(), this.layout().rows.length, this.columnCount());
    if (next === null) return;
    event.preventDefault();
    this.#place.set(next);
  }

  protected point(event: PointerEvent): void {
    this.#hovered.set(this.#placeOf(event));
  }

  protected leave(): void {
    this.#hovered.set(null);
  }

  protected pick(event: MouseEvent): void {
    const place = this.#placeOf(event);
    if (place === null) return;
    this.#place.set(place);
    this.#select(place);
  }

  #figure(value: number | null, variable: number): string {
    return this.#numbers.figure(value, this.variables()[variable].kind, this.#digits()[variable]);
  }

  #at({ row: rowPlace, column }: GridPlace): AtFigure | null {
    const row = this.layout().rows.at(rowPlace);
    const variable = Math.floor(column / this.#yearCount());
    const point = row?.lines.at(variable)?.points.at(column % this.#yearCount());
    return row === undefined || point === undefined
      ? null
      : { row, rowPlace, column, variable, point };
  }

  #select(place: GridPlace): void {
    const at = this.#at(place);
    if (at === null) return;
    const { row, point, variable } = at;
    this.figureSelected.emit({ company: row.company, year: point.year, variable });
  }

  /** The figure nearest to the pointer within its company. */
  #placeOf(event: MouseEvent): GridPlace | null {
    if (!(event.currentTarget instanceof SVGElement)) return null;
    const box = event.currentTarget.getBoundingClientRect();
    const [x, y] = [event.clientX - box.left, event.clientY - box.top];
    const { rows, rowHeight } = this.layout();
    const row = rows.findIndex(({ top }) => y >= top && y < top + rowHeight);
    if (row === -1) return null;
    const column = nearest(rows[row], { x, y }, this.#yearCount());
    return column === -1 ? null : { row, column };
  }
}

interface AtFigure {
  readonly row: MultiplesRow;
  readonly rowPlace: number;
  readonly column: number;
  /** Position among the variables. */
  readonly variable: number;
  readonly point: MultiplesPoint;
}

/** Lines that lie side by side are told apart across, those below one another down. */
const reach = 24;

function nearest(
  { lines }: MultiplesRow,
  at: { readonly x: number; readonly y: number },
  years: number,
): number {
  let found = -1;
  let least = Infinity;
  lines.forEach(({ points }, line) => {
    points.forEach((point, place) => {
      const distance = Math.abs(point.at.x - at.x) + Math.abs(point.at.y - at.y) / 4;
      if (Math.abs(point.at.x - at.x) > reach || distance >= least) return;
      least = distance;
      found = line * years + place;
    });
  });
  return found;
}
