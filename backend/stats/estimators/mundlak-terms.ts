import { bilinear, dot, timesVector, transpose } from '../linear-algebra/square-matrix';
import type { WithinFit } from '../regression/within-fit';
import type { CompanyProduct } from '../slopes/company-products';
import { type CompanyMeansFit, companyMeansFit } from './company-means-fit';
import type { NotComputed } from './estimator';
import type { ClusterTerms } from './hotelling-approximation';

/** Below this 1 − leverage a company determines its direction of the means alone, and adds nothing to the sandwich. */
const leverageFloor = 1e-10;

/** The company-mean terms of Mundlak's regression as q contrasts, and what each company adds to their covariance. */
export interface MundlakTerms {
  /** Length q; all zero where the slopes between and within companies agree. */
  readonly contrasts: Float64Array;
  /** One a company, of m = K + 1 + q parameters. */
  readonly companies: readonly ClusterTerms[];
}

/**
 * The terms of x̄_i in the least squares regression of y on 1, x and x̄_i, with `cr2` by company and a working identity.
 *
 * The regression's columns span two orthogonal parts: the demeaned regressors, which are the fit's own, and the constant
 * with the means weighted by T_i. The terms are taken in the orthonormal coordinates Q of those means, Q'ȳ − Q'X̄b with b
 * the slopes within: an invertible mixture of the coefficients of x̄_i, for which the test of all of them is the same.
 * A regressor whose means the others' determine adds no term. Cost N·K³, on the company products of the fit.
 *
 * @see Mundlak (1978), Econometrica 46, 69–85.
 */
export function mundlakTerms(
  fit: WithinFit,
  products: readonly CompanyProduct[],
): MundlakTerms | NotComputed {
  const companies = fit.sample.companies.length;
  const rows = rowCounts(fit);
  const means = companyMeansFit(fit.outcome, fit.regressors, rows);
  const terms = means.kept.length;
  if (terms === 0) {
    return { reason: 'The regressors have the same mean in all companies, so there is no term.' };
  }
  if (companies <= terms + 1) {
    return {
      reason: `The means of ${companies} companies leave nothing to judge ${terms} mean terms by.`,
    };
  }
  // Q'X̄, one row a term.
  const projected = means.basis.map((direction) =>
    Float64Array.from(means.columns, (column) => dot(direction, column)),
  );
  const transposedInverse = transpose(fit.inverseR, fit.slopes.length);
  const within = projected.map((weights) => timesVector(transposedInverse, weights.map(negative)));
  return {
    contrasts: Float64Array.from(
      means.basis,
      (direction, s) => dot(direction, means.outcome) - dot(projected[s], fit.slopes),
    ),
    companies: products.map((product, company) =>
      companyTerms(
        product,
        within,
        meanPart(means, rows[company] / fit.sample.year.length, company),
      ),
    ),
  };
}

/** A company's part of the constant and the means, in their orthonormal coordinates. */
interface MeanPart {
  /** √T_i times the company's row of them, length 1 + q. */
  readonly row: Float64Array;
  /** √T_i·u_i. */
  readonly residual: number;
  /** (1 − leverage)^(−½), or 0. */
  readonly adjustment: number;
}

function meanPart(means: CompanyMeansFit, share: number, company: number): MeanPart {
  const rest = 1 - means.leverages[company];
  return {
    row: Float64Array.of(Math.sqrt(share), ...means.basis.map((column) => column[company])),
    residual: means.residuals[company],
    adjustment: rest < leverageFloor ? 0 : 1 / Math.sqrt(rest),
  };
}

/** @param within  the contrasts in the coordinates of the fit's basis; in those of the means they are the unit vectors. */
function companyTerms(
  { cross, score, adjustment }: CompanyProduct,
  within: readonly Float64Array[],
  means: MeanPart,
): ClusterTerms {
  const q = within.length;
  const adjusted = within.map((contrast) => timesVector(adjustment, contrast));
  const adjustedMeans = within.map((_, s) => means.adjustment * means.row[s + 1]);
  const own = new Float64Array(q * q);
  for (let s = 0; s < q; s += 1) {
    for (let t = 0; t < q; t += 1) {
      own[s * q + t] =
        bilinear(cross, adjusted[s], adjusted[t]) + adjustedMeans[s] * adjustedMeans[t];
    }
  }
  return {
    own,
    shared: adjusted.map((vector, s) =>
      Float64Array.of(
        ...timesVector(cross, vector),
        ...means.row.map((value) => value * adjustedMeans[s]),
      ),
    ),
    score: Float64Array.from(
      adjusted,
      (vector, s) => dot(vector, score) + adjustedMeans[s] * means.residual,
    ),
  };
}

function rowCounts({ sample }: WithinFit): Float64Array {
  return Float64Array.from(
    sample.companies,
    (_, company) => sample.starts[company + 1] - sample.starts[company],
  );
}

function negative(value: number): number {
  return -value;
}
