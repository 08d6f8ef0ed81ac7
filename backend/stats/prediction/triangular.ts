/** What an uncertain input may be: its least, its likeliest and its largest value. */
export interface Triangle {
  readonly low: number;
  readonly likely: number;
  readonly high: number;
}

/**
 * The value of the triangular distribution below which the given share lies; its mean is (low + likely + high)/3, its
 * variance (low² + likely² + high² − low·likely − low·high − likely·high)/18.
 *
 * @param triangle  low ≤ likely ≤ high; a point where all are equal.
 * @param share  from 0 to 1.
 * @see Johnson, Kotz & Balakrishnan (1995), Continuous Univariate Distributions 2, 2nd ed., §26.9.
 */
export function triangularQuantile({ low, likely, high }: Triangle, share: number): number {
  const width = high - low;
  if (width === 0) return likely;
  const rise = (likely - low) / width;
  return share < rise
    ? low + width * Math.sqrt(share * rise)
    : high - width * Math.sqrt((1 - share) * (1 - rise));
}
