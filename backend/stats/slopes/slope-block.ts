import { congruence, type SquareMatrix } from '../linear-algebra/square-matrix';
import type { WithinFit } from '../regression/within-fit';

/**
 * The part of the orthonormal design that the slopes rest on. The year columns come first and R⁻¹ is upper triangular,
 * so the slopes are R₂₂⁻¹ times the outcome's projections on the last K columns of the basis: a covariance of the slopes
 * is R₂₂⁻¹·M·R₂₂⁻ᵀ with M that of these K projections, however many year columns there are.
 */
export interface SlopeBlock {
  /** K columns of n rows. */
  readonly basis: readonly Float64Array[];
  /** R₂₂⁻¹, K × K, row-major. */
  readonly inverseR: SquareMatrix;
}

export function slopeBlock(fit: WithinFit): SlopeBlock {
  const size = fit.slopes.length;
  const all = fit.coefficients.length;
  const inverseR = new Float64Array(size * size);
  for (let k = 0; k < size; k += 1) {
    const from = (fit.yearColumns + k) * all + fit.yearColumns;
    inverseR.set(fit.inverseR.subarray(from, from + size), k * size);
  }
  return { basis: fit.basis.slice(fit.yearColumns), inverseR };
}

/** R₂₂⁻¹·M·R₂₂⁻ᵀ, K × K. */
export function slopeSandwich(fit: WithinFit, middle: SquareMatrix): SquareMatrix {
  return congruence(slopeBlock(fit).inverseR, middle, fit.slopes.length);
}
