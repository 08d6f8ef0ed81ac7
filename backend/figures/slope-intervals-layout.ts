import { max } from 'd3';
import { type IntervalFigure, type Stretch } from './figure-types';
import { clippedWords, figuresWidth, wordsWidth } from './text-width';
import { snugScale } from './value-axis';

type Slope = IntervalFigure & {
  readonly name: string;
  /** Ends that do not exist because nothing there is ruled out: the line runs to the edge. */
  readonly unbounded?: 'low' | 'high' | 'both';
};

export interface SlopeIntervalRow {
  readonly name: string;
  readonly label: string;
  readonly value: string;
  readonly bounds: string;
  /** Right end of the value; the bounds follow it to the chart's right edge. */
  readonly valueX: number;
  readonly textY: number;
  readonly figuresY: number;
  readonly lineY: number;
  readonly x: number;
  readonly zeroX: number;
  readonly interval: Stretch | null;
}

export interface SlopeIntervalsLayout {
  readonly width: number;
  readonly height: number;
  /** Whether one scale serves all rows. Slopes of very unlike size each get their own. */
  readonly isOneScale: boolean;
  readonly rows: readonly SlopeIntervalRow[];
}

const nameSize = 13;
const unlike = 25;

/**
 * Name and figures on a line of text, under it the interval, a zero tick and the estimate.
 *
 * @param format  value and bounds of one slope, in digits that suit both.
 */
export function slopeIntervalsLayout(
  slopes: readonly Slope[],
  width: number,
  format: (slope: Slope) => { readonly value: string; readonly bounds: string },
): SlopeIntervalsLayout {
  const reach = slopes.map((slope) =>
    Math.max(Math.abs(slope.estimate), Math.abs(slope.low ?? 0), Math.abs(slope.high ?? 0)),
  );
  const isOneScale = (max(reach) ?? 0) <= unlike * Math.min(...reach.filter((size) => size > 0));
  const range = [6, width - 6] as const;
  const seen = slopes.map((slope) => [slope.estimate, slope.low, slope.high, 0]);
  const common = snugScale(seen.flat(), range);

  let y = 0;
  const rows = slopes.map((slope, place): SlopeIntervalRow => {
    const scale = isOneScale ? common : snugScale(seen[place], range);
    const { value, bounds } = format(slope);
    const figures = figuresWidth(value) + 8 + figuresWidth(bounds);
    const isFolded = wordsWidth(slope.name, nameSize) + 16 + figures > width;
    const textY = y + 20;
    const figuresY = isFolded ? textY + 18 : textY;
    const lineY = figuresY + 18;
    y = lineY + 14;
    return {
      name: slope.name,
      label: clippedWords(slope.name, isFolded ? width : width - figures - 12, nameSize),
      value,
      bounds,
      valueX: width - figuresWidth(bounds) - 8,
      textY,
      figuresY,
      lineY,
      x: scale(slope.estimate),
      zeroX: scale(0),
      interval: placedInterval(slope, scale, range),
    };
  });
  return { width, height: y, isOneScale, rows };
}

function placedInterval(
  { low, high, unbounded }: Slope,
  scale: (value: number) => number,
  [left, right]: readonly [number, number],
): Stretch | null {
  const from = low === null ? (unbounded === 'low' ? left : null) : scale(low);
  const to = high === null ? (unbounded === 'high' ? right : null) : scale(high);
  return from === null || to === null ? null : { from, to };
}
