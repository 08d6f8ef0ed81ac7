import {
  type FigureFormats,
  type IntervalFigure,
  type PlacedText,
  type PlacedTick,
  type Plot,
  type Stretch,
  hasBounds,
} from './figure-types';
import {
  columnHeads,
  heightOfNamedRows,
  nameSize,
  rowColumns,
  ticksBesideHeads,
  ticksFor,
} from './row-columns';
import { clippedWords, wordsWidth } from './text-width';
import { placedTicks, snugScale } from './value-axis';

/** A figure as it comes out without one company, or without one year. */
export interface LeftOut {
  /** The company, or the year. */
  readonly name: string;
  /** Null where nothing comes out; `reason` says why. */
  readonly estimate: number | null;
  readonly reason?: string;
}

export interface LeaveOneOutData {
  /** In the order in which they are to stand: the most influential first, or the years. */
  readonly leftOut: readonly LeftOut[];
  /** The figure with all, and its interval. */
  readonly full: IntervalFigure;
  /** What the line of the full figure is called: `all 14 companies`. */
  readonly fullName: string;
  /** How many rows are drawn; the table holds all. */
  readonly most: number;
}

export interface LeaveOneOutRow {
  readonly name: string;
  readonly label: string;
  readonly y: number;
  readonly x: number | null;
  readonly value: string;
  /** How far it is from the full figure, with its sign. */
  readonly change: string;
  /** Why there is none, in full; empty where there is one. */
  readonly reason: string;
  /** As much of it as fits in the mark's place. */
  readonly reasonLabel: string;
}

export interface LeaveOneOutLayout {
  readonly width: number;
  readonly height: number;
  readonly plot: Plot;
  readonly rowHeight: number;
  readonly nameX: number;
  readonly ticks: readonly PlacedTick[];
  /** Null where zero is out of sight. */
  readonly zeroX: number | null;
  readonly full: { readonly x: number; readonly band: Stretch | null; readonly label: PlacedText };
  readonly heads: readonly PlacedText[];
  readonly valueX: number | null;
  readonly changeX: number | null;
  /** Baseline of the line that says in full what the columns have no room for; null where they have. */
  readonly readoutY: number | null;
  readonly rows: readonly LeaveOneOutRow[];
  /** How many are left to the table. */
  readonly more: PlacedText | null;
}

const top = 28;

/** `+120`, `−80`, and the same digits as the figures it is the difference of; what rounds to zero has no sign. */
export function changeText(change: number, formats: FigureFormats): string {
  const text = formats.value(change).replace('%', 'pp');
  if (!/[1-9]/.test(text)) return formats.value(0);
  return change > 0 ? `+${text}` : text;
}

/** A row for each that is left out: a dot where the figure then stands, before the full figure and its interval. */
export function leaveOneOutLayout(
  data: LeaveOneOutData,
  width: number,
  formats: FigureFormats,
): LeaveOneOutLayout {
  const { full } = data;
  const drawn = data.leftOut.slice(0, data.most);
  const texts = drawn.map(({ estimate }) => ({
    value: estimate === null ? '' : formats.value(estimate),
    change: estimate === null ? '' : changeText(estimate - full.estimate, formats),
  }));
  const columns = [
    { label: 'without', texts: texts.map(({ value }) => value) },
    { label: 'change', texts: texts.map(({ change }) => change) },
  ];
  const names = drawn.map(({ name }) => name);
  const places = rowColumns(names, columns, width);
  const [valueX, changeX] = places.columnX;
  const rowHeight = heightOfNamedRows(drawn.length);
  const plot: Plot = {
    left: places.left,
    right: places.right,
    top,
    bottom: top + rowHeight * drawn.length,
  };

  const seen = drawn.map(({ estimate }) => estimate);
  const scale = snugScale(
    [...seen, full.estimate, full.low, full.high],
    [plot.left, plot.right],
    0.04,
  );
  const [low, high] = scale.domain();
  const heads = columnHeads(columns, places, 16);
  const left = data.leftOut.length - drawn.length;
  const moreY = plot.bottom + 40;
  const foot = left > 0 ? moreY + 8 : plot.bottom + 26;
  return {
    width,
    height: foot + (changeX === null ? 20 : 0),
    plot,
    rowHeight,
    nameX: places.nameX,
    ticks: ticksBesideHeads(placedTicks(scale, ticksFor(plot), formats.tick), heads),
    zeroX: low <= 0 && high >= 0 ? scale(0) : null,
    full: {
      x: scale(full.estimate),
      band: hasBounds(full) ? { from: scale(full.low), to: scale(full.high) } : null,
      label: fullLabel(data, scale(full.estimate), plot.bottom + 18, { width, formats }),
    },
    heads,
    valueX,
    changeX,
    readoutY: changeX === null ? foot + 12 : null,
    rows: drawn.map(({ name, estimate, reason }, place) => ({
      name,
      label: clippedWords(name, places.nameWidth + 2, nameSize),
      y: top + rowHeight * (place + 0.5),
      x: estimate === null ? null : scale(estimate),
      ...texts[place],
      reason: estimate === null ? (reason ?? 'no figure') : '',
      reasonLabel:
        estimate === null
          ? clippedWords(reason ?? 'no figure', Math.max(40, width - plot.left - 8))
          : '',
    })),
    more:
      left > 0
        ? { text: `${left} more in the table`, x: plot.left, y: moreY, anchor: 'start' }
        : null,
  };
}

function fullLabel(
  { full, fullName }: LeaveOneOutData,
  x: number,
  y: number,
  { width, formats }: { readonly width: number; readonly formats: FigureFormats },
): PlacedText {
  const text = `${fullName} ${formats.value(full.estimate)} (${formats.bounds(full)})`;
  const half = wordsWidth(text) / 2;
  return {
    text,
    x: Math.min(Math.max(x, half), Math.max(half, width - half)),
    y,
    anchor: 'middle',
  };
}
