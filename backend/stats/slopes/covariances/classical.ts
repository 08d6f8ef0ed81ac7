import { exactRowsReason, type MatrixMethod } from '../covariance-method';
import { slopeSandwich } from '../slope-block';

/** RSS/(n − N − P) · R₂₂⁻¹R₂₂⁻ᵀ. */
export const classical: MatrixMethod = {
  kind: 'matrix',
  code: 'classical',
  name: 'Classical',
  definition:
    'Errors of equal variance, independent of each other: RSS/(n − N − K) times the inverse cross-product of the demeaned regressors; t with n − N − K degrees of freedom, year effects counted in K.',
  source: 'Wooldridge (2010), Econometric Analysis of Cross Section and Panel Data, 2nd ed., §10.5',
  reference: ['within_se.classical', 'twoway.classical'],
  degreesOfFreedom: ({ fit }) => fit.residualDegreesOfFreedom,
  noVarianceReason: exactRowsReason,
  covariance: ({ fit }) => {
    const size = fit.slopes.length;
    const variance = fit.residualSquares / fit.residualDegreesOfFreedom;
    const middle = new Float64Array(size * size);
    for (let k = 0; k < size; k += 1) middle[k * size + k] = variance;
    return { matrix: slopeSandwich(fit, middle), notes: [] };
  },
};
