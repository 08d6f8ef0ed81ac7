/** An estimate with its interval; bounds are null with `intervalReason` where no honest interval exists. */
export interface IntervalEstimate {
  readonly estimate: number;
  readonly standardError: number | null;
  readonly low: number | null;
  readonly high: number | null;
  readonly intervalReason?: string;
}

/** An estimate that has no interval, and why. */
export function withoutInterval(estimate: number, intervalReason: string): IntervalEstimate {
  return { estimate, standardError: null, low: null, high: null, intervalReason };
}

const endsReason = 'The ends of its interval lie beyond what a number can hold.';

/** estimate ± quantile · standard error; without an interval where a double cannot hold the ends. */
export function symmetricInterval(
  estimate: number,
  standardError: number,
  quantile: number,
): IntervalEstimate {
  const reach = quantile * standardError;
  const low = estimate - reach;
  const high = estimate + reach;
  return Number.isFinite(low) && Number.isFinite(high)
    ? { estimate, standardError, low, high }
    : withoutInterval(estimate, endsReason);
}
