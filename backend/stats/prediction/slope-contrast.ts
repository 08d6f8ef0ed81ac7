import { type IntervalEstimate, symmetricInterval, withoutInterval } from './interval-estimate';
import type { PredictionBasis, SlopeDegreesOfFreedom } from './prediction-basis';
import { quadraticForm } from './quadratic-form';
import { type TQuantile, twoSidedQuantile } from './two-sided-quantile';

/** A contrast whose working variance is below this share of the classical one is determined by one company alone. */
const workingTolerance = 1e-10;

/** A variance below this share of the classical one is rounding: residuals that sum to zero are all it rests on. */
export const varianceTolerance = 1e-20;

const noVarianceReason =
  'No variance is left to judge it by: one company alone determines this difference.';

/** Degrees of freedom of the contrast of slopes with the given weights, not all zero. */
export function contrastDegreesOfFreedom(
  degrees: SlopeDegreesOfFreedom,
  weights: readonly number[],
): number {
  if (degrees.kind === 'fixed') return degrees.value;
  const pairs = pairProducts(weights);
  const size = pairs.length;
  let denominator = 0;
  for (let row = 0; row < size; row += 1) {
    for (let column = 0; column < size; column += 1) {
      denominator += pairs[row] * degrees.quartic[row * size + column] * pairs[column];
    }
  }
  return quadraticForm(degrees.s, weights) ** 2 / denominator;
}

/**
 * Σ b_k·Δx_k with the interval of the covariance chosen for the slopes and the degrees of freedom of this contrast.
 *
 * @param deltaRegressors  differences in the order of `basis.regressors` and the model's scale: of logs in log form.
 * @returns in the model's scale.
 * @see Pustejovsky & Tipton (2018), JBES 36, 672–683.
 */
export function differenceToBase(
  basis: PredictionBasis,
  deltaRegressors: readonly number[],
  tQuantile: TQuantile,
): IntervalEstimate {
  const largest = Math.max(...deltaRegressors.map(Math.abs));
  if (largest === 0) return { estimate: 0, standardError: 0, low: 0, high: 0 };
  let estimate = 0;
  deltaRegressors.forEach((delta, k) => (estimate += basis.coefficients[k + 1] * delta));
  const { slopeCovariance, slopeDegreesOfFreedom } = basis;
  if (
    basis.slopeIntervalReason !== undefined ||
    slopeCovariance === null ||
    slopeDegreesOfFreedom === null
  ) {
    return withoutInterval(
      estimate,
      basis.slopeIntervalReason ?? 'The slopes have no covariance, so their differences have none.',
    );
  }
  // Degrees of freedom do not depend on the contrast's size: scaled, fourth powers neither overflow nor vanish.
  const weights = deltaRegressors.map((delta) => delta / largest);
  const variance = quadraticForm(slopeCovariance, weights);
  if (!isJudged(basis, weights, variance)) {
    return withoutInterval(estimate, basis.slopeNoVarianceReason ?? noVarianceReason);
  }
  const standardError = largest * Math.sqrt(variance);
  const degrees = contrastDegreesOfFreedom(slopeDegreesOfFreedom, weights);
  const quantile = twoSidedQuantile(tQuantile, basis.confidence, degrees);
  return symmetricInterval(estimate, standardError, quantile);
}

function isJudged(basis: PredictionBasis, weights: readonly number[], variance: number): boolean {
  const crossProduct = quadraticForm(basis.slopeInverse ?? basis.inverseCrossProduct, weights);
  if (!(variance > varianceTolerance * basis.residualVariance * crossProduct)) return false;
  const degrees = basis.slopeDegreesOfFreedom;
  return (
    degrees?.kind !== 'satterthwaite' ||
    quadraticForm(degrees.s, weights) > workingTolerance * crossProduct
  );
}

/** w_k·w_l for k ≤ l, doubled for k < l. */
function pairProducts(weights: readonly number[]): number[] {
  return weights.flatMap((left, k) =>
    weights.slice(k).map((right, offset) => (offset === 0 ? left * right : 2 * left * right)),
  );
}
