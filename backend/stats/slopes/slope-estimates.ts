import { tQuantile, tTwoSided } from '../distributions/t-distribution';
import type { SlopeCovarianceName, SlopeEstimate } from '../fit-result';
import type { SquareMatrix } from '../linear-algebra/square-matrix';
import {
  type SlopeDegreesOfFreedom,
  symmetricInterval,
  twoSidedQuantile,
  varianceTolerance,
  withoutInterval,
} from '../prediction';
import { isPerfectFit, perfectFitReason } from '../regression/goodness';
import type { WithinFit } from '../regression/within-fit';
import type { CompanyProduct } from './company-products';
import { slopeCovariance } from './slope-covariance';
import { satterthwaiteDegreesOfFreedom, satterthwaiteForms } from './satterthwaite';

const noVarianceReason =
  'No variance is left to judge it by: one company alone determines this slope.';

/** Slopes with the covariance and the degrees of freedom chosen in the specification. */
export function slopeEstimates(
  fit: WithinFit,
  products: readonly CompanyProduct[],
  covariance: SquareMatrix,
  options: { readonly name: SlopeCovarianceName; readonly confidence: number },
): SlopeEstimate[] {
  const size = fit.slopes.length;
  const isPerfect = isPerfectFit(fit);
  const classical = slopeCovariance(fit, products, 'classical');
  return fit.sample.regressorNames.map((name, k): SlopeEstimate => {
    const estimate = fit.slopes[k];
    const weights = Float64Array.from({ length: size }, (_, index) => (index === k ? 1 : 0));
    const degreesOfFreedom =
      options.name === 'cr2'
        ? satterthwaiteDegreesOfFreedom(fit, products, weights)
        : fixedDegreesOfFreedom(fit, options.name);
    const variance = covariance[k * size + k];
    const isJudged = variance > varianceTolerance * classical[k * size + k];
    const standardError = Math.sqrt(variance);
    if (isPerfect || degreesOfFreedom === null || !isJudged) {
      const reason = isPerfect ? perfectFitReason : noVarianceReason;
      return {
        name,
        ...withoutInterval(estimate, reason),
        statistic: null,
        degreesOfFreedom,
        pValue: null,
      };
    }
    const quantile = twoSidedQuantile(tQuantile, options.confidence, degreesOfFreedom);
    const statistic = estimate / standardError;
    return {
      name,
      ...symmetricInterval(estimate, standardError, quantile),
      statistic,
      degreesOfFreedom,
      pValue: tTwoSided(statistic, degreesOfFreedom),
    };
  });
}

/** Degrees of freedom of every contrast of slopes, for prediction. */
export function contrastDegrees(
  fit: WithinFit,
  products: readonly CompanyProduct[],
  name: SlopeCovarianceName,
): SlopeDegreesOfFreedom {
  return name === 'cr2'
    ? satterthwaiteForms(fit, products)
    : { kind: 'fixed', value: fixedDegreesOfFreedom(fit, name) };
}

/** G − 1 by company, n − N − K classical. */
function fixedDegreesOfFreedom(fit: WithinFit, name: Exclude<SlopeCovarianceName, 'cr2'>): number {
  return name === 'classical' ? fit.residualDegreesOfFreedom : fit.sample.companies.length - 1;
}
