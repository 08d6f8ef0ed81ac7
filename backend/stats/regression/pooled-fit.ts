import type { FitResult, FTest } from '../fit-result';
import { leastSquares } from '../linear-algebra/least-squares';
import { invertUpper } from '../linear-algebra/triangular';
import type { PanelSample } from '../panel/panel-sample';
import { type WithinColumn, withinTransform } from '../panel/within-transform';
import { fTest, isPerfectFit } from './goodness';
import type { WithinFit } from './within-fit';
import { yearColumns } from './year-columns';

/** The pooled regression and the test that it will do. */
export interface PooledFit {
  readonly pooled: FitResult['pooled'];
  readonly residuals: Float64Array;
  /** Orthonormal basis of the regressors without their means, K columns of n rows, and R⁻¹ of them, K × K. */
  readonly basis: readonly Float64Array[];
  readonly inverseR: Float64Array;
  readonly poolability: FTest;
}

/**
 * Least squares with one constant for all companies, beside the fixed effects, and the F test of equal intercepts,
 * F(N − 1, n − N − P): against the pooled regression, with year effects against the one that has them. Both are
 * classical.
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
  const rest = solution.residualSquares;
  const restWithYears = fit.yearColumns === 0 ? rest : withYears(sample, outcome, regressors);
  const total = outcome.squares;
  const meanAt = (column: { origin: number; means: Float64Array }): number =>
    column.origin + column.means[0];
  const isPerfect = isPerfectFit(fit);
  return {
    residuals: solution.residuals,
    basis: solution.basis,
    inverseR: invertUpper(solution.r, slopes),
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
      { gain: restWithYears - fit.residualSquares, rest: fit.residualSquares, isPerfect },
      sample.companies.length - 1,
      fit.residualDegreesOfFreedom,
    ),
  };
}

/** Sum of squares of the regression with year effects and one constant. */
function withYears(
  sample: PanelSample,
  outcome: WithinColumn,
  regressors: readonly WithinColumn[],
): number {
  const everyRow = Int32Array.of(0, sample.year.length);
  const years = yearColumns(sample).map((column) => withinTransform(column, everyRow).values);
  const columns = [...years, ...regressors.map(({ values }) => values)];
  return leastSquares(columns, outcome.values).residualSquares;
}
