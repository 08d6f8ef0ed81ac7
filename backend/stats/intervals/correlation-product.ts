/**
 * ρ^(year − year before), one a row; the first is 0. Years strictly ascending, gaps allowed.
 *
 * @param year  of all rows; those from `from` to before `to` are one company's.
 * @param target  receives the decays from its place `at` on.
 */
export function fillYearDecays(
  year: Int32Array,
  { from, to, persistence }: CompanySpan,
  target: Float64Array,
  at: number,
): void {
  target[at] = 0;
  for (let row = from + 1; row < to; row += 1) {
    const gap = year[row] - year[row - 1];
    target[at + row - from] = gap === 1 ? persistence : persistence ** gap;
  }
}

export interface CompanySpan {
  readonly from: number;
  readonly to: number;
  readonly persistence: number;
}

/**
 * Multiplies by R = [ρ^|year − year'|] without forming it: one sweep forward, one back.
 *
 * @param values  one a row, in ascending order of the year; the first `count` are used.
 * @param rows  how many, and their decays as `fillYearDecays` writes them.
 * @param target  receives R·values; not the same array as `values`.
 */
export function correlationProduct(
  values: Float64Array,
  { count, decays }: { readonly count: number; readonly decays: Float64Array },
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

/**
 * v'Rv with R = [ρ^|year − year'|], in one sweep.
 *
 * @param values  one a row; the first `years.length` are used.
 * @param years  one company's, strictly ascending.
 */
export function correlatedSquare(
  values: Float64Array,
  years: Int32Array,
  persistence: number,
): number {
  let carried = 0;
  let sum = values[0] * values[0];
  for (let row = 1; row < years.length; row += 1) {
    const gap = years[row] - years[row - 1];
    carried = (carried + values[row - 1]) * (gap === 1 ? persistence : persistence ** gap);
    sum += values[row] * (values[row] + 2 * carried);
  }
  return sum;
}
