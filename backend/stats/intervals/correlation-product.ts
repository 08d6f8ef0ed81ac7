/**
 * Multiplies by R = [ρ^|year − year'|] without forming it: one sweep forward, one back.
 *
 * @param values  one a row, in ascending order of `year`.
 * @param year  calendar years, strictly ascending; gaps are allowed.
 * @param target  receives R·values; not the same array as `values`.
 */
export function correlationProduct(
  values: Float64Array,
  year: Int32Array,
  persistence: number,
  target: Float64Array,
): void {
  const rows = values.length;
  let carried = 0;
  for (let row = 0; row < rows; row += 1) {
    if (row > 0) carried *= persistence ** (year[row] - year[row - 1]);
    carried += values[row];
    target[row] = carried;
  }
  carried = 0;
  for (let row = rows - 2; row >= 0; row -= 1) {
    carried = (carried + values[row + 1]) * persistence ** (year[row + 1] - year[row]);
    target[row] += carried;
  }
}
