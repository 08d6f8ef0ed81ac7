import type { Effects } from '../fit-result';
import { solveLeastSquares } from '../linear-algebra/least-squares';
import { invertUpper } from '../linear-algebra/triangular';
import type { PanelSample } from '../panel/panel-sample';
import { type WithinColumn, withinTransform } from '../panel/within-transform';
import { factorDesign } from './factor-design';
import { yearColumns } from './year-columns';

/**
 * Fixed effects by the within transformation. n rows, N companies, T years, K slopes; Y year columns, T − 1 with year
 * effects and none without; P = Y + K parameters beside the company intercepts.
 * The demeaned design is basis · R with orthonormal columns in `basis`: everything that follows works on those.
 */
export interface WithinFit {
  readonly sample: PanelSample;
  readonly effects: Effects;
  readonly outcome: WithinColumn;
  /** The demeaned design, P columns: the year columns if any, then the regressors. */
  readonly columns: readonly WithinColumn[];
  /** The demeaned regressors, K columns: the last ones of `columns`. */
  readonly regressors: readonly WithinColumn[];
  /** Y. */
  readonly yearColumns: number;
  /** P coefficients in the order of `columns`. */
  readonly coefficients: Float64Array;
  /** K slopes in the order of `regressors`: the last ones of `coefficients`. */
  readonly slopes: Float64Array;
  readonly residuals: Float64Array;
  /** P columns. */
  readonly basis: readonly Float64Array[];
  /** P × P, row-major, upper triangular. */
  readonly inverseR: Float64Array;
  readonly r: Float64Array;
  /** Σe². */
  readonly residualSquares: number;
  /** n − N − P. */
  readonly residualDegreesOfFreedom: number;
  /** a_i less the constant that the columns' origins make; differences of intercepts come from these. */
  readonly relativeIntercepts: Float64Array;
  /** What turns a relative intercept into a_i. */
  readonly interceptOrigin: number;
  /** Of the scaled regressors without the effects. */
  readonly conditionNumber: number;
}

/**
 * Least squares with one dummy a company and no constant, and with year effects one column a year but the last beside
 * the regressors, as the regression of demeaned columns (Frisch–Waugh–Lovell): exact on unbalanced panels too.
 * a_i = ȳ_i − x̄_i'b − c̄_i.
 *
 * @throws {StatsError} what `factorDesign` and `yearColumns` refuse.
 */
export function withinFit(sample: PanelSample, effects: Effects): WithinFit {
  const demeaned = (column: Float64Array): WithinColumn => withinTransform(column, sample.starts);
  const outcome = demeaned(sample.outcome);
  const years = effects === 'company' ? [] : yearColumns(sample).map(demeaned);
  const regressors = sample.regressors.map(demeaned);
  const { factored, conditionNumber } = factorDesign(sample, { outcome, years, regressors });
  const columns = [...years, ...regressors];
  const solution = solveLeastSquares(factored);
  const { coefficients } = solution;
  return {
    sample,
    effects,
    outcome,
    columns,
    regressors,
    yearColumns: years.length,
    coefficients,
    slopes: coefficients.subarray(years.length),
    residuals: solution.residuals,
    basis: solution.basis,
    r: solution.r,
    inverseR: invertUpper(solution.r, columns.length),
    residualSquares: solution.residualSquares,
    residualDegreesOfFreedom: sample.year.length - sample.companies.length - columns.length,
    relativeIntercepts: outcome.means.map((mean, company) =>
      columns.reduce((rest, column, k) => rest - column.means[company] * coefficients[k], mean),
    ),
    interceptOrigin: columns.reduce(
      (rest, column, k) => rest - column.origin * coefficients[k],
      outcome.origin,
    ),
    conditionNumber,
  };
}
