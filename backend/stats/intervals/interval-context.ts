import type { IntervalEstimate } from '../prediction';
import type { WithinFit } from '../regression/within-fit';
import {
  type CalibratedError,
  calibratedError,
  calibratedInterval,
  noCalibrationReason,
} from './calibrated-interval';
import { type CompanyForms, companyForms } from './company-forms';
import type { Contrast } from './contrast';
import { calendar, contrastCosines, ownClock } from './contrast-clock';
import { cosineWeights, intervalCosines, rankCosines } from './cosine-weights';
import { contrastIntervalReason, fitIntervalReason } from './interval-reasons';
import { type Persistence, persistenceOf } from './persistence';
import { singleContrastError } from './single-contrast';

/** Everything that calibrated intervals of one fit share. */
export interface IntervalContext {
  readonly fit: WithinFit;
  readonly persistence: Persistence;
  readonly confidence: number;
  /** B of intervals. */
  readonly cosines: number;
  /** B of rank sets, pairs and the drift. */
  readonly rankCosines: number;
  /** By the calendar. Computed when first asked for; null where no contrast of this fit has an interval, for `reason`. */
  readonly forms: CompanyForms | null;
  readonly reason?: string;
}

export function intervalContext(fit: WithinFit, confidence: number): IntervalContext {
  const persistence = persistenceOf(fit.sample, fit.residuals);
  const reason = fitIntervalReason(fit, persistence);
  const years = fit.sample.years.length;
  const cosines = intervalCosines(years);
  const forRanks = rankCosines(years);
  let forms: CompanyForms | null = null;
  return {
    fit,
    persistence,
    confidence,
    cosines,
    rankCosines: forRanks,
    reason,
    get forms() {
      if (reason === undefined) {
        const weights = cosineWeights(calendar(years), Math.max(cosines, forRanks));
        forms ??= companyForms(fit, persistence.used, weights);
      }
      return forms;
    },
  };
}

/**
 * Forms of all contrasts that weigh the same companies in the same proportions as this one, and whatever else by its
 * clock; B with them.
 */
export function formsFor(
  context: IntervalContext,
  contrast: Contrast,
): { readonly forms: CompanyForms | null; readonly cosines: number } {
  const { fit, persistence, cosines } = context;
  if (context.reason !== undefined || ownClock(fit.sample, contrast) === null) {
    return { forms: context.forms, cosines };
  }
  const weights = contrastCosines(fit.sample, contrast, cosines);
  return { forms: companyForms(fit, persistence.used, weights), cosines: weights.length };
}

/** Standard error of one contrast among many with B cosines, or why it has none. */
export function contrastError(
  context: IntervalContext,
  contrast: Contrast,
  cosines: number,
): CalibratedError {
  const reason = context.reason ?? contrastIntervalReason(context.fit, contrast);
  if (context.forms === null || reason !== undefined) {
    return { standardError: null, calibration: null, reason: reason ?? noCalibrationReason };
  }
  return ownClock(context.fit.sample, contrast) === null
    ? calibratedError(context.forms, contrast, cosines)
    : errorThroughRows(context, contrast, cosines);
}

/** Standard error of a contrast that stands alone, straight through the rows, or why it has none. */
export function aloneError(context: IntervalContext, contrast: Contrast): CalibratedError {
  const reason = context.reason ?? contrastIntervalReason(context.fit, contrast);
  return reason === undefined
    ? errorThroughRows(context, contrast, context.cosines)
    : { standardError: null, calibration: null, reason };
}

function errorThroughRows(
  { fit, persistence }: IntervalContext,
  contrast: Contrast,
  cosines: number,
): CalibratedError {
  const weights = contrastCosines(fit.sample, contrast, cosines);
  return singleContrastError(fit, contrast, persistence.used, weights);
}

/** Interval of a contrast with B cosines, or why it has none. */
export function contrastInterval(
  context: IntervalContext,
  estimate: number,
  contrast: Contrast,
  cosines: number,
): IntervalEstimate {
  const error = contrastError(context, contrast, cosines);
  return calibratedInterval(estimate, error, context.confidence);
}
