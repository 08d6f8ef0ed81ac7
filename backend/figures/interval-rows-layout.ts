import { max } from 'd3';
import {
  type FigureFormats,
  type IntervalFigure,
  type PlacedTick,
  type Plot,
  type Stretch,
  hasBounds,
} from './figure-types';
import { nameSize } from './row-columns';
import { clippedWords, figuresWidth, wordsWidth } from './text-width';
import { placedTicks, snugScale } from './value-axis';

/** Ends that an interval does not have: it goes on as far as one likes. */
export type OpenEnds = 'low' | 'high' | 'both';

/** The same figure found in another way: under another fit, another covariance, another model. */
export interface IntervalRow {
  readonly name: string;
  /** A few words behind the name: `default here`. */
  readonly note?: string;
  /** Null where there is none on this scale; `reason` stands in its place. */
  readonly figure: (IntervalFigure & { readonly unbounded?: OpenEnds }) | null;
  readonly reason?: string;
  /** The one in question: its mark is filled, those of the others are hollow. */
  readonly isMarked?: boolean;
}

export interface PlacedIntervalRow {
  readonly name: string;
  readonly label: string;
  readonly note: string;
  readonly isMarked: boolean;
  readonly textY: number;
  readonly figuresY: number;
  readonly y: number;
  readonly x: number | null;
  readonly interval: Stretch | null;
  /** Heads of arrows where an end is open. */
  readonly arrows: readonly string[];
  /** `1.84 (0.92 to 2.76)`, or why there is none. */
  readonly figures: string;
}

export interface IntervalRowsLayout {
  readonly width: number;
  readonly height: number;
  readonly plot: Plot;
  readonly ticks: readonly PlacedTick[];
  readonly zeroX: number;
  /** Stretches of the upright lines, top to bottom: broken where words would cross them. */
  readonly upright: readonly Stretch[];
  readonly figuresX: number;
  readonly rows: readonly PlacedIntervalRow[];
}

const top = 26;
const noteGap = 8;

/** Lines of an interval from end to end; an open end runs to the edge of the plot. */
function placedInterval(
  figure: NonNullable<IntervalRow['figure']>,
  scale: (value: number) => number,
  plot: Plot,
): Stretch | null {
  const { low, high, unbounded } = figure;
  if (unbounded === undefined)
    return hasBounds(figure) ? { from: scale(figure.low), to: scale(figure.high) } : null;
  const from = unbounded === 'high' ? low : null;
  const to = unbounded === 'low' ? high : null;
  return {
    from: from === null ? plot.left : scale(from),
    to: to === null ? plot.right : scale(to),
  };
}

function arrowHeads(unbounded: OpenEnds | undefined, { from, to }: Stretch, y: number): string[] {
  const heads: string[] = [];
  if (unbounded === 'low' || unbounded === 'both')
    heads.push(`M${from + 6},${y - 4}L${from},${y}L${from + 6},${y + 4}`);
  if (unbounded === 'high' || unbounded === 'both')
    heads.push(`M${to - 6},${y - 4}L${to},${y}L${to - 6},${y + 4}`);
  return heads;
}

/** Estimates with their intervals on one scale with zero, a row each: name at the left, figures at the right. */
export function intervalRowsLayout(
  rows: readonly IntervalRow[],
  width: number,
  formats: FigureFormats,
): IntervalRowsLayout {
  const figures = rows.map(({ figure, reason }) =>
    figure === null
      ? (reason ?? 'none')
      : `${formats.value(figure.estimate)} (${formats.bounds(figure)})`,
  );
  const drawn = rows.map((row, place) => ({ row, text: figures[place] }));
  const figuresWide =
    max(drawn, ({ row, text }) => (row.figure === null ? 0 : figuresWidth(text))) ?? 0;
  const noteWidth = ({ note = '' }: IntervalRow) =>
    note === '' ? 0 : noteGap + wordsWidth(note) + 2;
  const longest = max(rows, (row) => wordsWidth(row.name, nameSize) + noteWidth(row)) ?? 0;
  const isFolded = width < longest + figuresWide + 240;
  const nameWidth = isFolded ? width : longest;
  const rowHeight = isFolded ? 62 : 28;
  const plot: Plot = {
    left: isFolded ? 8 : nameWidth + 20,
    right: isFolded ? width - 8 : width - figuresWide - 24,
    top,
    bottom: top + rows.length * rowHeight,
  };
  const count = Math.max(2, Math.round((plot.right - plot.left) / 100));
  const seen = rows.flatMap(({ figure }) =>
    figure === null ? [] : [figure.estimate, figure.low, figure.high],
  );
  const scale = snugScale([0, ...seen], [plot.left, plot.right]);
  return {
    width,
    upright: isFolded
      ? rows.flatMap(({ figure }, place) => {
          const rowTop = top + place * rowHeight;
          return figure === null ? [] : [{ from: rowTop + 38, to: rowTop + 58 }];
        })
      : [{ from: top - 4, to: plot.bottom }],
    height: plot.bottom + 6,
    plot,
    ticks: placedTicks(scale, count, formats.tick),
    zeroX: scale(0),
    figuresX: isFolded ? 0 : width,
    rows: rows.map((row, place): PlacedIntervalRow => {
      const { name, figure } = row;
      const rowTop = top + place * rowHeight;
      const y = isFolded ? rowTop + 48 : rowTop + 14;
      const interval = figure === null ? null : placedInterval(figure, scale, plot);
      // Why there is no figure may be a sentence: it has the room of the marks as well.
      const room = isFolded || figure !== null ? width : width - plot.left;
      return {
        name,
        label: clippedWords(name, nameWidth - noteWidth(row) + 2, nameSize),
        note: row.note ?? '',
        isMarked: row.isMarked ?? false,
        textY: rowTop + 18,
        figuresY: isFolded ? rowTop + 34 : rowTop + 18,
        y,
        x: figure === null ? null : scale(figure.estimate),
        interval,
        arrows: interval === null ? [] : arrowHeads(figure?.unbounded, interval, y),
        figures: clippedWords(figures[place], room, nameSize),
      };
    }),
  };
}
