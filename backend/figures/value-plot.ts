import { type ScaleLinear, max } from 'd3';
import type { PlacedText, PlacedTick, Plot } from './figure-types';
import { figuresWidth } from './text-width';
import { placedTicks, snugScale } from './value-axis';

/** One value against another: the plot, its two scales and their marks. */
export interface ValuePlot {
  readonly height: number;
  readonly plot: Plot;
  readonly x: ScaleLinear<number, number>;
  readonly y: ScaleLinear<number, number>;
  readonly xTicks: readonly PlacedTick[];
  readonly yTicks: readonly PlacedTick[];
  /** Name of the upright axis, over its figures. */
  readonly yTitle: PlacedText;
  /** Name of the level axis, under its figures. */
  readonly xTitle: PlacedText;
}

/** What an axis shows and how it is written. */
export interface ValueAxis {
  readonly values: readonly number[];
  /** With its unit: `capex, EUR m`. */
  readonly title: string;
  readonly tick: (value: number, step: number) => string;
}

const top = 32;
const foot = 44;
/** Share of each span left free at its ends, so that no mark is cut. */
const margin = 0.04;

/**
 * The same proportions for every chart of one value against another: lower as there is less room, never a letter box.
 *
 * @param size.right  room kept free right of the plot, CSS pixels, for names.
 */
export function valuePlot(
  across: ValueAxis,
  up: ValueAxis,
  size: { readonly width: number; readonly right: number },
): ValuePlot {
  const { width } = size;
  const height = Math.round(Math.min(460, Math.max(300, width * 0.56)));
  const bottom = height - foot;
  const rows = Math.max(3, Math.round((bottom - top) / 56));
  const y = snugScale(up.values, [bottom, top], margin);
  const yTicks = placedTicks(y, rows, up.tick);
  const left = (max(yTicks, (tick) => figuresWidth(tick.label)) ?? 0) + 16;
  const plot: Plot = { left, right: Math.max(left + 40, width - size.right), top, bottom };
  const columns = Math.max(3, Math.round((plot.right - plot.left) / 100));
  const x = snugScale(across.values, [plot.left, plot.right], margin);
  return {
    height,
    plot,
    x,
    y,
    xTicks: placedTicks(x, columns, across.tick),
    yTicks,
    yTitle: { text: up.title, x: 0, y: 14, anchor: 'start' },
    xTitle: { text: across.title, x: plot.right, y: height - 6, anchor: 'end' },
  };
}
