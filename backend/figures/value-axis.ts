import { type ScaleLinear, extent, scaleLinear, tickStep } from 'd3';
import type { PlacedTick } from './figure-types';

/**
 * A linear scale over everything that has to be seen, widened to round numbers. Values that are null or not finite
 * are left out; where all are equal, or there are none, the domain opens around them, so that a mark has a place.
 */
export function valueScale(
  values: readonly (number | null | undefined)[],
  range: readonly [number, number],
  ticks: number,
): ScaleLinear<number, number> {
  return snugScale(values, range, 0).nice(Math.max(1, ticks));
}

/** The same, not widened to round numbers but by a share of its span: for scales that need no label at their ends. */
export function snugScale(
  values: readonly (number | null | undefined)[],
  range: readonly [number, number],
  margin = 0.02,
): ScaleLinear<number, number> {
  const finite = values.filter(
    (value): value is number => typeof value === 'number' && Number.isFinite(value),
  );
  const [low = 0, high = 0] = extent(finite);
  const aroundEqual = low === 0 ? 1 : Math.abs(low) * 0.1;
  const more = low === high ? aroundEqual : (high - low) * margin;
  return scaleLinear()
    .domain([low - more, high + more])
    .range(range);
}

/** About `count` round values of the scale, each with its place and its text. */
export function placedTicks(
  scale: ScaleLinear<number, number>,
  count: number,
  tick: (value: number, step: number) => string,
): PlacedTick[] {
  const [low, high] = scale.domain();
  const step = tickStep(low, high, Math.max(1, count));
  return scale.ticks(Math.max(1, count)).map((value) => ({
    value,
    position: scale(value),
    label: tick(value, step),
  }));
}
