import type { RowRange } from '../linear-algebra/row-range';

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
  if (year[to - 1] - year[from] === to - 1 - from) {
    target.fill(persistence, at + 1, at + to - from);
    return;
  }
  for (let row = from + 1; row < to; row += 1) {
    const gap = year[row] - year[row - 1];
    target[at + row - from] = gap === 1 ? persistence : persistence ** gap;
  }
}

export interface CompanySpan extends RowRange {
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
 * v'Rv with R = [ρ^|year − year'|], in one sweep; v are the values less `centre`. Rows of several companies give the sum
 * of their forms, for the decay of a first row is 0.
 *
 * @param values  one a row, in ascending order of a company's years; those from `from` to before `to` are used.
 * @param rows  their decays as `fillYearDecays` writes them, at the same places.
 */
export function correlatedSquare(
  values: Float64Array,
  { from, to, decays, centre }: CorrelatedRows,
): number {
  let before = 0;
  let carried = 0;
  let sum = 0;
  for (let row = from; row < to; row += 1) {
    const value = values[row] - centre;
    carried = (carried + before) * decays[row];
    sum += value * (value + 2 * carried);
    before = value;
  }
  return sum;
}

export interface CorrelatedRows extends RowRange {
  readonly decays: Float64Array;
  readonly centre: number;
}
