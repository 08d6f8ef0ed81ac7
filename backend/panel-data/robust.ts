/** The middle of the numbers, the mean of the two middle ones where their count is even; NaN for none. */
export function median(values: readonly number[]): number {
  if (values.length === 0) return NaN;
  const sorted = Float64Array.from(values).sort();
  const half = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[half] : (sorted[half - 1] + sorted[half]) / 2;
}

/** Makes the median absolute deviation of normal data estimate their standard deviation: 1 / Φ⁻¹(3/4). */
const normalConsistency = 1.4826;

/** Median and 1.4826 times the median absolute deviation from it (Hampel 1974). */
export function medianAndSpread(values: readonly number[]): {
  readonly median: number;
  readonly spread: number;
} {
  const middle = median(values);
  const spread = normalConsistency * median(values.map((value) => Math.abs(value - middle)));
  return { median: middle, spread };
}

/** Beyond this modified z a value is an outlier (Iglewicz & Hoaglin 1993). */
export const outlierScore = 3.5;
