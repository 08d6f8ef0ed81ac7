import { max } from 'd3';
import {
  type FigureFormats,
  type IntervalFigure,
  type PlacedTick,
  type Plot,
  type Stretch,
  hasBounds,
} from './figure-types';
import { clippedWords, figuresWidth, wordsWidth } from './text-width';
import { placedTicks, snugScale } from './value-axis';

export interface ComparedFit {
  /** `6f3a91, 12 Nov 2026`. */
  readonly name: string;
  /** Null where the fit gives no standing; `reason` says why. */
  readonly standing: IntervalFigure | null;
  readonly reason?: string;
}

export interface FitComparisonRow {
  readonly name: string;
  readonly label: string;
  /** The first fit is the one in question: its mark is filled. */
  readonly isFirst: boolean;
  readonly textY: number;
  readonly figuresY: number;
  readonly y: number;
  readonly x: number | null;
  readonly interval: Stretch | null;
  readonly figures: string;
}

export interface FitComparisonLayout {
  readonly width: number;
  readonly height: number;
  readonly plot: Plot;
  readonly ticks: readonly PlacedTick[];
  readonly zeroX: number;
  /** Stretches of the upright lines, top to bottom: broken where words would cross them. */
  readonly upright: readonly Stretch[];
  readonly figuresX: number;
  readonly rows: readonly FitComparisonRow[];
}

const nameSize = 13;
const top = 26;

/** The standing under each fit, on one scale. */
export function fitComparisonLayout(
  fits: readonly ComparedFit[],
  width: number,
  formats: FigureFormats,
): FitComparisonLayout {
  const figures = fits.map(({ standing, reason }) =>
    standing === null
      ? (reason ?? 'no standing')
      : `${formats.value(standing.estimate)} (${formats.bounds(standing)})`,
  );
  const figuresWide = max(figures, (text) => figuresWidth(text)) ?? 0;
  const longestName = max(fits, (fit) => wordsWidth(fit.name, nameSize)) ?? 0;
  const isFolded = width < longestName + figuresWide + 240;
  const nameWidth = isFolded ? width : longestName;
  const rowHeight = isFolded ? 62 : 28;
  const plot: Plot = {
    left: isFolded ? 8 : nameWidth + 20,
    right: isFolded ? width - 8 : width - figuresWide - 24,
    top,
    bottom: top + fits.length * rowHeight,
  };
  const count = Math.max(2, Math.round((plot.right - plot.left) / 100));
  const seen = fits.flatMap(({ standing }) =>
    standing === null ? [] : [standing.estimate, standing.low, standing.high],
  );
  const scale = snugScale([0, ...seen], [plot.left, plot.right]);
  return {
    width,
    upright: isFolded
      ? fits.map((_, place) => ({
          from: top + place * rowHeight + 38,
          to: top + place * rowHeight + 58,
        }))
      : [{ from: top - 4, to: plot.bottom }],
    height: plot.bottom + 6,
    plot,
    ticks: placedTicks(scale, count, formats.tick),
    zeroX: scale(0),
    figuresX: isFolded ? 0 : width,
    rows: fits.map(({ name, standing }, place) => {
      const rowTop = top + place * rowHeight;
      return {
        name,
        label: clippedWords(name, nameWidth + 2, nameSize),
        isFirst: place === 0,
        textY: rowTop + 18,
        figuresY: isFolded ? rowTop + 34 : rowTop + 18,
        y: isFolded ? rowTop + 48 : rowTop + 14,
        x: standing === null ? null : scale(standing.estimate),
        interval:
          standing !== null && hasBounds(standing)
            ? { from: scale(standing.low), to: scale(standing.high) }
            : null,
        figures: clippedWords(figures[place], width, nameSize),
      };
    }),
  };
}
