import { type ScaleLinear, extent, scaleLinear } from 'd3';
import type { PlacedTick } from './figure-types';

const steps = [1, 2, 3, 5, 10, 20, 50];
const labelWidth = 44;

/** Years from left to right; a single year stands in the middle. */
export function yearScale(
  years: readonly number[],
  range: readonly [number, number],
): ScaleLinear<number, number> {
  const [first = 0, last = 0] = extent(years);
  return scaleLinear()
    .domain(first === last ? [first - 1, last + 1] : [first, last])
    .range(range);
}

/**
 * Labels of as many years as stand apart, without thousands separators. `anchor` always has one: the last year, or
 * the last year that has happened.
 */
export function placedYears(
  years: readonly number[],
  scale: ScaleLinear<number, number>,
  anchor = Math.max(...years),
): PlacedTick[] {
  const aYear = Math.abs(scale(1) - scale(0));
  const step = steps.find((candidate) => candidate * aYear >= labelWidth) ?? steps.length * 20;
  return years
    .filter((year) => (anchor - year) % step === 0)
    .map((year) => ({ value: year, position: scale(year), label: String(year) }));
}
