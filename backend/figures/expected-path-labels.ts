import { max } from 'd3';
import type { FigureFormats, PlacedText, Plot, Point } from './figure-types';
import { alongLine, leastCrowded, spreadApart } from './label-places';
import { clippedWords, wordsWidth } from './text-width';

/** The name of a line at its end, with its last value; folded onto two lines where room is short. */
export interface EndLabel extends Point {
  readonly kind: 'base' | 'plan';
  readonly name: string;
  readonly value: string;
  readonly valueX: number;
  readonly valueY: number;
  /** From the line's end to the label, where the label had to move; empty where it stands beside it. */
  readonly leader: string;
}

interface Ended {
  readonly base: readonly { readonly estimate: number }[];
  readonly plans: readonly {
    readonly name: string;
    readonly years: readonly { readonly estimate: number }[];
  }[];
}

/** Pixels between the intervals of plans at their common end. */
export const dodge = 7;

/** How the labels stand: name and value on one line or on two, and how long a name may be. */
export interface Fold {
  readonly isFolded: boolean;
  readonly nameWidth: number;
}

export const oneLine: Fold = { isFolded: false, nameWidth: 140 };

function ends({ base, plans }: Ended) {
  const named = plans.map((plan) => ({
    kind: 'plan' as const,
    name: plan.name,
    end: plan.years.at(-1)?.estimate,
  }));
  const all = [...named, { kind: 'base' as const, name: 'Base', end: base.at(-1)?.estimate }];
  return all.flatMap(({ end, ...rest }) => (end === undefined ? [] : [{ ...rest, end }]));
}

/** Room that the labels at the right need. */
export function endLabelsWidth(
  data: Ended,
  { isFolded, nameWidth }: Fold,
  formats: FigureFormats,
): number {
  const widths = ends(data).map(({ name, end }) => {
    const first = Math.min(wordsWidth(name), nameWidth);
    const second = wordsWidth(formats.value(end));
    return isFolded ? Math.max(first, second) : first + 5 + second;
  });
  return (max(widths) ?? 0) + 12;
}

/** @param right  where the last of the intervals at the ends stands. */
export function endLabels(
  data: Ended,
  { isFolded, nameWidth }: Fold,
  plot: Plot,
  right: number,
  y: (value: number) => number,
  formats: FigureFormats,
): EndLabel[] {
  const lines = ends(data);
  const wanted = lines.map(({ end }) => y(end));
  const gap = isFolded ? 30 : 17;
  const reach = isFolded ? 14 : 6;
  const places = spreadApart(wanted, gap, [plot.top + reach, plot.bottom - reach]);
  return lines.map(({ kind, name, end }, index) => {
    const clipped = clippedWords(name, nameWidth);
    const x = right + 12;
    const baseline = places[index] + (isFolded ? -2 : 4);
    const lineEnd = plot.right + 5 + (kind === 'plan' ? dodge * index : 0);
    return {
      kind,
      name: clipped,
      value: formats.value(end),
      x,
      y: baseline,
      valueX: isFolded ? x : x + wordsWidth(clipped) + 5,
      valueY: isFolded ? baseline + 14 : baseline,
      leader:
        Math.abs(places[index] - wanted[index]) < 5
          ? ''
          : `M${lineEnd},${wanted[index]}L${x - 3},${places[index]}`,
    };
  });
}

/** "actual" and "expected" beside their lines, where the two stand furthest apart and the labels hide nothing. */
export function seriesLabels(
  actual: readonly Point[],
  fitted: readonly Point[],
  plot: Plot,
): (PlacedText & { series: 'actual' | 'expected' })[] {
  const crowd = [...alongLine(actual), ...alongLine(fitted)];
  const taken: Point[] = [];
  const place = (series: 'actual' | 'expected', own: readonly Point[], other: readonly Point[]) => {
    if (own.length === 0) return [];
    const half = wordsWidth(series) / 2;
    const boxes = own
      .flatMap((point, index) => {
        const isUpper = point.y <= other[index].y;
        const baselines = isUpper ? [point.y - 9, point.y + 17] : [point.y + 17, point.y - 9];
        // On a slope a label goes well beside the point: below it to the right, above it to the left, and so on.
        const aside = [0, half + 2, -half - 2];
        return baselines.flatMap((baseline, rank) =>
          aside.map((shift) => {
            const x = Math.min(Math.max(point.x + shift, plot.left + half), plot.right - half);
            return {
              x,
              y: baseline,
              left: x - half - 3,
              right: x + half + 3,
              top: baseline - 12,
              bottom: baseline + 4,
              preference: Math.abs(point.y - other[index].y) - rank * 1000,
            };
          }),
        );
      })
      .filter((box) => box.top >= 0 && box.bottom <= plot.bottom)
      .sort((a, b) => b.preference - a.preference);
    if (boxes.length === 0) return [];
    const { x, y, left, right, top, bottom } = leastCrowded(boxes, [...crowd, ...taken]);
    // The second label keeps off the whole of the first one.
    for (let step = 0; step <= 8; step++)
      for (const edge of [top, y, bottom])
        taken.push({ x: left + ((right - left) * step) / 8, y: edge });
    return [{ text: series, series, x, y, anchor: 'middle' as const }];
  };
  return [...place('actual', actual, fitted), ...place('expected', fitted, actual)];
}
