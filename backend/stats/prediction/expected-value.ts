import { basisError } from './basis-error';
import { type IntervalEstimate, symmetricInterval, withoutInterval } from './interval-estimate';
import { inModelScale } from './model-scale';
import { outOfLogs } from './out-of-logs';
import type { Outlook } from './outlook';
import { plannedContrast } from './planned-contrast';
import type { PredictionBasis } from './prediction-basis';

/** An expected value of a log form, each figure under its own name; money but for `inLogs`. */
export interface LogFigures {
  /** Which of the two the estimate is: the median where the gap is carried, for then there is no mean. */
  readonly shown: 'mean' | 'median';
  /** exp(·)·smear; null where the gap is carried. */
  readonly mean: number | null;
  /** exp(·). */
  readonly median: number;
  readonly inLogs: IntervalEstimate;
}

/** In log form `standardError` is null though there is an interval: it lies in `log.inLogs`, in logs. */
export interface ExpectedValue extends IntervalEstimate {
  readonly log?: LogFigures;
}

/**
 * The own company's expected market value at given regressors, with its calibrated interval.
 *
 * @param regressors  planned values, in the order of `basis.regressors` and the panel's measure.
 * @throws {RangeError} for values the model cannot read, a gap that cannot be carried and an estimate that a double
 *   cannot hold; `predict` gives these as reasons instead.
 * @see Duan (1983), JASA 78, 605–610, for the smearing factor, taken as known.
 */
export function expectedValue(
  basis: PredictionBasis,
  regressors: readonly number[],
  outlook: Outlook = {},
): ExpectedValue {
  const expected = heldExpectedValue(basis, regressors, outlook);
  if (expected === null) throw new RangeError(beyondReason);
  return expected;
}

export const beyondReason = 'The expected value is beyond what a number can hold.';

/**
 * The same, null where a double cannot hold the estimate.
 *
 * @throws {RangeError} for values the model cannot read and a gap that cannot be carried.
 */
export function heldExpectedValue(
  basis: PredictionBasis,
  regressors: readonly number[],
  outlook: Outlook,
): ExpectedValue | null {
  const { estimate, weights } = plannedContrast(basis, inModelScale(basis, regressors), outlook);
  if (!Number.isFinite(estimate)) return null;
  const error = basisError(basis, weights);
  const interval =
    error.standardError === null
      ? withoutInterval(estimate, error.reason)
      : symmetricInterval(estimate, error.standardError, basis.quantile);
  return basis.form === 'log' ? fromLogs(basis, interval, outlook) : interval;
}

/** The factor between exp(·) and the estimate that is shown: Duan's for a mean, none for a median. */
export function shownFactor(basis: PredictionBasis, { start }: Outlook): number {
  return start === 'carry-the-gap' ? 1 : (basis.smear ?? 1);
}

function fromLogs(
  basis: PredictionBasis,
  inLogs: IntervalEstimate,
  outlook: Outlook,
): ExpectedValue | null {
  const factor = shownFactor(basis, outlook);
  const isMedian = outlook.start === 'carry-the-gap';
  const { estimate, ...ends } = outOfLogs(inLogs, (log) => Math.exp(log) * factor);
  // The median is no larger than the mean: the smearing factor is 1 or more.
  const median = Math.exp(inLogs.estimate);
  if (estimate === null) return null;
  return {
    estimate,
    standardError: null,
    ...ends,
    log: {
      shown: isMedian ? 'median' : 'mean',
      mean: isMedian ? null : estimate,
      median,
      inLogs,
    },
  };
}
