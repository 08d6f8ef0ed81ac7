import type { IntervalEstimate } from './interval-estimate';

export const beyondNumbersReason = 'Out of logs this lies beyond what a number can hold.';

/** An interval of logs in another measure; what a double cannot hold is null, with the reason. */
export interface OutOfLogs {
  readonly estimate: number | null;
  readonly low: number | null;
  readonly high: number | null;
  /** Why a bound, or the estimate itself, is null. */
  readonly intervalReason?: string;
}

/** A number that a double holds; null beyond. */
export function heldNumber(value: number): number | null {
  return Number.isFinite(value) ? value : null;
}

/**
 * An interval of logs, estimate and end by end.
 *
 * @param measure  of a log, rising: exp for a factor or an amount.
 */
export function outOfLogs(
  { estimate, low, high, intervalReason }: IntervalEstimate,
  measure: (log: number) => number,
): OutOfLogs {
  const held = (value: number | null): number | null =>
    value === null ? null : heldNumber(measure(value));
  const found = { estimate: held(estimate), low: held(low), high: held(high) };
  const isBeyond =
    found.estimate === null ||
    (low !== null && found.low === null) ||
    (high !== null && found.high === null);
  const reason = intervalReason ?? (isBeyond ? beyondNumbersReason : undefined);
  return reason === undefined ? found : { ...found, intervalReason: reason };
}

/** A difference of logs as the factor it multiplies by: exp of the estimate and its ends. */
export function asFactor(inLogs: IntervalEstimate): OutOfLogs & { readonly standardError: null } {
  return { ...outOfLogs(inLogs, Math.exp), standardError: null };
}
