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
  type CoverageEntry,
  type CoverageFrame,
  coverageMapLayout,
  coverageSpaces,
  coverageTable,
  diamondPath,
} from '@figures';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartReadout } from '../chart-frame/chart-readout';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { type GridPlace, gridMove } from '../grid-move';
import { companiesDrawn, companiesTold } from './companies-drawn';
import { coverageCells } from './coverage-cells';
import { entryWords, partWords, summaryWords } from './coverage-words';

export interface SelectedCell {
  readonly company: string;
  readonly year: number;
}

/** A cell of the map, drawn or not. */
interface CellAt extends GridPlace {
  readonly company: string;
  readonly entry: CoverageEntry;
}

/** Maps so far: each needs an id of its own for the cell that has the keyboard. */
let maps = 0;

/**
 * Which company has values in which year: a grid that arrow keys walk, one tab stop. Of a large panel it draws the
 * companies in view.
 */
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

  protected readonly table = computed(() =>
    coverageTable({
      cells: this.cells(),
      variables: this.variables(),
      variable: this.variable(),
      ownCompany: this.ownCompany(),
    }),
  );
  readonly #rowHeight = computed(() => coverageSpaces(this.table(), this.width()).cellHeight);
  /** The same while it is scrolled within what is drawn. */
  readonly #drawn = computed(
    () =>
      companiesDrawn(
        this.table().companies.length,
        Math.floor(this.scrolled().y / this.#rowHeight()),
      ),
    { equal: (left, right) => left.first === right.first && left.end === right.end },
  );
  protected readonly layout = computed(() =>
    coverageMapLayout(this.table(), {
      width: this.width(),
      frame: this.frame(),
      shown: this.#drawn(),
    }),
  );
  /** How far down the picture of the drawn companies stands among all of them. */
  protected readonly offset = computed(() => this.#drawn().first * this.#rowHeight());
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

  protected readonly summary = computed(() => summaryWords(this.table(), this.variable()));
  readonly #told = computed(() => companiesTold(this.table().companies.length, this.#drawn()));
  protected readonly part = computed(() =>
    partWords(this.table().companies.length, this.#drawn(), this.#told()),
  );
  /** The signs in words, for a picture that leaves the page without the line above the map. */
  protected readonly note = computed(() => {
    const signs = 'Full square: complete. Half: some missing. Dash: none. Small triangle: flagged.';
    const outline = this.layout().frame.length === 0 ? '' : 'Outline: fully covered.';
    return [signs, outline, this.part()].filter((words) => words !== '').join(' ');
  });
  protected readonly columns = computed((): ChartColumn[] => [
    { label: 'company', isNumber: false },
    ...this.table().years.map((year) => ({ label: String(year), isNumber: false })),
  ]);
  /** In words only once they are read: scrolling makes new rows, and nobody may ever ask for the table. */
  protected readonly rows = computed((): ChartRow[] => {
    const { companies, ownCompany, entriesOf } = this.table();
    const { first, end } = this.#told();
    return companies.slice(first, end).map((company, place) => ({
      isOwn: company === ownCompany,
      get cells() {
        return [company, ...entriesOf(first + place).map(entryWords)];
      },
    }));
  });

  protected move(event: KeyboardEvent): void {
    if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      this.#select(this.#place());
      return;
    }
    const { companies, years } = this.table();
    const next = gridMove(event, this.#place(), companies.length, years.length);
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

  protected describe({ company, entry }: CellAt): string {
    return `${company} ${entry.year}: ${entryWords(entry)}`;
  }

  #at({ row, column }: GridPlace): CellAt | null {
    const { companies, entriesOf } = this.table();
    const company = companies.at(row);
    if (company === undefined) return null;
    const entry = entriesOf(row).at(column);
    return entry === undefined ? null : { row, column, company, entry };
  }

  #select(place: GridPlace): void {
    const at = this.#at(place);
    if (at !== null) this.cellSelected.emit({ company: at.company, year: at.entry.year });
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
    this.follow(); // the event comes later than the next picture
  }
}
