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
  const finite = values.filter(
    (value): value is number => typeof value === 'number' && Number.isFinite(value),
  );
  const [low = 0, high = 0] = extent(finite);
  const half = low === high ? Math.max(Math.abs(low) * 0.1, low === 0 ? 1 : 0) : 0;
  return scaleLinear()
    .domain([low - half, high + half])
    .range(range)
    .nice(Math.max(1, ticks));
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
