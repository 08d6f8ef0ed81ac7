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

const longestName = 140;
const longestFoldedName = 84;

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
export function endLabelsWidth(data: Ended, isFolded: boolean, formats: FigureFormats): number {
  const widths = ends(data).map(({ name, end }) => {
    const nameWidth = Math.min(wordsWidth(name), isFolded ? longestFoldedName : longestName);
    const valueWidth = wordsWidth(formats.value(end));
    return isFolded ? Math.max(nameWidth, valueWidth) : nameWidth + 5 + valueWidth;
  });
  return (max(widths) ?? 0) + 12;
}

export function endLabels(
  data: Ended,
  isFolded: boolean,
  plot: Plot,
  y: (value: number) => number,
  formats: FigureFormats,
): EndLabel[] {
  const lines = ends(data);
  const wanted = lines.map(({ end }) => y(end));
  const gap = isFolded ? 30 : 17;
  const reach = isFolded ? 14 : 6;
  const places = spreadApart(wanted, gap, [plot.top + reach, plot.bottom - reach]);
  return lines.map(({ kind, name, end }, index) => {
    const clipped = clippedWords(name, isFolded ? longestFoldedName : longestName);
    const x = plot.right + 12;
    const baseline = places[index] + (isFolded ? -2 : 4);
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
          : `M${x - 8},${wanted[index]}L${x - 2},${places[index]}`,
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
        const x = Math.min(Math.max(point.x, plot.left + half), plot.right - half);
        return baselines.map((baseline, rank) => ({
          x,
          y: baseline,
          left: x - half - 3,
          right: x + half + 3,
          top: baseline - 12,
          bottom: baseline + 4,
          preference: Math.abs(point.y - other[index].y) - rank * 1000,
        }));
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
