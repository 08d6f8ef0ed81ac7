import { line, max } from 'd3';
import {
  type FigureFormats,
  type IntervalFigure,
  type PlacedText,
  type PlacedTick,
  type Plot,
  type Point,
  hasBounds,
} from './figure-types';
import { alongLine, leastCrowded } from './label-places';
import { figuresWidth, wordsWidth } from './text-width';
import { placedTicks, valueScale } from './value-axis';
import { placedYears, yearScale } from './year-axis';

export interface GapYear {
  readonly year: number;
  /** The own company's distance from its peers; null where it, or every peer, is missing. */
  readonly gap: number | null;
  /** How many peers were present. */
  readonly peers: number;
}

export interface GapPathPoint extends Point {
  readonly year: number;
  readonly peers: number;
  readonly value: string;
  /** Edges of the strip that answers the pointer. */
  readonly from: number;
  readonly to: number;
}

export interface GapPathLayout {
  readonly width: number;
  readonly height: number;
  readonly plot: Plot;
  readonly yTicks: readonly PlacedTick[];
  readonly years: readonly PlacedTick[];
  readonly zeroY: number;
  /** A missing year breaks the line. */
  readonly path: string;
  readonly points: readonly GapPathPoint[];
  readonly standing: {
    readonly y: number;
    readonly band: { readonly top: number; readonly bottom: number } | null;
    readonly label: PlacedText;
  } | null;
}

/** The gap to the peers year by year, beside the standing with its interval. */
export function gapPathLayout(
  years: readonly GapYear[],
  standing: IntervalFigure | null,
  width: number,
  formats: FigureFormats,
): GapPathLayout {
  const height = width < 480 ? 180 : 200;
  const [top, bottom] = [12, height - 28];
  const seen = years.map(({ gap }) => gap);
  const y = valueScale(
    [...seen, 0, standing?.estimate, standing?.low, standing?.high],
    [bottom, top],
    4,
  );
  const yTicks = placedTicks(y, 4, formats.tick);
  const left = (max(yTicks, (tick) => figuresWidth(tick.label)) ?? 0) + 16;
  const plot: Plot = { left, right: Math.max(left + 40, width - 20), top, bottom };
  const x = yearScale(
    years.map(({ year }) => year),
    [plot.left, plot.right],
  );
  const half = Math.abs(x(1) - x(0)) / 2;
  const present = years.filter((year): year is GapYear & { gap: number } => year.gap !== null);
  const points = present.map((item) => ({
    year: item.year,
    peers: item.peers,
    value: formats.value(item.gap),
    x: x(item.year),
    y: y(item.gap),
    from: Math.max(0, x(item.year) - half),
    to: Math.min(width, x(item.year) + half),
  }));

  const path = line<GapYear>()
    .defined(({ gap }) => gap !== null)
    .x(({ year }) => x(year))
    .y(({ gap }) => y(gap ?? 0));

  return {
    width,
    height,
    plot,
    yTicks,
    years:
      years.length === 0
        ? []
        : placedYears(
            years.map(({ year }) => year),
            x,
          ),
    zeroY: y(0),
    path: path(years) ?? '',
    points,
    standing: standing === null ? null : placedStanding(standing, y, plot, points, formats),
  };
}

function placedStanding(
  standing: IntervalFigure,
  y: (value: number) => number,
  plot: Plot,
  points: readonly Point[],
  formats: FigureFormats,
): GapPathLayout['standing'] {
  const lineY = y(standing.estimate);
  const text = `standing ${formats.value(standing.estimate)} (${formats.bounds(standing)})`;
  const long = wordsWidth(text);
  const places = [lineY - 6, lineY + 15].flatMap((baseline) => [
    { x: plot.right - 4, y: baseline, anchor: 'end' as const },
    { x: plot.left + 4, y: baseline, anchor: 'start' as const },
    { x: (plot.left + plot.right) / 2, y: baseline, anchor: 'middle' as const },
  ]);
  const shift = { start: 0, middle: -long / 2, end: -long };
  const boxes = places.map((place) => ({
    ...place,
    left: place.x + shift[place.anchor] - 4,
    right: place.x + shift[place.anchor] + long + 4,
    top: place.y - 14,
    bottom: place.y + 5,
  }));
  const { x, y: labelY, anchor } = leastCrowded(boxes, alongLine(points));
  const band = hasBounds(standing) ? { top: y(standing.high), bottom: y(standing.low) } : null;
  return { y: lineY, band, label: { text, x, y: labelY, anchor } };
}
