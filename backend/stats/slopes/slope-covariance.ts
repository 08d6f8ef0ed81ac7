import type { SlopeCovarianceName } from '../fit-result';
import { congruence, type SquareMatrix, timesVector } from '../linear-algebra/square-matrix';
import type { WithinFit } from '../regression/within-fit';
import type { CompanyProduct } from './company-products';

/**
 * Covariance of the slopes, K × K, row-major.
 *
 * - `cr2`  bias-reduced by company, working identity (Bell & McCaffrey 2002, Survey Methodology 28, 169–181);
 * - `cr1`  by company, factor G/(G − 1) · (n − 1)/(n − K − 1);
 * - `cr0`  by company, no factor (Arellano 1987, Oxford Bulletin 49, 431–434);
 * - `classical`  RSS/(n − N − K) · (x̃'x̃)⁻¹.
 */
export function slopeCovariance(
  fit: WithinFit,
  products: readonly CompanyProduct[],
  name: SlopeCovarianceName,
): SquareMatrix {
  const size = fit.slopes.length;
  switch (name) {
    case 'cr2':
      return sandwich(
        fit,
        products.map(({ adjustment, score }) => timesVector(adjustment, score)),
        1,
      );
    case 'cr1': {
      const companies = products.length;
      const rows = fit.sample.year.length;
      return sandwich(
        fit,
        products.map(({ score }) => score),
        ((companies / (companies - 1)) * (rows - 1)) / (rows - size - 1),
      );
    }
    case 'cr0':
      return sandwich(
        fit,
        products.map(({ score }) => score),
        1,
      );
    case 'classical': {
      const variance = fit.residualSquares / fit.residualDegreesOfFreedom;
      const middle = new Float64Array(size * size);
      for (let k = 0; k < size; k += 1) middle[k * size + k] = variance;
      return congruence(fit.inverseR, middle, size);
    }
  }
}

/** R⁻¹ · factor·Σ score_i·score_i' · R⁻ᵀ. */
function sandwich(fit: WithinFit, scores: readonly Float64Array[], factor: number): SquareMatrix {
  const size = fit.slopes.length;
  const middle = new Float64Array(size * size);
  for (const score of scores) {
    for (let k = 0; k < size; k += 1) {
      for (let l = 0; l < size; l += 1) middle[k * size + l] += factor * score[k] * score[l];
    }
  }
  return congruence(fit.inverseR, middle, size);
}
