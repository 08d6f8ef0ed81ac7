import {
  Directive,
  ElementRef,
  computed,
  contentChildren,
  forwardRef,
  inject,
  input,
  output,
  signal,
} from '@angular/core';

/** Steps that a key takes along the points of a chart. */
const keySteps: Readonly<Record<string, number>> = {
  ArrowRight: 1,
  ArrowDown: 1,
  ArrowLeft: -1,
  ArrowUp: -1,
  PageDown: 10,
  PageUp: -10,
  Home: -Infinity,
  End: Infinity,
};

/**
 * Makes the points of a chart one tab stop: arrows, Page Up and Down, Home and End move among them, in the order in
 * which they stand in the template. Escape puts away what a point shows.
 */
@Directive({
  selector: 'svg[kvPoints]',
  exportAs: 'kvPoints',
  host: {
    role: 'group',
    '(keydown)': 'move($event)',
    '(document:keydown.escape)': 'putAway()',
    '(pointerleave)': 'hovered.set(null)',
  },
})
export class ChartPoints {
  readonly points = contentChildren<ChartPoint>(
    forwardRef(() => ChartPoint),
    { descendants: true },
  );

  readonly focused = signal<ChartPoint | null>(null);
  readonly hovered = signal<ChartPoint | null>(null);
  /** The point that Tab reaches: the one last focused, or the first. */
  readonly #last = signal<ChartPoint | null>(null);
  readonly tabStop = computed(() => {
    const last = this.#last();
    return last !== null && this.points().includes(last) ? last : this.points().at(0);
  });
  /** Place of the point whose value is to be shown; −1 for none. The pointer wins over the focus. */
  readonly shown = computed(() => {
    const point = this.hovered() ?? this.focused();
    return point === null ? -1 : this.points().indexOf(point);
  });

  focus(point: ChartPoint): void {
    this.#last.set(point);
    this.focused.set(point);
  }

  protected putAway(): void {
    this.hovered.set(null);
    this.focused.set(null);
  }

  protected move(event: KeyboardEvent): void {
    const points = this.points();
    const stop = this.tabStop();
    if (!(event.key in keySteps) || stop === undefined) return;
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    event.preventDefault();
    const place = points.indexOf(stop) + keySteps[event.key];
    points[Math.min(Math.max(place, 0), points.length - 1)].take();
  }
}

/** One point of a chart: a mark, a row, a year. Says its label, and answers click, Enter and space where it can be chosen. */
@Directive({
  selector: '[kvPoint]',
  host: {
    '[attr.role]': "isChoice() ? 'button' : 'img'",
    '[attr.tabindex]': 'chart.tabStop() === this ? 0 : -1',
    '[attr.aria-label]': 'label()',
    '[class.kv-choice]': 'isChoice()',
    '(focus)': 'chart.focus(this)',
    '(blur)': 'chart.focused.set(null)',
    '(pointerenter)': 'chart.hovered.set(this)',
    '(click)': 'choose()',
    '(keydown.enter)': 'choose()',
    '(keydown.space)': '$event.preventDefault(); choose()',
  },
})
export class ChartPoint {
  protected readonly chart = inject(ChartPoints);
  readonly #element = inject<ElementRef<SVGElement>>(ElementRef);

  /** What it is and what it is worth, in words. */
  readonly label = input.required<string>({ alias: 'kvPoint' });
  readonly isChoice = input(true);
  readonly chosen = output();

  take(): void {
    this.#element.nativeElement.focus();
  }

  protected choose(): void {
    if (this.isChoice()) this.chosen.emit();
  }
}
