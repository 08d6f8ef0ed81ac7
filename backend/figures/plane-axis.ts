import { type ScaleLinear, ticks } from 'd3';
import type { PlacedTick } from './figure-types';
import { figuresWidth } from './text-width';
import { placedTicks, snugScale } from './value-axis';

/** A scale of values on one axis, with its marks. */
export interface PlaneAxis {
  readonly place: (value: number) => number;
  readonly ticks: readonly PlacedTick[];
}

export interface PlaneAxisWords {
  /** With its unit: `market value, EUR m`. */
  readonly title: string;
  /** Equal ratios take equal room; only values above 0 have a place. */
  readonly isLog: boolean;
  /** A mark of the axis; `step` is the distance to the next, or on a logarithmic one the value itself. */
  readonly tick: (value: number, step: number) => string;
}

/** Share of the span left free at its ends, so that no mark is cut. */
const margin = 0.04;

/** An axis over everything that has to be seen, linear or logarithmic, with about `count` marks. */
export function planeAxis(
  values: readonly number[],
  words: Pick<PlaneAxisWords, 'isLog' | 'tick'>,
  range: readonly [number, number],
  count: number,
): PlaneAxis {
  if (!words.isLog) {
    const scale = snugScale(values, range, margin);
    return { place: scale, ticks: placedTicks(scale, count, words.tick) };
  }
  const exponents = snugScale(values.map(Math.log10), range, margin);
  const place = (value: number): number => exponents(Math.log10(value));
  const marks = roundValues(exponents, count).map((value) => ({
    value,
    position: place(value),
    label: words.tick(value, value),
  }));
  return { place, ticks: apart(marks, range[0] < range[1]) };
}

const figureHeight = 16;

/** The marks whose figures do not run into those before them: linear values crowd towards a logarithmic axis' end. */
function apart(marks: readonly PlacedTick[], isLevel: boolean): PlacedTick[] {
  const kept: PlacedTick[] = [];
  for (const mark of marks) {
    const before = kept.at(-1);
    const room = (tick: PlacedTick) => (isLevel ? figuresWidth(tick.label) + 8 : figureHeight) / 2;
    if (
      before === undefined ||
      Math.abs(mark.position - before.position) >= room(mark) + room(before)
    )
      kept.push(mark);
  }
  return kept;
}

/** Powers of ten, with 2 and 5 times them where there is room; linear marks where the span is less than a power. */
function roundValues(exponents: ScaleLinear<number, number>, count: number): number[] {
  const [low, high] = exponents.domain();
  const within = (value: number): boolean => {
    const exponent = Math.log10(value);
    return exponent >= low && exponent <= high;
  };
  const decades = Array.from(
    { length: Math.max(0, Math.floor(high) - Math.floor(low) + 1) },
    (_, place) => 10 ** (Math.floor(low) + place),
  );
  for (const multiples of [[1, 2, 5], [1, 3], [1]]) {
    const values = decades.flatMap((decade) => multiples.map((multiple) => multiple * decade));
    const seen = values.filter(within);
    if (seen.length <= count * 1.3 && seen.length > 2) return seen;
  }
  const powers = decades.filter(within);
  if (powers.length > count) {
    const every = Math.ceil(powers.length / count);
    return powers.filter((_, place) => place % every === 0);
  }
  return ticks(10 ** low, 10 ** high, count).filter(within);
}
