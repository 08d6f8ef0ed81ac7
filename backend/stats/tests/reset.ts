import { fUpperTail } from '../distributions/f-upper-tail';
import { dot } from '../linear-algebra/square-matrix';
import { withinTransform } from '../panel/within-transform';
import { sumOfSquares } from '../regression/sum-of-squares';
import type { EvidenceTest } from './evidence-test';
import { residualOffBasis } from './residual-off-basis';

/** Squares of which less than this share of Σ² is left beside the regressors add nothing. */
const remainderTolerance = 1e-20;

/**
 * Ramsey's RESET of power 2, classical: the squares of the dummy regression's fitted values added to it, F(1,
 * n − N − P − 1). The fitted values are squared as distances from their mean: the difference to the squares themselves
 * is a constant and a multiple of the fitted values, which the regression already holds, and large levels cost no
 * digits.
 *
 * @see Ramsey (1969), Journal of the Royal Statistical Society B 31, 350–371.
 */
export const resetTest: EvidenceTest = {
  code: 'reset',
  name: 'RESET, power 2',
  definition:
    'F test of the squared fitted values of the full dummy regression added to it, F(1, n − N − K − 1).',
  source: 'Ramsey (1969), Journal of the Royal Statistical Society B 31, 350–371',
  reference: 'tests.reset_power2',
  inHolm: true,
  readings: {
    rejects: 'The straight line misses a bend: compare the log form before the standing is stated.',
    keeps: 'Nothing speaks against a straight line.',
    none: 'It remains open whether a straight line will do.',
  },
  compute({ sample, fit }) {
    const df2 = fit.residualDegreesOfFreedom - 1;
    if (df2 < 1) return { statistic: null, reason: 'No residual degrees of freedom are left.' };
    const { starts } = sample;
    const squares = new Float64Array(sample.year.length);
    for (let company = 0; company < sample.companies.length; company += 1) {
      const level = fit.outcome.means[company] - fit.outcome.grandMean;
      for (let row = starts[company]; row < starts[company + 1]; row += 1) {
        squares[row] = (level + fit.outcome.values[row] - fit.residuals[row]) ** 2;
      }
    }
    const demeaned = withinTransform(squares, starts).values;
    const rest = residualOffBasis(demeaned, fit.basis);
    const left = sumOfSquares(rest);
    if (left <= remainderTolerance * sumOfSquares(squares)) {
      return {
        statistic: null,
        reason: 'The squared fitted values add nothing to the regressors.',
      };
    }
    const gain = dot(rest, fit.residuals) ** 2 / left;
    if (gain >= fit.residualSquares) {
      return { statistic: null, reason: 'With the squared fitted values no residual is left.' };
    }
    const statistic = gain / ((fit.residualSquares - gain) / df2);
    return {
      statistic,
      distribution: 'F',
      degreesOfFreedom: [1, df2],
      pValue: fUpperTail(statistic, 1, df2),
    };
  },
};
