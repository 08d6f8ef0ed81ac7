import { leastSquares } from '../linear-algebra/least-squares';
import type { SquareMatrix } from '../linear-algebra/square-matrix';
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

/** Least squares of the rows less θ_i of their company's mean; the constant is centred out. */
function quasiDemeaned(
  fit: WithinFit,
  rows: Float64Array,
  theta: Float64Array,
): Pick<RandomEffectsFit, 'slopes' | 'constant' | 'covariance'> {
  const observations = fit.sample.year.length;
  const weights = rows.map((count, company) => count * (1 - theta[company]) ** 2);
  const outcome = quasiDemeanedColumn(fit.outcome, fit.sample.starts, theta, weights);
  const columns = fit.columns.map((column) =>
    quasiDemeanedColumn(column, fit.sample.starts, theta, weights),
  );
  const { coefficients, residuals, r } = leastSquares(
    columns.map(({ values }) => values),
    outcome.values,
  );
  const degreesOfFreedom = observations - columns.length - 1;
  const block = lastBlock(r, columns.length, fit.slopes.length);
  return {
    slopes: coefficients.slice(fit.yearColumns),
    constant: columns.reduce(
      (rest, { centre }, k) => rest - centre * coefficients[k],
      outcome.centre,
    ),
    // The regressors come last, so their block of (R'R)⁻¹ is made of their block of R alone.
    covariance: classicalCovariance(
      invertUpper(block, fit.slopes.length),
      sumOfSquares(residuals) / degreesOfFreedom,
    ),
  };
}

/** x̃_it + (1 − θ_i)(x̄_i − c), with the c that makes the column orthogonal to the constant's own, 1 − θ_i. */
function quasiDemeanedColumn(
  { values, means, origin }: WithinColumn,
  starts: Int32Array,
  theta: Float64Array,
  weights: Float64Array,
): { values: Float64Array; centre: number } {
  let sum = 0;
  let total = 0;
  means.forEach((mean, company) => {
    sum += weights[company] * mean;
    total += weights[company];
  });
  const centre = sum / total;
  const result = Float64Array.from(values);
  means.forEach((mean, company) => {
    const part = (1 - theta[company]) * (mean - centre);
    for (let row = starts[company]; row < starts[company + 1]; row += 1) result[row] += part;
  });
  return { values: result, centre: origin + centre };
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
