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

/** A difference of logs as the factor it multiplies by: exp of the estimate and its ends. */
export function asFactor(inLogs: IntervalEstimate): IntervalEstimate {
  const factor = (value: number | null): number | null => (value === null ? null : Math.exp(value));
  return {
    ...inLogs,
    estimate: Math.exp(inLogs.estimate),
    standardError: null,
    low: factor(inLogs.low),
    high: factor(inLogs.high),
  };
}
