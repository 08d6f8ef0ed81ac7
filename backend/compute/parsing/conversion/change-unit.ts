/**
 * Multiplies by a power of ten, in place. A smaller figure comes from a division, which has one rounding; a factor such
 * as 0.001 would have two.
 */
export function changeUnit(values: Float64Array, powerOfTen: number): void {
  if (powerOfTen === 0) return;
  const factor = 10 ** Math.abs(powerOfTen);
  for (let row = 0; row < values.length; row++) {
    values[row] = powerOfTen > 0 ? values[row] * factor : values[row] / factor;
  }
}
