import { descending, max } from 'd3';
import {
  type FigureFormats,
  type IntervalFigure,
  type PlacedText,
  type PlacedTick,
  type Plot,
  type Stretch,
  hasBounds,
} from './figure-types';
import { clippedWords, figuresWidth, wordsWidth } from './text-width';
import { placedTicks, snugScale } from './value-axis';

export interface StandingChartData {
  /** Company intercepts with their intervals, any order. */
  readonly intercepts: readonly (IntervalFigure & { readonly company: string })[];
  readonly ownCompany: string;
  /** Mean of the peers' intercepts; null draws no line. */
  readonly meanOfPeers: number | null;
}

export interface StandingRow {
  readonly company: string;
  readonly isOwn: boolean;
  /** The name as it fits into its column. */
  readonly name: string;
  /** Whether there is room for its name and figures without being asked. */
  readonly isLabelled: boolean;
  readonly y: number;
  readonly x: number;
  readonly interval: Stretch | null;
  readonly value: string;
  readonly bounds: string;
}

export interface StandingChartLayout {
  readonly width: number;
  readonly height: number;
  readonly plot: Plot;
  readonly rowHeight: number;
  readonly markRadius: number;
  readonly nameX: number;
  readonly ticks: readonly PlacedTick[];
  readonly zeroX: number;
  readonly mean: { readonly x: number; readonly label: PlacedText } | null;
  /** Right edges of the columns of figures; null where there is no room for one. */
  readonly valueX: number | null;
  readonly boundsX: number | null;
  /** Baseline of the line under the chart that says in full what the columns have no room for; null where they have. */
  readonly readoutY: number | null;
  /** From highest to lowest estimate. */
  readonly rows: readonly StandingRow[];
}

const nameSize = 13;
const top = 28;
const meanSpace = 24;

/** Rows get lower as there are more, down to a mark's own height: 120 companies stay one picture. */
function heightOfRows(count: number): number {
  if (count <= 16) return 28;
  if (count <= 32) return 22;
  return count <= 60 ? 16 : 7;
}

/** Where each company stands: one row a company, mark and interval on one scale, figures at the right. */
export function standingChartLayout(
  data: StandingChartData,
  width: number,
  formats: FigureFormats,
): StandingChartLayout {
  const { ownCompany, meanOfPeers } = data;
  const sorted = [...data.intercepts].sort((a, b) => descending(a.estimate, b.estimate));
  const rowHeight = heightOfRows(sorted.length);
  const isRoomy = rowHeight >= 16;
  const texts = sorted.map((row) => ({
    value: formats.value(row.estimate),
    bounds: formats.bounds(row),
  }));

  const valueWidth = max(texts, (text) => figuresWidth(text.value)) ?? 0;
  const boundsWidth = max(texts, (text) => figuresWidth(text.bounds)) ?? 0;
  const longestName = max(sorted, (row) => wordsWidth(row.company, nameSize)) ?? 0;
  const nameWidth = Math.min(longestName, width * 0.28);
  const left = nameWidth + 20;
  const leastPlot = 220;
  const hasValue = width - left - valueWidth - 28 >= leastPlot;
  const hasBoundsColumn = hasValue && width - left - valueWidth - boundsWidth - 52 >= leastPlot;
  const boundsX = hasBoundsColumn ? width - 8 : null;
  const valueX = hasBoundsColumn ? width - 8 - boundsWidth - 20 : hasValue ? width - 8 : null;
  const plot: Plot = {
    left,
    right: Math.max(left + 40, valueX === null ? width - 12 : valueX - valueWidth - 20),
    top,
    bottom: top + rowHeight * sorted.length,
  };

  const tickCount = Math.max(2, Math.round((plot.right - plot.left) / 110));
  const seen = sorted.flatMap((row) => [row.estimate, row.low, row.high]);
  const scale = snugScale([...seen, 0, meanOfPeers], [plot.left, plot.right]);

  const foot = plot.bottom + (meanOfPeers === null ? 8 : meanSpace);
  return {
    width,
    height: foot + (hasBoundsColumn ? 0 : 24),
    readoutY: hasBoundsColumn ? null : foot + 16,
    plot,
    rowHeight,
    markRadius: isRoomy ? 4.5 : 3,
    nameX: nameWidth + 8,
    ticks: placedTicks(scale, tickCount, formats.tick),
    zeroX: scale(0),
    mean: meanOfPeers === null ? null : meanLine(data, scale(meanOfPeers), plot, width),
    valueX,
    boundsX,
    rows: sorted.map((row, place) => ({
      company: row.company,
      isOwn: row.company === ownCompany,
      name: clippedWords(row.company, nameWidth + 4, nameSize),
      isLabelled: isRoomy || row.company === ownCompany,
      y: plot.top + rowHeight * (place + 0.5),
      x: scale(row.estimate),
      interval: hasBounds(row) ? { from: scale(row.low), to: scale(row.high) } : null,
      ...texts[place],
    })),
  };
}

function meanLine(
  { intercepts, ownCompany }: StandingChartData,
  x: number,
  plot: Plot,
  width: number,
): StandingChartLayout['mean'] {
  const peers = intercepts.filter((row) => row.company !== ownCompany).length;
  const text = peers === 1 ? 'the one peer' : `mean of the ${peers} peers`;
  const half = wordsWidth(text) / 2;
  const labelX = Math.min(Math.max(x, half), Math.max(half, width - half));
  return { x, label: { text, x: labelX, y: plot.bottom + 18, anchor: 'middle' } };
}
