/**
 * Numbers rounded to so many digits after the point in such a way that they add up to their rounded sum: those that
 * rounding down costs the most are rounded up (largest remainders). Each is less than one unit of the last digit off.
 */
export function addingUp(values: readonly number[], digits: number): readonly number[] {
  const scale = 10 ** digits;
  const exact = values.map((value) => value * scale);
  const whole = exact.map(Math.floor);
  const total = Math.round(exact.reduce((sum, value) => sum + value, 0));
  const short = total - whole.reduce((sum, value) => sum + value, 0);
  const order = exact
    .map((_, place) => place)
    .sort((a, b) => exact[b] - whole[b] - (exact[a] - whole[a]));
  const up = new Set(order.slice(0, short));
  return whole.map((value, place) => (value + (up.has(place) ? 1 : 0)) / scale);
}
