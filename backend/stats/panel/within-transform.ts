/** A column without its companies' means. Means are kept as distances from `origin`, so that large figures keep digits. */
export interface WithinColumn {
  readonly values: Float64Array;
  readonly origin: number;
  /** Company mean minus `origin`, one a company. */
  readonly means: Float64Array;
  /** Σ of `means`. */
  readonly meansTotal: number;
  /** Mean over all rows minus `origin`. */
  readonly grandMean: number;
  /** Σ of the squares of `values`. */
  readonly squares: number;
  /** Σ of the squares of the column as it was. */
  readonly rawSquares: number;
}

/**
 * Subtracts each company's mean from its rows (the within transformation): x̃ᵢₜ = xᵢₜ − x̄ᵢ. Each company's first value
 * is taken off before anything is summed, so that a common level costs no digits, and a constant becomes exactly zero.
 *
 * @param column  one value a row, rows of a company next to each other; left unchanged.
 * @param starts  company i holds rows starts[i] … starts[i + 1] − 1.
 * @see Wooldridge (2010), Econometric Analysis of Cross Section and Panel Data, 2nd ed., §10.5.
 */
export function withinTransform(column: Float64Array, starts: Int32Array): WithinColumn {
  const companies = starts.length - 1;
  const values = new Float64Array(column.length);
  const means = new Float64Array(companies);
  const origin = column[0];
  let meansTotal = 0;
  let total = 0;
  let squares = 0;
  let rawSquares = 0;
  for (let company = 0; company < companies; company += 1) {
    const from = starts[company];
    const to = starts[company + 1];
    const first = column[from];
    let sum = 0;
    for (let row = from; row < to; row += 1) {
      const raw = column[row];
      values[row] = raw - first;
      sum += raw - first;
      rawSquares += raw * raw;
    }
    const mean = sum / (to - from);
    let rest = 0;
    for (let row = from; row < to; row += 1) rest += values[row] - mean;
    // The mean of what is left: the rounding of the first one.
    const correction = rest / (to - from);
    for (let row = from; row < to; row += 1) {
      const value = values[row] - mean - correction;
      values[row] = value;
      squares += value * value;
    }
    means[company] = first - origin + (mean + correction);
    meansTotal += means[company];
    total += (to - from) * means[company];
  }
  const grandMean = total / column.length;
  return { values, origin, means, meansTotal, grandMean, squares, rawSquares };
}
