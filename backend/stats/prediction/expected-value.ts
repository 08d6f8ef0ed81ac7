import { type IntervalEstimate, symmetricInterval, withoutInterval } from './interval-estimate';
import type { PredictionBasis } from './prediction-basis';
import { quadraticForm, weightedSum } from './quadratic-form';

/** A calibration whose denominator is below this share of its numerator is no calibration. */
const calibrationTolerance = 1e-12;

/**
 * The model's market value of the own company at given regressors, a_own + x'b, with its calibrated interval.
 *
 * @param regressors  planned values, in the order and measure of `basis.regressors`.
 * @see Lazarus, Lewis, Stock & Watson (2018), JBES 36, 541–559, for the cosine weights behind λ.
 */
export function expectedValue(
  basis: PredictionBasis,
  regressors: readonly number[],
): IntervalEstimate {
  const distances = regressors.map((value, k) => value - basis.ownMeans[k]);
  const estimate = basis.ownLevel + weightedSum(basis.coefficients.slice(1), distances);
  if (basis.intervalReason !== undefined) return withoutInterval(estimate, basis.intervalReason);
  const weights = [1, ...distances];
  const numerator = quadraticForm(basis.a, weights);
  const denominator = basis.years * quadraticForm(basis.d, weights);
  if (!(denominator >= calibrationTolerance * numerator) || denominator === 0) {
    return withoutInterval(
      estimate,
      'The variation over time that an interval is calibrated on is practically zero for this plan.',
    );
  }
  const calibration = Math.max(1, numerator / denominator);
  const meanSquare =
    basis.lambdas.reduce((sum, lambda) => sum + weightedSum(lambda, weights) ** 2, 0) /
    basis.lambdas.length;
  const standardError = Math.sqrt(basis.years * meanSquare * calibration);
  return symmetricInterval(estimate, standardError, basis.quantile);
}
