import { tQuantile } from '../distributions/t-distribution';
import {
  type IntervalEstimate,
  symmetricInterval,
  twoSidedQuantile,
  withoutInterval,
} from '../prediction';
import type { CompanyForms } from './company-forms';
import type { Contrast } from './contrast';
import { lambdasOf, residualForm, varianceForm } from './contrast-forms';

/** A denominator below this share of its numerator calibrates nothing. */
const calibrationTolerance = 1e-12;

export const noCalibrationReason =
  'The variation over time that an interval is calibrated on is practically zero for this figure.';

/** Standard error of one contrast, with what made it; `cosines` are the degrees of freedom of its t. */
export type CalibratedError =
  | { readonly standardError: number; readonly calibration: number; readonly cosines: number }
  | { readonly standardError: null; readonly calibration: null; readonly reason: string };

/**
 * se = √(T·mean_j (h_j'e)²·c), c = max(1, Σ g_i'R_ig_i / (T·mean_j Σ (Mh_j)_i'R_i(Mh_j)_i)).
 *
 * @param cosines  B; at most what the forms were computed for.
 */
export function calibratedError(
  forms: CompanyForms,
  contrast: Contrast,
  cosines: number,
): CalibratedError {
  const squares = lambdasOf(forms, contrast, cosines).reduce((sum, value) => sum + value ** 2, 0);
  return errorFrom({
    years: forms.years,
    numerator: varianceForm(forms, contrast, contrast),
    residualForm: residualForm(forms, contrast, contrast, cosines),
    meanSquare: squares / cosines,
    cosines,
  });
}

/** What a calibrated standard error is made of. */
export interface ErrorParts {
  /** T. */
  readonly years: number;
  /** Σ g_i'R_ig_i. */
  readonly numerator: number;
  /** mean_j Σ (Mh_j)_i'R_i(Mh_j)_i. */
  readonly residualForm: number;
  /** mean_j (h_j'e)². */
  readonly meanSquare: number;
  /** B. */
  readonly cosines: number;
}

/** se = √(T·mean_j (h_j'e)²·c) with c = max(1, numerator / (T·residualForm)). */
export function errorFrom(parts: ErrorParts): CalibratedError {
  const { years, numerator, meanSquare } = parts;
  const denominator = years * parts.residualForm;
  if (!(denominator > calibrationTolerance * numerator)) {
    return { standardError: null, calibration: null, reason: noCalibrationReason };
  }
  const calibration = Math.max(1, numerator / denominator);
  const standardError = Math.sqrt(years * meanSquare * calibration);
  return { standardError, calibration, cosines: parts.cosines };
}

/** estimate ± t_B(1 − α/2)·se, or why there is none. */
export function calibratedInterval(
  estimate: number,
  error: CalibratedError,
  confidence: number,
): IntervalEstimate {
  if (error.standardError === null) return withoutInterval(estimate, error.reason);
  const quantile = twoSidedQuantile(tQuantile, confidence, error.cosines);
  return symmetricInterval(estimate, error.standardError, quantile);
}
