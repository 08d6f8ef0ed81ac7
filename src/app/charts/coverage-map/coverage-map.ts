import type { ElementRef } from '@angular/core';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import {
  type CoverageCell,
  type CoverageFrame,
  type CoverageRow,
  type PlacedCoverageCell,
  coverageMapLayout,
  diamondPath,
} from '@figures';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartReadout } from '../chart-frame/chart-readout';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { coverageCells } from './coverage-cells';
import { type GridPlace, gridMove } from '../grid-move';

export interface SelectedCell {
  readonly company: string;
  readonly year: number;
}

/** Maps so far: each needs an id of its own for the cell that has the keyboard. */
let maps = 0;

/** Which company has values in which year: a grid that arrow keys walk, one tab stop. */
@Component({
  selector: 'kv-coverage-map',
  imports: [ChartFrame, ChartPicture, ChartReadout],
  templateUrl: './coverage-map.html',
  styleUrls: ['../chart-marks.css', './coverage-map.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CoverageMap {
  readonly text = input.required<ChartText>();
  readonly cells = input.required<readonly CoverageCell[]>();
  /** Every variable that is wanted. */
  readonly variables = input.required<readonly string[]>();
  /** Only this one counts; null counts all. */
  readonly variable = input<string | null>(null);
  readonly ownCompany = input<string | null>(null);
  /** Fully covered companies and years, drawn as an outline. */
  readonly frame = input<CoverageFrame | null>(null);

  readonly cellSelected = output<SelectedCell>();

  protected readonly scroller = viewChild.required<ElementRef<HTMLElement>>('scroller');

  protected readonly cellId = `kv-coverage-cell-${maps++}`;
  protected readonly diamond = diamondPath(5.5);
  protected readonly width = signal(640);
  protected readonly scrolled = signal({ x: 0, y: 0 });
  protected readonly isFocused = signal(false);
  readonly #place = signal<GridPlace>({ row: 0, column: 0 });
  readonly #hovered = signal<GridPlace | null>(null);

  protected readonly layout = computed(() =>
    coverageMapLayout(
      {
        cells: this.cells(),
        variables: this.variables(),
        variable: this.variable(),
        ownCompany: this.ownCompany(),
        frame: this.frame(),
      },
      this.width(),
    ),
  );
  protected readonly marks = computed(() => coverageCells(this.layout()));
  /** The cell that the keyboard stands on; null in an empty map. */
  protected readonly current = computed(() => this.#at(this.#place()));
  /** The cell that the line under the map speaks of. */
  protected readonly asked = computed(() => {
    const place = this.#hovered() ?? (this.isFocused() ? this.#place() : null);
    return place === null ? null : this.#at(place);
  });
  protected readonly askedWords = computed(() => {
    const at = this.asked();
    return at === null ? '' : this.describe(at);
  });

  readonly #counts = computed(() => {
    const counts = { complete: 0, some: 0, none: 0, flagged: 0 };
    for (const row of this.layout().rows)
      for (const cell of row.cells) {
        counts[cell.state] += 1;
        if (cell.flagged.length > 0) counts.flagged += 1;
      }
    return counts;
  });
  protected readonly summary = computed(() => {
    const { complete, some, none, flagged } = this.#counts();
    const years = this.layout().rows.at(0)?.cells.length ?? 0;
    const what = this.variable() ?? 'all values';
    return [
      `${this.layout().rows.length} companies in ${years} years.`,
      `${what}: complete in ${complete} company years, partly missing in ${some}, none in ${none}.`,
      ...(flagged === 0 ? [] : [`Flagged in ${flagged}.`]),
    ].join(' ');
  });
  /** The signs in words, for a picture that leaves the page without the line above the map. */
  protected readonly note = computed(() => {
    const signs = 'Full square: complete. Half: some missing. Dash: none. Small triangle: flagged.';
    return this.layout().frame.length === 0 ? signs : `${signs} Outline: fully covered.`;
  });
  protected readonly columns = computed((): ChartColumn[] => [
    { label: 'company', isNumber: false },
    ...(this.layout().rows.at(0)?.cells ?? []).map(({ year }) => ({
      label: String(year),
      isNumber: false,
    })),
  ]);
  protected readonly rows = computed((): ChartRow[] =>
    this.layout().rows.map((row) => ({
      isOwn: row.isOwn,
      cells: [row.company, ...row.cells.map((cell) => this.#words(cell))],
    })),
  );

  protected move(event: KeyboardEvent): void {
    if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      this.#select(this.#place());
      return;
    }
    const { rows } = this.layout();
    const next = gridMove(event, this.#place(), rows.length, rows.at(0)?.cells.length ?? 0);
    if (next === null) return;
    event.preventDefault();
    this.#place.set(next);
    this.#reveal(next);
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

  protected follow(): void {
    const { scrollLeft, scrollTop } = this.scroller().nativeElement;
    this.scrolled.set({ x: scrollLeft, y: scrollTop });
  }

  protected describe({ row, cell }: { row: CoverageRow; cell: PlacedCoverageCell }): string {
    return `${row.company} ${cell.year}: ${this.#words(cell)}`;
  }

  #words({ state, missing, flagged }: PlacedCoverageCell): string {
    const words = state === 'some' ? `no ${missing.join(', no ')}` : state;
    return flagged.length === 0 ? words : `${words}, flagged: ${flagged.join(', ')}`;
  }

  #at({ row: rowPlace, column }: GridPlace) {
    const row = this.layout().rows.at(rowPlace);
    const cell = row?.cells.at(column);
    return row === undefined || cell === undefined ? null : { row, cell, rowPlace, column };
  }

  #select(place: GridPlace): void {
    const at = this.#at(place);
    if (at !== null) this.cellSelected.emit({ company: at.row.company, year: at.cell.year });
  }

  /** Names and years stay in sight while the map scrolls; what lies under them is no cell. */
  #placeOf(event: MouseEvent): GridPlace | null {
    const chart = this.layout();
    const box = this.scroller().nativeElement.getBoundingClientRect();
    const [x, y] = [event.clientX - box.left, event.clientY - box.top];
    if (x < chart.left || y < chart.top) return null;
    const column = Math.floor((x + this.scrolled().x - chart.left) / chart.cellWidth);
    const row = Math.floor((y + this.scrolled().y - chart.top) / chart.cellHeight);
    return this.#at({ row, column }) === null ? null : { row, column };
  }

  #reveal({ row, column }: GridPlace): void {
    const chart = this.layout();
    const view = this.scroller().nativeElement;
    const x = column * chart.cellWidth;
    const y = row * chart.cellHeight;
    const [roomX, roomY] = [view.clientWidth - chart.left, view.clientHeight - chart.top];
    view.scrollTo({
      left: Math.max(x + chart.cellWidth - roomX, Math.min(view.scrollLeft, x)),
      top: Math.max(y + chart.cellHeight - roomY, Math.min(view.scrollTop, y)),
    });
  }
}
