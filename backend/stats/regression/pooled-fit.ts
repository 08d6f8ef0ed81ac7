import type { FitResult, FTest } from '../fit-result';
import { leastSquares } from '../linear-algebra/least-squares';
import { withinTransform } from '../panel/within-transform';
import { fTest, isPerfectFit } from './goodness';
import { sumOfSquares } from './sum-of-squares';
import type { WithinFit } from './within-fit';

/** The pooled regression and the test that it will do. */
export interface PooledFit {
  readonly pooled: FitResult['pooled'];
  readonly poolability: FTest;
}

/**
 * Least squares with one constant for all companies, beside the fixed effects, and the F test of equal intercepts,
 * F(N − 1, n − N − K). Both are classical.
 */
export function pooledFit(fit: WithinFit): PooledFit {
  const { sample } = fit;
  const rows = sample.year.length;
  const slopes = fit.slopes.length;
  const everyRow = Int32Array.of(0, rows);
  const outcome = withinTransform(sample.outcome, everyRow);
  const regressors = sample.regressors.map((column) => withinTransform(column, everyRow));
  const solution = leastSquares(
    regressors.map(({ values }) => values),
    outcome.values,
  );
  const rest = sumOfSquares(solution.residuals);
  const total = sumOfSquares(outcome.values);
  const meanAt = (column: { origin: number; means: Float64Array }): number =>
    column.origin + column.means[0];
  const isPerfect = isPerfectFit(fit);
  return {
    pooled: {
      constant: regressors.reduce(
        (value, column, k) => value - meanAt(column) * solution.coefficients[k],
        meanAt(outcome),
      ),
      slopes: Object.fromEntries(
        sample.regressorNames.map((name, k) => [name, solution.coefficients[k]]),
      ),
      rSquared: 1 - rest / total,
      f: fTest({ gain: total - rest, rest, isPerfect }, slopes, rows - slopes - 1),
    },
    poolability: fTest(
      { gain: rest - fit.residualSquares, rest: fit.residualSquares, isPerfect },
      sample.companies.length - 1,
      fit.residualDegreesOfFreedom,
    ),
  };
}
