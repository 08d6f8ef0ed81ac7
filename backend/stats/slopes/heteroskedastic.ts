import { dummyLeverages, leverageTolerance } from './dummy-leverages';
import { exactRowsReason, type MatrixMethod, type SlopeCovariance } from './covariance-method';
import { rowProducts } from './score-products';
import { slopeBlock, slopeSandwich } from './slope-block';
import type { SlopeGround } from './slope-ground';

/** What the four heteroskedasticity-consistent covariances have in common. */
export const heteroskedastic = {
  kind: 'matrix',
  degreesOfFreedom: ({ fit }: SlopeGround): number => fit.residualDegreesOfFreedom,
  noVarianceReason: exactRowsReason,
} satisfies Partial<MatrixMethod>;

/**
 * R₂₂⁻¹·Σₜ weight(hₜ)·eₜ²·uₜuₜ'·R₂₂⁻ᵀ with hₜ the leverage in the full dummy regression; a row of leverage 1 adds nothing.
 *
 * @param weight  of a row, from 1 − hₜ > 0.
 */
export function leverageWeighted(
  { fit }: SlopeGround,
  weight: (rest: number) => number,
): SlopeCovariance {
  const leverages = dummyLeverages(fit);
  const middle = rowProducts(
    { basis: slopeBlock(fit).basis, residuals: fit.residuals },
    (row): number => {
      const rest = 1 - leverages[row];
      return rest < leverageTolerance ? 0 : weight(rest);
    },
  );
  return { matrix: slopeSandwich(fit, middle), notes: [] };
}

/** The same with one weight for every row. */
export function evenlyWeighted({ fit }: SlopeGround, factor: number): SlopeCovariance {
  const middle = rowProducts({ basis: slopeBlock(fit).basis, residuals: fit.residuals });
  return { matrix: slopeSandwich(fit, middle).map((value) => factor * value), notes: [] };
}
