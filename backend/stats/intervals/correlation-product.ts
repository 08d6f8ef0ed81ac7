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

/** The decays of one company's years. */
export function yearDecays(year: Int32Array, persistence: number): Float64Array {
  const decays = new Float64Array(year.length);
  fillYearDecays(year, { from: 0, to: year.length, persistence }, decays, 0);
  return decays;
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

/** v'Rv over all companies in one sweep: a company's first decay is 0, so nothing is carried over from the last one. */
export function correlationForm(values: Float64Array, decays: Float64Array): number {
  let carried = 0;
  let sum = 0;
  for (let row = 0; row < values.length; row += 1) {
    const value = values[row];
    carried *= decays[row];
    sum += value * (value + 2 * carried);
    carried += value;
  }
  return sum;
}
