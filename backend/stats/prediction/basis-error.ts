import type { PredictionBasis } from './prediction-basis';
import { quadraticForm, weightedSum } from './quadratic-form';

/** A calibration whose denominator is below this share of its numerator is no calibration. */
const calibrationTolerance = 1e-12;

export const uncalibratedReason =
  'The variation over time that an interval is calibrated on is practically zero for this plan.';

/** The calibrated standard error of a contrast, with what made it, in the model's scale. */
export type BasisError =
  | {
      readonly standardError: number;
      /** c. */
      readonly calibration: number;
      /** w'λ_j, one a cosine. */
      readonly lambdas: readonly number[];
    }
  | { readonly standardError: null; readonly reason: string };

/**
 * se² = T·mean_j(w'λ_j)²·c, c = max(1, w'Aw / (T·w'Dw)).
 *
 * @param weights  w over the centred basis; see `PredictionBasis`.
 * @see Lazarus, Lewis, Stock & Watson (2018), JBES 36, 541–559, for the cosine weights behind λ.
 */
export function basisError(basis: PredictionBasis, weights: readonly number[]): BasisError {
  if (basis.intervalReason !== undefined) {
    return { standardError: null, reason: basis.intervalReason };
  }
  const numerator = quadraticForm(basis.a, weights);
  const denominator = basis.years * quadraticForm(basis.d, weights);
  const calibration = calibrationOf(numerator, denominator);
  if (calibration === null) return { standardError: null, reason: uncalibratedReason };
  const lambdas = basis.lambdas.map((lambda) => weightedSum(lambda, weights));
  const meanSquare = weightedSum(lambdas, lambdas) / lambdas.length;
  return {
    standardError: Math.sqrt(basis.years * meanSquare * calibration),
    calibration,
    lambdas,
  };
}

/** c = max(1, w'Aw / (T·w'Dw)) from its numerator and denominator; null where there is none. */
export function calibrationOf(numerator: number, denominator: number): number | null {
  return !(denominator >= calibrationTolerance * numerator) || denominator === 0
    ? null
    : Math.max(1, numerator / denominator);
}
