/** ρ^(year − year before), one a row; the first is 0. Years strictly ascending, gaps allowed. */
export function yearDecays(year: Int32Array, persistence: number): Float64Array {
  return Float64Array.from(year, (value, row) =>
    row === 0 ? 0 : persistence ** (value - year[row - 1]),
  );
}

/**
 * Multiplies by R = [ρ^|year − year'|] without forming it: one sweep forward, one back.
 *
 * @param values  one a row, in ascending order of the year.
 * @param decays  from `yearDecays`.
 * @param target  receives R·values; not the same array as `values`.
 */
export function correlationProduct(
  values: Float64Array,
  decays: Float64Array,
  target: Float64Array,
): void {
  const rows = values.length;
  let carried = 0;
  for (let row = 0; row < rows; row += 1) {
    carried = carried * decays[row] + values[row];
    target[row] = carried;
  }
  carried = 0;
  for (let row = rows - 2; row >= 0; row -= 1) {
    carried = (carried + values[row + 1]) * decays[row + 1];
    target[row] += carried;
  }
}
