import { leastSquares } from '../linear-algebra/least-squares';
import { invertUpper } from '../linear-algebra/triangular';
import type { PanelSample } from '../panel/panel-sample';
import { type WithinColumn, withinTransform } from '../panel/within-transform';
import { refuseDesign } from './refuse-design';
import { sumOfSquares } from './sum-of-squares';

/**
 * One-way fixed effects by the within transformation. n rows, N companies, K slopes.
 * The demeaned regressors are basis · R with orthonormal columns in `basis`: everything that follows works on those.
 */
export interface WithinFit {
  readonly sample: PanelSample;
  readonly outcome: WithinColumn;
  readonly regressors: readonly WithinColumn[];
  readonly slopes: Float64Array;
  readonly residuals: Float64Array;
  readonly basis: readonly Float64Array[];
  /** K × K, row-major, upper triangular. */
  readonly inverseR: Float64Array;
  readonly r: Float64Array;
  /** Σe². */
  readonly residualSquares: number;
  /** n − N − K. */
  readonly residualDegreesOfFreedom: number;
  /** a_i less the constant that the columns' origins make; differences of intercepts come from these. */
  readonly relativeIntercepts: Float64Array;
  /** What turns a relative intercept into a_i. */
  readonly interceptOrigin: number;
  readonly conditionNumber: number;
}

/**
 * Least squares with one dummy a company and no constant, as the regression of demeaned columns
 * (Frisch–Waugh–Lovell); a_i = ȳ_i − x̄_i'b.
 *
 * @throws {StatsError} what `refuseDesign` refuses.
 */
export function withinFit(sample: PanelSample): WithinFit {
  const outcome = withinTransform(sample.outcome, sample.starts);
  const regressors = sample.regressors.map((column) => withinTransform(column, sample.starts));
  const { conditionNumber } = refuseDesign(sample, outcome, regressors);
  const solution = leastSquares(
    regressors.map(({ values }) => values),
    outcome.values,
  );
  const slopes = solution.coefficients;
  return {
    sample,
    outcome,
    regressors,
    slopes,
    residuals: solution.residuals,
    basis: solution.basis,
    r: solution.r,
    inverseR: invertUpper(solution.r, slopes.length),
    residualSquares: sumOfSquares(solution.residuals),
    residualDegreesOfFreedom: sample.year.length - sample.companies.length - slopes.length,
    relativeIntercepts: outcome.means.map((mean, company) =>
      regressors.reduce((rest, column, k) => rest - column.means[company] * slopes[k], mean),
    ),
    interceptOrigin: regressors.reduce(
      (rest, column, k) => rest - column.origin * slopes[k],
      outcome.origin,
    ),
    conditionNumber,
  };
}
