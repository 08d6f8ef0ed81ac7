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

/** estimate ± quantile · standard error. */
export function symmetricInterval(
  estimate: number,
  standardError: number,
  quantile: number,
): IntervalEstimate {
  const reach = quantile * standardError;
  return { estimate, standardError, low: estimate - reach, high: estimate + reach };
}
