/** A company's years as far as the working correlation goes. */
export interface CorrelatedRows {
  readonly count: number;
  /** From `yearDecays`. */
  readonly decays: Float64Array;
}

/** ρ^(year − year before), one a row; the first is 0. Years strictly ascending, gaps allowed. */
export function yearDecays(year: Int32Array, persistence: number): Float64Array {
  const decays = new Float64Array(year.length);
  for (let row = 1; row < year.length; row += 1) {
    const gap = year[row] - year[row - 1];
    decays[row] = gap === 1 ? persistence : persistence ** gap;
  }
  return decays;
}

/**
 * Multiplies by R = [ρ^|year − year'|] without forming it: one sweep forward, one back.
 *
 * @param values  one a row, in ascending order of the year; the first `count` are used.
 * @param target  receives R·values; not the same array as `values`.
 */
export function correlationProduct(
  values: Float64Array,
  { count, decays }: CorrelatedRows,
  target: Float64Array,
): void {
  let carried = 0;
  for (let row = 0; row < count; row += 1) {
    carried = carried * decays[row] + values[row];
    target[row] = carried;
  }
  carried = 0;
  for (let row = count - 2; row >= 0; row -= 1) {
    carried = (carried + values[row + 1]) * decays[row + 1];
    target[row] += carried;
  }
}

/** v'Rv in one sweep; arguments as for `correlationProduct`. */
export function correlationForm(values: Float64Array, { count, decays }: CorrelatedRows): number {
  let carried = 0;
  let sum = 0;
  for (let row = 0; row < count; row += 1) {
    const value = values[row];
    sum += value * (value + 2 * carried * decays[row]);
    carried = carried * decays[row] + value;
  }
  return sum;
}
