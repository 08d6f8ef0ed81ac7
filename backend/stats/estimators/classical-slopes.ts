import type { EstimatorSlope } from '../evidence/evidence';
import { congruence, type SquareMatrix } from '../linear-algebra/square-matrix';
import { symmetricInterval, withoutInterval } from '../prediction';
import { isPerfectFit, perfectFitReason } from '../regression/goodness';
import type { WithinFit } from '../regression/within-fit';

/** Residuals below this share of the outcome's variation are rounding. */
const exactTolerance = 1e-20;

/** Classical covariance of coefficients, s²·R⁻¹R⁻ᵀ, K × K, from R of the regression's columns. */
export function classicalCovariance(inverseR: Float64Array, variance: number): SquareMatrix {
  const size = Math.sqrt(inverseR.length);
  const middle = new Float64Array(inverseR.length);
  for (let k = 0; k < size; k += 1) middle[k * size + k] = variance;
  return congruence(inverseR, middle, size);
}

/** Why an estimator's slopes have no interval; undefined where they have one. */
export function exactReason(
  fit: WithinFit,
  residualSquares: number,
  totalSquares: number,
): string | undefined {
  const isExact = residualSquares <= exactTolerance * totalSquares;
  return isExact || isPerfectFit(fit) ? perfectFitReason : undefined;
}

/**
 * Slopes with intervals from their covariance.
 *
 * @param covariance  K × K, row-major, in the order of `names`.
 * @param spread  the quantile of the intervals, or why there are none.
 */
export function slopesWithIntervals(
  names: readonly string[],
  estimates: ArrayLike<number>,
  covariance: SquareMatrix,
  spread: { readonly quantile: number; readonly reason: string | undefined },
): EstimatorSlope[] {
  const { quantile, reason } = spread;
  return names.map((name, k) => {
    if (reason !== undefined) return { name, ...withoutInterval(estimates[k], reason) };
    const standardError = Math.sqrt(covariance[k * names.length + k]);
    return { name, ...symmetricInterval(estimates[k], standardError, quantile) };
  });
}
