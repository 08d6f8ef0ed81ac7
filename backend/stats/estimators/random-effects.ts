import { leastSquares } from '../linear-algebra/least-squares';
import { type SquareMatrix, timesVector } from '../linear-algebra/square-matrix';
import { invertUpper } from '../linear-algebra/triangular';
import type { WithinColumn } from '../panel/within-transform';
import { isPerfectFit, perfectFitReason } from '../regression/goodness';
import { sumOfSquares } from '../regression/sum-of-squares';
import type { WithinFit } from '../regression/within-fit';
import { classicalCovariance, slopesWithIntervals } from './classical-slopes';
import { companyMeansFit } from './company-means-fit';
import { type Estimator, isNotComputed, noFigures, type NotComputed } from './estimator';
import { normalTwoSidedQuantile } from './normal-quantile';

/** N companies, K slopes. */
export interface RandomEffectsFit {
  readonly slopes: Float64Array;
  readonly constant: number;
  /** Classical, K × K. */
  readonly covariance: SquareMatrix;
  /** Variance of the errors and of the company effects. */
  readonly errorVariance: number;
  readonly companyVariance: number;
  /** Whether the company effects' variance came out negative and was set to 0. */
  readonly isCutAtZero: boolean;
  /** θ_i, length N: the share of its mean that is taken off a company's rows. */
  readonly theta: Float64Array;
}

/**
 * Random effects by feasible generalised least squares with the variance components of Swamy and Arora, on unbalanced
 * panels by the expected quadratic forms: σ²_e = RSS_within/(n − N − P),
 * σ²_a = (ΣT_i·ū_i² − σ²_e·(N − r − 1)) / ΣT_i(1 − h_i), with ū and h residuals and leverages of the company means weighted
 * by T_i and r their independent columns. θ_i = 1 − (1 + T_i·σ²_a/σ²_e)^(−½). Year columns count among the P columns.
 *
 * @see Swamy & Arora (1972), Econometrica 40, 261–275; Baltagi & Chang (1994), Journal of Econometrics 62, 67–89.
 */
export function randomEffectsFit(fit: WithinFit): RandomEffectsFit | NotComputed {
  if (isPerfectFit(fit)) return { reason: perfectFitReason };
  const { sample, outcome, columns } = fit;
  const companies = sample.companies.length;
  const rows = Float64Array.from(
    sample.companies,
    (_, company) => sample.starts[company + 1] - sample.starts[company],
  );
  const means = companyMeansFit(outcome, columns, rows);
  const betweenDegrees = companies - means.kept.length - 1;
  if (betweenDegrees <= 0) {
    return {
      reason: `The means of ${companies} companies leave nothing to judge the company effects’ variance by.`,
    };
  }
  const errorVariance = fit.residualSquares / fit.residualDegreesOfFreedom;
  const freedom = rows.reduce(
    (sum, count, company) => sum + count * (1 - means.leverages[company]),
    0,
  );
  const raw = (means.residualSquares - errorVariance * betweenDegrees) / freedom;
  const companyVariance = Math.max(0, raw);
  const theta = rows.map(
    (count) => 1 - 1 / Math.sqrt(1 + (count * companyVariance) / errorVariance),
  );
  return {
    ...quasiDemeaned(fit, rows, theta),
    errorVariance,
    companyVariance,
    isCutAtZero: raw < 0,
    theta,
  };
}

/**
 * Least squares of the rows less θ_i of their company's mean. Within companies that is the fit's own regression, orthogonal
 * to what is left of the means: its R and R·b stand in for the n rows, and N rows of (1 − θ_i)·√T_i·(x̄_i − c) follow, with
 * the c that makes them orthogonal to the constant's own column. Cost (N + P)·P².
 */
function quasiDemeaned(
  fit: WithinFit,
  rows: Float64Array,
  theta: Float64Array,
): Pick<RandomEffectsFit, 'slopes' | 'constant' | 'covariance'> {
  const observations = fit.sample.year.length;
  const parameters = fit.columns.length;
  const roots = rows.map((count, company) => Math.sqrt(count) * (1 - theta[company]));
  const outcome = meansRows(fit.outcome, roots);
  const columns = fit.columns.map((column) => meansRows(column, roots));
  const within = timesVector(fit.r, fit.coefficients);
  const { coefficients, residuals, r } = leastSquares(
    columns.map(({ values }, k) =>
      stacked(
        within.map((_, row) => fit.r[row * parameters + k]),
        values,
      ),
    ),
    stacked(within, outcome.values),
  );
  const slopes = fit.slopes.length;
  const rest = fit.residualSquares + sumOfSquares(residuals);
  return {
    slopes: coefficients.slice(fit.yearColumns),
    constant: columns.reduce(
      (left, { centre }, k) => left - centre * coefficients[k],
      outcome.centre,
    ),
    // The regressors come last, so their block of (R'R)⁻¹ is made of their block of R alone.
    covariance: classicalCovariance(
      invertUpper(lastBlock(r, parameters, slopes), slopes),
      rest / (observations - parameters - 1),
    ),
  };
}

/** √w_i·(x̄_i − c) with c the mean weighted by w_i = roots², and c in the panel's measure. */
function meansRows(
  { means, origin }: WithinColumn,
  roots: Float64Array,
): { values: Float64Array; centre: number } {
  let sum = 0;
  let total = 0;
  means.forEach((mean, company) => {
    const weight = roots[company] ** 2;
    sum += weight * mean;
    total += weight;
  });
  const centre = sum / total;
  return {
    values: means.map((mean, company) => roots[company] * (mean - centre)),
    centre: origin + centre,
  };
}

function stacked(upper: Float64Array, lower: Float64Array): Float64Array {
  const result = new Float64Array(upper.length + lower.length);
  result.set(upper);
  result.set(lower, upper.length);
  return result;
}

/** The last `count` rows and columns of a square matrix. */
function lastBlock(matrix: SquareMatrix, size: number, count: number): SquareMatrix {
  const skipped = size - count;
  return Float64Array.from(
    { length: count * count },
    (_, index) => matrix[(skipped + Math.floor(index / count)) * size + skipped + (index % count)],
  );
}

export const randomEffectsEstimator: Estimator = {
  code: 'random-effects',
  name: 'Random effects',
  definition:
    'Generalised least squares that treats the company intercepts as draws unrelated to the regressors, with the variances of Swamy and Arora.',
  source:
    'Swamy & Arora (1972), Econometrica 40, 261–275; Baltagi & Chang (1994), Journal of Econometrics 62, 67–89',
  reference: 'random_swar',
  figures: ({ sample, fit, specification }) => {
    const observations = sample.year.length;
    const random = randomEffectsFit(fit);
    if (isNotComputed(random)) return noFigures(random.reason, observations);
    let smallest = Infinity;
    let largest = -Infinity;
    for (const share of random.theta) {
      smallest = Math.min(smallest, share);
      largest = Math.max(largest, share);
    }
    return {
      slopes: slopesWithIntervals(sample.regressorNames, random.slopes, random.covariance, {
        quantile: normalTwoSidedQuantile(specification.confidence),
        reason: undefined,
      }),
      constant: random.constant,
      observations,
      degreesOfFreedom: null,
      components: {
        error: Math.sqrt(random.errorVariance),
        company: Math.sqrt(random.companyVariance),
        theta: [smallest, largest],
      },
      ...(random.isCutAtZero
        ? {
            reason:
              'The variance of the company effects came out negative and was set to 0: the slopes are those of one constant for all companies.',
          }
        : {}),
    };
  },
};
