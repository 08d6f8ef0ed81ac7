import { solveUpperTransposed } from '../linear-algebra/triangular';
import type { WithinFit } from '../regression/within-fit';

/**
 * A contrast w'β in the form everything is computed from: row weights g_it = w_i/T_i + r'u_it, with u the orthonormal
 * basis of the demeaned regressors and r = R⁻ᵀ(w_b − Σ w_i·x̄_i).
 */
export interface Contrast {
  readonly companies: readonly number[];
  readonly weights: readonly number[];
  readonly slopePart: Float64Array;
}

/**
 * Contrast of company weights and slope weights.
 *
 * @param companies  ascending indices with weights that are not zero; the rest have none.
 * @param slopeWeights  w_b − Σ w_i·origin of each column; company means are kept as distances from these origins.
 */
export function contrastOf(
  fit: WithinFit,
  companies: readonly number[],
  weights: readonly number[],
  slopeWeights: ArrayLike<number>,
): Contrast {
  const distance = Float64Array.from(slopeWeights);
  fit.columns.forEach(({ means }, k) => {
    companies.forEach((company, index) => (distance[k] -= weights[index] * means[company]));
  });
  return { companies, weights, slopePart: solveUpperTransposed(fit.r, distance) };
}

/** The intercept a_i of one company. */
export function interceptContrast(fit: WithinFit, company: number): Contrast {
  return contrastOf(
    fit,
    [company],
    [1],
    fit.columns.map(({ origin }) => -origin),
  );
}

/** a_left − a_right. */
export function pairContrast(fit: WithinFit, left: number, right: number): Contrast {
  const none = new Float64Array(fit.columns.length);
  return left < right
    ? contrastOf(fit, [left, right], [1, -1], none)
    : contrastOf(fit, [right, left], [-1, 1], none);
}

/** a_own minus the unweighted mean of all others. */
export function standingContrast(fit: WithinFit, own: number): Contrast {
  const companies = fit.sample.companies.map((_, company) => company);
  const share = -1 / (companies.length - 1);
  return contrastOf(
    fit,
    companies,
    companies.map((company) => (company === own ? 1 : share)),
    new Float64Array(fit.columns.length),
  );
}

/** A company's level at its own means, a_i + x̄_i'b (+ the mean of its years' effects): the mean of its outcomes. */
export function levelContrast(fit: WithinFit, company: number): Contrast {
  return { companies: [company], weights: [1], slopePart: new Float64Array(fit.columns.length) };
}

/** One slope, or a combination of slopes; K weights. */
export function slopeContrast(fit: WithinFit, slopeWeights: ArrayLike<number>): Contrast {
  return columnContrast(fit, [...new Float64Array(fit.yearColumns), ...Array.from(slopeWeights)]);
}

/** A combination of the design's coefficients, years and slopes; P weights. */
export function columnContrast(fit: WithinFit, weights: ArrayLike<number>): Contrast {
  return { companies: [], weights: [], slopePart: solveUpperTransposed(fit.r, weights) };
}
