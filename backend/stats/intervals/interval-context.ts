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

/** Everything that calibrated intervals of one fit share. */
export interface IntervalContext {
  readonly fit: WithinFit;
  readonly persistence: Persistence;
  readonly confidence: number;
  /** B of intervals. */
  readonly cosines: number;
  /** B of rank sets, pairs and the drift. */
  readonly rankCosines: number;
  /** Null where no contrast of this fit has an interval, for `reason`. */
  readonly forms: CompanyForms | null;
  readonly reason?: string;
}

export function intervalContext(fit: WithinFit, confidence: number): IntervalContext {
  const persistence = persistenceOf(fit.sample, fit.residuals);
  const reason = fitIntervalReason(fit, persistence);
  const years = fit.sample.years.length;
  const cosines = intervalCosines(years);
  const forRanks = rankCosines(years);
  const forms =
    reason === undefined ? companyForms(fit, persistence.used, Math.max(cosines, forRanks)) : null;
  return { fit, persistence, confidence, cosines, rankCosines: forRanks, forms, reason };
}

/** Standard error of a contrast with B cosines, or why it has none. */
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
