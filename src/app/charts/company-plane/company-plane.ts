import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  model,
  output,
  signal,
} from '@angular/core';
import {
  type PlacedCompany,
  type Point,
  companyPlaneLayout,
  diamondPath,
  nearestPlace,
  placesWithin,
} from '@figures';
import { NumberFormat } from '../../ui/number-format';
import { ChartFrame, ChartPicture } from '../chart-frame/chart-frame';
import { ChartReadout } from '../chart-frame/chart-readout';
import type { ChartColumn, ChartRow, ChartText } from '../chart-text';
import { ValueAxes } from '../value-axes';
import { planeMove } from './plane-move';
import { type PlaneMeasure, type PlaneRow, sideWords } from './plane-words';

/** Charts so far: each needs an id of its own for the company that has the keyboard. */
let charts = 0;
const reach = 24;
/** A pointer that moves less than this, CSS pixels, does not draw a rectangle. */
const leastDrag = 5;

/**
 * Companies on two measures. One tab stop: arrows walk the companies, with Shift they select what they pass, space
 * turns the selection of one, Enter leads to it; a pointer selects one, or all within the rectangle it draws.
 */
@Component({
  selector: 'kv-company-plane',
  imports: [ChartFrame, ChartPicture, ChartReadout, ValueAxes],
  templateUrl: './company-plane.html',
  styleUrls: ['../chart-marks.css', './company-plane.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CompanyPlane {
  readonly #numbers = inject(NumberFormat);

  readonly text = input.required<ChartText>();
  /** The first ones get their names first. */
  readonly rows = input.required<readonly PlaneRow[]>();
  readonly across = input.required<PlaneMeasure>();
  readonly up = input.required<PlaneMeasure>();
  /** Companies without a place on these measures; the chart says how many. */
  readonly missing = input(0);
  /** Names of the selected companies; the own one is never among them. */
  readonly selected = model<ReadonlySet<string>>(new Set());

  /** Asks for a company's row. */
  readonly companyAsked = output<string>();

  protected readonly pointId = `kv-plane-${charts++}`;
  protected readonly diamond = diamondPath(7);
  protected readonly width = signal(640);
  protected readonly isFocused = signal(false);
  readonly #place = signal<string | null>(null);
  readonly #hovered = signal<number | null>(null);
  readonly #drag = signal<{ readonly from: Point; readonly to: Point } | null>(null);

  protected readonly layout = computed(() =>
    companyPlaneLayout(
      { companies: this.rows() },
      { across: this.across(), up: this.up() },
      this.width(),
    ),
  );
  readonly #distances = computed(
    () => new Map(this.rows().map(({ company, distance }) => [company, distance])),
  );
  readonly #exactDistances = computed(
    () => new Map(this.rows().map(({ company, exactDistance }) => [company, exactDistance])),
  );
  /** The company that the keyboard stands on: the own one at first. */
  protected readonly current = computed(() => {
    const { points, own, byX } = this.layout();
    const found = points.find(({ row }) => row.company === this.#place());
    return found ?? own ?? points.at(byX.at(0) ?? 0) ?? null;
  });
  /** The company that the line under the chart speaks of. */
  protected readonly asked = computed((): PlacedCompany | null => {
    const hovered = this.#hovered();
    if (hovered !== null) return this.layout().points.at(hovered) ?? null;
    return this.isFocused() ? this.current() : null;
  });
  protected readonly askedWords = computed(() => {
    const at = this.asked();
    return at === null ? '' : this.label(at);
  });
  protected readonly marked = computed(() =>
    this.layout().points.filter(({ row }) => this.selected().has(row.company)),
  );
  protected readonly brush = computed(() => {
    const drag = this.#drag();
    if (drag === null || !isDrawn(drag)) return null;
    const { from, to } = drag;
    return {
      x: Math.min(from.x, to.x),
      y: Math.min(from.y, to.y),
      width: Math.abs(to.x - from.x),
      height: Math.abs(to.y - from.y),
    };
  });

  protected readonly note = computed(() => {
    const count = this.missing();
    const left = count === 0 ? '' : ` Not shown: ${count}, which lack one of the two.`;
    return `Diamond: own company; circles: in; crosses: out.${left}`;
  });
  protected readonly summary = computed(() => {
    const { points } = this.layout();
    const count = (side: string) => points.filter(({ row }) => row.side === side).length;
    return `${points.length} companies by ${this.across().title} and ${this.up().title}: ${count('in')} in, ${count('out')} out. ${this.note()}`;
  });
  protected readonly columns = computed((): ChartColumn[] => [
    { label: 'company', isNumber: false },
    { label: 'side', isNumber: false },
    { label: this.across().title, isNumber: true },
    { label: this.up().title, isNumber: true },
    { label: 'distance', isNumber: true },
  ]);
  protected readonly tableRows = computed((): ChartRow[] =>
    this.layout().points.map(({ row }) => ({
      isOwn: row.side === 'own',
      cells: [
        row.company,
        sideWords[row.side],
        this.across().text(row.x),
        this.up().text(row.y),
        this.#distance(row) || this.#numbers.figure(null),
      ],
      values: [
        row.company,
        sideWords[row.side],
        this.across().exact(row.x),
        this.up().exact(row.y),
        this.#exactDistances().get(row.company) ?? null,
      ],
    })),
  );

  protected press(event: KeyboardEvent): void {
    const at = this.current();
    if (event.ctrlKey || event.metaKey || event.altKey || at === null) return;
    if (event.key === 'Escape') {
      this.#hovered.set(null);
      this.#drag.set(null);
      return;
    }
    if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      if (event.key === ' ') this.#turn(at.row.company);
      else if (at.row.side !== 'own') this.companyAsked.emit(at.row.company);
      return;
    }
    const { points } = this.layout();
    const passed = planeMove(event.key, points.indexOf(at), this.layout());
    if (passed === null) return;
    event.preventDefault();
    this.#hovered.set(null);
    const names = passed.map((place) => points[place].row.company);
    this.#place.set(names[names.length - 1]);
    if (event.shiftKey) this.#select([at.row.company, ...names], true);
  }

  protected begin(event: PointerEvent): void {
    if (event.button !== 0 || event.pointerType === 'touch') return;
    (event.currentTarget as Element).setPointerCapture(event.pointerId);
    const at = this.#pointOf(event);
    this.#drag.set({ from: at, to: at });
  }

  protected point(event: PointerEvent): void {
    const at = this.#pointOf(event);
    this.#drag.update((drag) => (drag === null ? null : { ...drag, to: at }));
    this.#hovered.set(this.brush() === null ? nearestPlace(this.layout().points, at, reach) : null);
  }

  /** Selects what is within the rectangle, and nothing else unless Shift is held; without one, turns a company. */
  protected finish(event: PointerEvent): void {
    const drag = this.#drag();
    this.#drag.set(null);
    const { points } = this.layout();
    if (drag !== null && isDrawn(drag)) {
      const within = placesWithin(points, drag.from, drag.to);
      this.#select(
        within.map((place) => points[place].row.company),
        event.shiftKey,
      );
      return;
    }
    const place = nearestPlace(points, this.#pointOf(event), reach);
    if (place === null) return;
    this.#place.set(points[place].row.company);
    this.#turn(points[place].row.company);
  }

  protected giveUp(): void {
    this.#drag.set(null);
    this.#hovered.set(null);
  }

  /** `Kesdrin, out: market value, EUR m 1,234; growth, % a year 4.1 %; distance 1.85`. */
  protected label({ row }: PlacedCompany): string {
    const distance = this.#distance(row);
    const parts = [
      `${this.across().title} ${this.across().text(row.x)}`,
      `${this.up().title} ${this.up().text(row.y)}`,
      ...(distance === '' ? [] : [`distance ${distance}`]),
    ];
    return `${row.company}, ${sideWords[row.side]}: ${parts.join('; ')}`;
  }

  #distance({ company }: { readonly company: string }): string {
    return this.#distances().get(company) ?? '';
  }

  #turn(company: string): void {
    const selected = new Set(this.selected());
    if (!selected.delete(company)) selected.add(company);
    this.#set(selected);
  }

  #select(companies: readonly string[], keeps: boolean): void {
    this.#set(new Set([...(keeps ? this.selected() : []), ...companies]));
  }

  #set(companies: ReadonlySet<string>): void {
    const own = this.layout().own?.row.company;
    this.selected.set(new Set([...companies].filter((company) => company !== own)));
  }

  #pointOf(event: MouseEvent): Point {
    const box = (event.currentTarget as SVGSVGElement).getBoundingClientRect();
    const scale = box.width === 0 ? 1 : this.layout().width / box.width;
    return { x: (event.clientX - box.left) * scale, y: (event.clientY - box.top) * scale };
  }
}

function isDrawn({ from, to }: { readonly from: Point; readonly to: Point }): boolean {
  return Math.hypot(to.x - from.x, to.y - from.y) >= leastDrag;
}
