import { type LeastSquares, leastSquares } from '../linear-algebra/least-squares';
import { invertUpper } from '../linear-algebra/triangular';
import type { WithinColumn } from '../panel/within-transform';
import { sumOfSquares } from '../regression/sum-of-squares';
import { independentColumns } from './independent-columns';

/** The regression of the companies' means with one constant; N companies, K columns of which r are independent. */
export interface CompanyMeansFit {
  /** √w_i·(x̄_i − x̄), K columns of length N, x̄ the weighted mean of the means. */
  readonly columns: readonly Float64Array[];
  readonly outcome: Float64Array;
  /** The weighted means x̄ and ȳ, in the panel's measure. */
  readonly centres: readonly number[];
  readonly outcomeCentre: number;
  /** Indices of the r columns that are independent over the companies: the others have no coefficient. */
  readonly kept: readonly number[];
  /** Of the kept columns. */
  readonly coefficients: Float64Array;
  /** √w_i·u_i. */
  readonly residuals: Float64Array;
  readonly residualSquares: number;
  /** Orthonormal basis of the kept columns, r columns of length N; orthogonal to √w. */
  readonly basis: readonly Float64Array[];
  /** r × r. */
  readonly inverseR: Float64Array;
  /** Leverage of each company, the constant's w_i/Σw included. */
  readonly leverages: Float64Array;
}

/**
 * Weighted least squares of company means.
 *
 * @param weights  length N, positive: 1 for companies counted alike, T_i for companies counted by their rows.
 */
export function companyMeansFit(
  outcome: WithinColumn,
  columns: readonly WithinColumn[],
  weights: Float64Array,
): CompanyMeansFit {
  const roots = weights.map(Math.sqrt);
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const centred = columns.map((column) => centre(column, weights, total));
  const response = centre(outcome, weights, total);
  const scale = (values: Float64Array): Float64Array =>
    values.map((value, company) => roots[company] * value);
  const scaled = centred.map(({ values }) => scale(values));
  // Means that differ by far less than their rows do are equal but for rounding.
  const sizes = scaled.map((values, k) =>
    Math.sqrt(sumOfSquares(values) + sumOfSquares(columns[k].values)),
  );
  const kept = independentColumns(scaled, sizes);
  const scaledOutcome = scale(response.values);
  const solution =
    kept.length === 0
      ? constantOnly(scaledOutcome)
      : leastSquares(
          kept.map((k) => scaled[k]),
          scaledOutcome,
        );
  return {
    columns: scaled,
    outcome: scaledOutcome,
    centres: centred.map(({ centre: value }) => value),
    outcomeCentre: response.centre,
    kept,
    coefficients: solution.coefficients,
    residuals: solution.residuals,
    residualSquares: solution.residualSquares,
    basis: solution.basis,
    inverseR: invertUpper(solution.r, kept.length),
    leverages: weights.map((weight, company) =>
      solution.basis.reduce((sum, column) => sum + column[company] ** 2, weight / total),
    ),
  };
}

/** The regression where no column tells the companies apart. */
function constantOnly(outcome: Float64Array): LeastSquares {
  const none = new Float64Array(0);
  return {
    coefficients: none,
    residuals: outcome,
    residualSquares: sumOfSquares(outcome),
    basis: [],
    r: none,
  };
}

/** Company means less their weighted mean, and that mean. */
function centre(
  { means, origin }: WithinColumn,
  weights: Float64Array,
  total: number,
): { values: Float64Array; centre: number } {
  let sum = 0;
  means.forEach((mean, company) => (sum += weights[company] * mean));
  const middle = sum / total;
  return { values: means.map((mean) => mean - middle), centre: origin + middle };
}
