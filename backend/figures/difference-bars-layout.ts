import { max } from 'd3';
import { type FigureFormats, type IntervalFigure, type Stretch, hasBounds } from './figure-types';
import { clippedWords, figuresWidth, wordsWidth } from './text-width';
import { snugScale } from './value-axis';

export interface DifferenceBar {
  readonly name: string;
  readonly label: string;
  readonly value: string;
  readonly bounds: string;
  readonly isTotal: boolean;
  readonly y: number;
  readonly textY: number;
  /** The bar, left to right. */
  readonly x: number;
  readonly width: number;
  /** Where the sum stands after this bar: the next one starts there. */
  readonly sumX: number;
  readonly interval: Stretch | null;
}

export interface DifferenceBarsLayout {
  readonly width: number;
  readonly height: number;
  readonly barHeight: number;
  readonly zeroX: number;
  /** Stretches of the zero line, top to bottom: broken where names would cross it. */
  readonly zeroLine: readonly Stretch[];
  readonly valueX: number;
  readonly ruleY: number;
  readonly bars: readonly DifferenceBar[];
}

export interface DifferenceData {
  /** What each regressor adds. */
  readonly terms: readonly (IntervalFigure & { readonly name: string })[];
  /** What they come to together, with its own interval: intervals do not add up as values do. */
  readonly total: IntervalFigure;
}

const nameSize = 13;
const barHeight = 14;

/** A difference taken apart: each bar starts where the sum of those above it ends; the total starts at zero. */
export function differenceBarsLayout(
  { terms, total }: DifferenceData,
  width: number,
  formats: FigureFormats,
): DifferenceBarsLayout {
  const signed = (value: number) => (value > 0 ? '+' : '') + formats.value(value);
  const items = [
    ...terms.map((term) => ({ ...term, isTotal: false })),
    { ...total, name: 'Together', isTotal: true },
  ];
  const valueWidth = max(items, (item) => figuresWidth(signed(item.estimate), 13)) ?? 0;
  const longestName = max(items, (item) => wordsWidth(item.name, nameSize)) ?? 0;
  const isFolded = width < 480;
  const nameWidth = isFolded ? width - valueWidth - 16 : Math.min(longestName, width * 0.36);
  const range: [number, number] = isFolded
    ? [2, width - 8]
    : [nameWidth + 16, width - valueWidth - 20];

  let sum = 0;
  const spans = items.map((item) => {
    const from = item.isTotal ? 0 : sum;
    const to = from + item.estimate;
    if (!item.isTotal) sum = to;
    return { from, to };
  });
  const ends = spans.flatMap(({ from, to }) => [from, to]);
  const scale = snugScale([0, ...ends, total.low, total.high], range, 0);

  const rowHeight = isFolded ? 46 : 28;
  const ruleGap = 8;
  const bars = items.map((item, place): DifferenceBar => {
    const { from, to } = spans[place];
    const top = place * rowHeight + (item.isTotal ? ruleGap : 0);
    const textY = isFolded ? top + 16 : top + rowHeight / 2 + 4;
    return {
      name: item.name,
      label: clippedWords(item.name, nameWidth, nameSize),
      value: signed(item.estimate),
      bounds: formats.bounds(item),
      isTotal: item.isTotal,
      y: isFolded ? top + 24 : top + (rowHeight - barHeight) / 2,
      textY,
      x: Math.min(scale(from), scale(to)),
      width: Math.abs(scale(to) - scale(from)),
      sumX: scale(to),
      interval:
        item.isTotal && hasBounds(item) ? { from: scale(item.low), to: scale(item.high) } : null,
    };
  });
  const besideBars = bars.map(({ y }) => ({ from: y - 3, to: y + barHeight + 3 }));
  return {
    width,
    zeroLine: isFolded
      ? besideBars
      : [{ from: besideBars[0].from - 4, to: besideBars[besideBars.length - 1].to + 4 }],
    height: items.length * rowHeight + ruleGap + 4,
    barHeight,
    zeroX: scale(0),
    valueX: width,
    ruleY: terms.length * rowHeight + ruleGap / 2,
    bars,
  };
}
