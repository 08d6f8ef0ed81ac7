import type { WithinFit } from '../regression/within-fit';
import { type CalibratedError, calibratedError, noCalibrationReason } from './calibrated-interval';
import { type CompanyForms, companyForms } from './company-forms';
import { type Contrast, levelContrast } from './contrast';
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

/** Forms on some clock, null where no contrast of the fit has an interval; B with them. */
export interface ClockedForms {
  readonly forms: CompanyForms | null;
  readonly cosines: number;
}

/** Forms of all contrasts that weigh no company but this one, by the clock of its level. */
export function formsOfOwn(context: IntervalContext, own: number): ClockedForms {
  const { fit, cosines } = context;
  return formsByClock(context, levelContrast(fit, own), cosines);
}

/**
 * Forms of the own company's pairs with each peer. Where its level has a clock of its own they share one, that of the
 * average pair: v_t = [own row]/T_own² + mean_j [row of peer j]/T_j². A clock a pair would cost the square of the
 * companies, and between peers that are all there the two are the same.
 */
export function formsOfPairs(context: IntervalContext, own: number): ClockedForms {
  const { fit, rankCosines: cosines } = context;
  const { companies } = fit.sample;
  const level = ownClock(fit.sample, levelContrast(fit, own));
  if (level === null) return { forms: context.forms, cosines };
  const share = Math.sqrt(1 / (companies.length - 1));
  const average: Contrast = {
    companies: companies.map((_, company) => company),
    weights: companies.map((_, company) => (company === own ? 1 : share)),
    slopePart: new Float64Array(fit.columns.length),
  };
  return formsByClock(context, average, Math.min(cosines, level.mostCosines));
}

function formsByClock(context: IntervalContext, contrast: Contrast, cosines: number): ClockedForms {
  const { fit, persistence } = context;
  if (context.reason !== undefined || ownClock(fit.sample, contrast) === null) {
    return { forms: context.forms, cosines };
  }
  const weights = contrastCosines(fit.sample, contrast, cosines);
  return { forms: companyForms(fit, persistence.used, weights), cosines: weights.length };
}

/** Standard error of one contrast among many, or why it has none. */
export function contrastError(
  context: IntervalContext,
  contrast: Contrast,
  { forms, cosines }: ClockedForms,
): CalibratedError {
  const reason = context.reason ?? contrastIntervalReason(context.fit, contrast);
  if (forms === null || reason !== undefined) {
    return { standardError: null, calibration: null, reason: reason ?? noCalibrationReason };
  }
  return calibratedError(forms, contrast, cosines);
}

/** Standard error of a contrast that stands alone, by its own clock and straight through the rows, or why it has none. */
export function aloneError(
  { fit, persistence, cosines, reason: ofFit }: IntervalContext,
  contrast: Contrast,
): CalibratedError {
  const reason = ofFit ?? contrastIntervalReason(fit, contrast);
  if (reason !== undefined) return { standardError: null, calibration: null, reason };
  const weights = contrastCosines(fit.sample, contrast, cosines);
  return singleContrastError(fit, contrast, persistence.used, weights);
}
