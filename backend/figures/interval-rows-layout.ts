import { max, sum } from 'd3';
import {
  type FigureFormats,
  type IntervalFigure,
  type PlacedTick,
  type Plot,
  type Stretch,
  hasBounds,
} from './figure-types';
import { nameSize } from './row-columns';
import { clippedWords, figuresWidth, wordsWidth, wrappedWords } from './text-width';
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

/** A line of words and its baseline. */
export interface PlacedLine {
  readonly text: string;
  readonly y: number;
}

export interface PlacedIntervalRow {
  readonly name: string;
  readonly label: string;
  readonly note: string;
  readonly isMarked: boolean;
  readonly top: number;
  readonly height: number;
  /** Baseline of the name. */
  readonly textY: number;
  /** The note where it does not fit behind the name: lines beneath it; else none. */
  readonly noteLines: readonly PlacedLine[];
  /** The figures in one line, or why there are none in as many as it takes. */
  readonly figureLines: readonly PlacedLine[];
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
const lineHeight = 16;

function noteWidth({ note = '' }: IntervalRow): number {
  return note === '' ? 0 : noteGap + wordsWidth(note) + 2;
}

interface RowWords {
  readonly row: IntervalRow;
  readonly noteLines: readonly string[];
  readonly figureLines: readonly string[];
  readonly height: number;
}

/** Words of a row in a narrow chart: all of them over the mark, nothing of them cut. */
function foldedWords(row: IntervalRow, text: string, width: number): RowWords {
  const { name, note = '', figure } = row;
  const isBehind = wordsWidth(name, nameSize) + noteWidth(row) <= width;
  const noteLines = isBehind ? [] : wrappedWords(note, width);
  const figureLines = figure === null ? wrappedWords(text, width, nameSize) : [text];
  const under = noteLines.length + figureLines.length;
  return {
    row,
    noteLines,
    figureLines,
    height: (figure === null ? 30 : 46) + lineHeight * under,
  };
}

/** Words of a row on one line; why there is no figure may be a sentence: it has the room of the marks, and wraps. */
function wideWords(row: IntervalRow, text: string, room: number): RowWords {
  const figureLines = row.figure === null ? wrappedWords(text, room, nameSize) : [text];
  return { row, noteLines: [], figureLines, height: 12 + lineHeight * figureLines.length };
}

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
  const longest = max(rows, (row) => wordsWidth(row.name, nameSize) + noteWidth(row)) ?? 0;
  const isFolded = width < longest + figuresWide + 240;
  const nameWidth = isFolded ? width : longest;
  const left = isFolded ? 8 : nameWidth + 20;
  const words = drawn.map(({ row, text }) =>
    isFolded ? foldedWords(row, text, width) : wideWords(row, text, width - left),
  );
  const plot: Plot = {
    left,
    right: isFolded ? width - 8 : width - figuresWide - 24,
    top,
    bottom: top + sum(words, ({ height }) => height),
  };
  const count = Math.max(2, Math.round((plot.right - plot.left) / 100));
  const seen = rows.flatMap(({ figure }) =>
    figure === null ? [] : [figure.estimate, figure.low, figure.high],
  );
  const scale = snugScale([0, ...seen], [plot.left, plot.right]);
  let rowTop = top;
  const placed = words.map(({ row, noteLines, figureLines, height }, place): PlacedIntervalRow => {
    const { name, figure } = row;
    const textY = rowTop + 18;
    const figuresY = isFolded ? textY + lineHeight * (1 + noteLines.length) : textY;
    const lastY = figuresY + lineHeight * (figureLines.length - 1);
    const y = isFolded ? lastY + 14 : textY - 4;
    const interval = figure === null ? null : placedInterval(figure, scale, plot);
    const room = isFolded ? width : nameWidth - noteWidth(row) + 2;
    const placedRow: PlacedIntervalRow = {
      name,
      label: clippedWords(name, room, nameSize),
      note: row.note ?? '',
      isMarked: row.isMarked ?? false,
      top: rowTop,
      height,
      textY,
      noteLines: placedLines(noteLines, textY + lineHeight),
      figureLines: placedLines(figureLines, figuresY),
      y,
      x: figure === null ? null : scale(figure.estimate),
      interval,
      arrows: interval === null ? [] : arrowHeads(figure?.unbounded, interval, y),
      figures: figures[place],
    };
    rowTop += height;
    return placedRow;
  });
  return {
    width,
    upright: isFolded
      ? placed.flatMap(({ x, y }) => (x === null ? [] : [{ from: y - 10, to: y + 10 }]))
      : [{ from: top - 4, to: plot.bottom }],
    height: plot.bottom + 6,
    plot,
    ticks: placedTicks(scale, count, formats.tick),
    zeroX: scale(0),
    figuresX: isFolded ? 0 : width,
    rows: placed,
  };
}

function placedLines(lines: readonly string[], firstY: number): readonly PlacedLine[] {
  return lines.map((text, place) => ({ text, y: firstY + lineHeight * place }));
}
