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
  type PlacedResidual,
  type ResidualRow,
  diamondPath,
  nearestPlace,
  residualScatterLayout,
} from '@figures';
import { type FigureKind, NumberFormat } from '../../ui/number-format';
import { lineText } from '../../ui/phrases';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartReadout } from '../chart-frame/chart-readout';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { exactFigure, exactHeader } from '../exact-figure';
import { figureFormats, withUnit } from '../figure-formats';
import { ValueAxes } from '../value-axes';
import { scatterMove } from './scatter-move';

/** Charts so far: each needs an id of its own for the point that has the keyboard. */
let charts = 0;
const reach = 24;

/**
 * What the model leaves of each row against what it expects. Thousands of points are two paths and one tab stop: keys
 * and pointer find a point by its place.
 */
@Component({
  selector: 'kv-residual-scatter',
  imports: [ChartFrame, ChartPicture, ChartReadout, ValueAxes],
  templateUrl: './residual-scatter.html',
  styleUrls: ['../chart-marks.css', './residual-scatter.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResidualScatter {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  readonly rows = input.required<readonly ResidualRow[]>();
  /** How many rows there are in all, where only the largest are given. */
  readonly of = input<number | null>(null);
  readonly ownCompany = input.required<string>();
  readonly kind = input<FigureKind>('money');

  readonly rowSelected = output<ResidualRow>();

  protected readonly pointId = `kv-residual-${charts++}`;
  protected readonly diamond = diamondPath(6);
  protected readonly width = signal(640);
  protected readonly isFocused = signal(false);
  readonly #place = signal(0);
  readonly #hovered = signal<number | null>(null);
  readonly #formats = computed(() => {
    const seen = this.rows().flatMap(({ fitted, residual }) => [fitted, residual]);
    return figureFormats(this.#numbers, this.kind(), seen);
  });
  protected readonly layout = computed(() => {
    const { tick } = this.#formats();
    return residualScatterLayout(
      { rows: this.rows(), ownCompany: this.ownCompany() },
      {
        across: { title: withUnit('fitted', this.#numbers, this.kind()), tick },
        up: { title: withUnit('residual', this.#numbers, this.kind()), tick },
      },
      this.width(),
    );
  });
  /** The point that the keyboard stands on; null where there are none. */
  protected readonly current = computed(() => this.#at(this.#place()));
  /** The point that the line under the chart speaks of. */
  protected readonly asked = computed(() => {
    const hovered = this.#hovered();
    if (hovered !== null) return this.#at(hovered);
    return this.isFocused() ? this.current() : null;
  });
  protected readonly askedWords = computed(() => {
    const at = this.asked();
    return at === null ? '' : this.describe(at.row);
  });

  protected readonly note = computed(() => {
    const all = this.of();
    const drawn = this.rows().length;
    if (all === null || all <= drawn) return '';
    const count = (value: number) => this.#numbers.figure(value, 'count');
    return `${count(drawn)} of ${count(all)} rows: those with the largest studentised residuals.`;
  });
  protected readonly summary = computed(() => {
    const [largest] = this.layout().points;
    const of = `${this.layout().points.length} residuals against fitted values.`;
    const most =
      this.layout().points.length === 0 ? '' : `The largest: ${this.describe(largest.row)}.`;
    return [of, most, this.note()].filter((part) => part !== '').join(' ');
  });
  protected readonly columns = computed((): ChartColumn[] => [
    { label: 'company', isNumber: false },
    { label: 'year', isNumber: false },
    ...['fitted', 'residual'].map((label) => ({
      label: withUnit(label, this.#numbers, this.kind()),
      isNumber: true,
      headers: [exactHeader(label, this.#numbers, this.kind())],
    })),
    { label: 'studentised', isNumber: true },
    { label: 'row of the file', isNumber: true },
  ]);
  protected readonly tableRows = computed((): ChartRow[] => {
    const { value } = this.#formats();
    return this.layout().points.map(({ row, isOwn }) => ({
      isOwn,
      cells: [
        row.company,
        String(row.year),
        value(row.fitted),
        value(row.residual),
        this.#studentised(row),
        lineText(row.fileRow),
      ],
      values: [
        ...[row.company, row.year],
        ...[row.fitted, row.residual].map((each) => exactFigure(each, this.#numbers, this.kind())),
        row.studentised,
        row.fileRow === 0 ? lineText(row.fileRow) : row.fileRow,
      ],
    }));
  });

  protected move(event: KeyboardEvent): void {
    if (event.key === 'Escape') {
      this.#hovered.set(null);
      this.isFocused.set(false);
      return;
    }
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      this.#select(this.#place());
      return;
    }
    const next = scatterMove(event.key, this.#place(), this.layout());
    if (next === null) return;
    event.preventDefault();
    this.#hovered.set(null);
    this.isFocused.set(true);
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

  /** `Tolvane 2014: residual 1,200, fitted 8,300, studentised 3.41`. */
  protected describe(row: ResidualRow): string {
    const { value } = this.#formats();
    return `${row.company} ${row.year}: residual ${value(row.residual)}, fitted ${value(row.fitted)}, studentised ${this.#studentised(row)}`;
  }

  #studentised({ studentised }: ResidualRow): string {
    return this.#numbers.figure(studentised, 'plain', 2);
  }

  #at(place: number): PlacedResidual | null {
    return this.layout().points.at(place) ?? null;
  }

  #select(place: number): void {
    const at = this.#at(place);
    if (at !== null) this.rowSelected.emit(at.row);
  }

  #placeOf(event: MouseEvent): number | null {
    const box = (event.currentTarget as SVGSVGElement).getBoundingClientRect();
    const { points, width } = this.layout();
    const scale = box.width === 0 ? 1 : width / box.width;
    const at = { x: (event.clientX - box.left) * scale, y: (event.clientY - box.top) * scale };
    return nearestPlace(points, at, reach);
  }
}
