/** Rows from … to − 1. */
export interface RowRange {
  readonly from: number;
  readonly to: number;
}

/** Σ left·right over a range of rows. Four sums run side by side, for one waits for its last addition. */
export function productOverRows(
  left: Float64Array,
  right: Float64Array,
  { from, to }: RowRange,
): number {
  let first = 0;
  let second = 0;
  let third = 0;
  let fourth = 0;
  let row = from;
  for (; row + 3 < to; row += 4) {
    first += left[row] * right[row];
    second += left[row + 1] * right[row + 1];
    third += left[row + 2] * right[row + 2];
    fourth += left[row + 3] * right[row + 3];
  }
  for (; row < to; row += 1) first += left[row] * right[row];
  return first + second + (third + fourth);
}

/** target += Σ weight·column over a range of rows, two columns at a time. */
export function addOverRows(
  target: Float64Array,
  columns: readonly Float64Array[],
  weights: ArrayLike<number>,
  { from, to }: RowRange,
): void {
  let k = 0;
  for (; k + 1 < columns.length; k += 2) {
    const [left, right] = [columns[k], columns[k + 1]];
    const [leftWeight, rightWeight] = [weights[k], weights[k + 1]];
    for (let row = from; row < to; row += 1) {
      target[row] += leftWeight * left[row] + rightWeight * right[row];
    }
  }
  if (k === columns.length) return;
  const last = columns[k];
  const weight = weights[k];
  for (let row = from; row < to; row += 1) target[row] += weight * last[row];
}
