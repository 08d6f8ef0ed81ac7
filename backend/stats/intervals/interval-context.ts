import { type IntervalEstimate, withoutInterval } from '../prediction';
import type { WithinFit } from '../regression/within-fit';
import {
  type CalibratedError,
  calibratedError,
  calibratedInterval,
  noCalibrationReason,
} from './calibrated-interval';
import { type CompanyForms, companyForms } from './company-forms';
import type { Contrast } from './contrast';
import { intervalCosines, rankCosines } from './cosine-weights';
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
  /** Computed when first asked for; null where no contrast of this fit has an interval, for `reason`. */
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
        forms ??= companyForms(fit, persistence.used, Math.max(cosines, forRanks));
      }
      return forms;
    },
  };
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
  return calibratedError(context.forms, contrast, cosines);
}

/** Standard error of a contrast that stands alone, straight through the rows, or why it has none. */
export function aloneError(context: IntervalContext, contrast: Contrast): CalibratedError {
  const { fit, persistence, cosines } = context;
  const reason = context.reason ?? contrastIntervalReason(fit, contrast);
  return reason === undefined
    ? singleContrastError(fit, contrast, persistence.used, cosines)
    : { standardError: null, calibration: null, reason };
}

/** Interval of a contrast with B cosines, or why it has none. */
export function contrastInterval(
  context: IntervalContext,
  estimate: number,
  contrast: Contrast,
  cosines: number,
): IntervalEstimate {
  const error = contrastError(context, contrast, cosines);
  return error.standardError === null
    ? withoutInterval(estimate, error.reason)
    : calibratedInterval(estimate, error, { cosines, confidence: context.confidence });
}
