/** An estimate as it stands in a figure; null bounds are no interval, and `intervalReason` says why. */
export interface IntervalFigure {
  readonly estimate: number;
  readonly low: number | null;
  readonly high: number | null;
  readonly intervalReason?: string;
}

/** How a figure writes its numbers. The caller knows unit, sign and locale; a layout knows where they go. */
export interface FigureFormats {
  /** A value in a column or beside a mark: `2,970`. */
  readonly value: (value: number) => string;
  /** The interval of an estimate: `1,570 to 4,270`. */
  readonly bounds: (interval: IntervalFigure) => string;
  /** A mark of an axis; `step` is the distance to the next. */
  readonly tick: (value: number, step: number) => string;
}

/** A mark of an axis in its place, CSS pixels from the left or the top. */
export interface PlacedTick {
  readonly value: number;
  readonly position: number;
  readonly label: string;
}

/** Edges of the area in which values are drawn, CSS pixels. */
export interface Plot {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

export interface Point {
  readonly x: number;
  readonly y: number;
}

/** A piece of text in its place; `anchor` says which of its ends stands at x. */
export interface PlacedText extends Point {
  readonly text: string;
  readonly anchor: 'start' | 'middle' | 'end';
}

/** A horizontal stretch from a low to a high bound. */
export interface Stretch {
  readonly from: number;
  readonly to: number;
}

/** Whether both bounds are there; only then is there an interval to draw. */
export function hasBounds<T extends { readonly low: number | null; readonly high: number | null }>(
  interval: T,
): interval is T & { readonly low: number; readonly high: number } {
  return interval.low !== null && interval.high !== null;
}
