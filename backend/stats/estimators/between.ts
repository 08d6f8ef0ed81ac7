import { tQuantile } from '../distributions/t-distribution';
import { twoSidedQuantile } from '../prediction';
import { sumOfSquares } from '../regression/sum-of-squares';
import type { WithinFit } from '../regression/within-fit';
import { classicalCovariance, exactReason, slopesWithIntervals } from './classical-slopes';
import { type CompanyMeansFit, companyMeansFit } from './company-means-fit';
import { type Estimator, isNotComputed, noFigures, type NotComputed } from './estimator';

/**
 * Least squares of the companies' means, each company counted once, with one constant: N means, K slopes.
 * Year effects drop out of the means where all companies have the same years.
 */
export function betweenFit(fit: WithinFit): CompanyMeansFit | NotComputed {
  const { sample, regressors } = fit;
  const companies = sample.companies.length;
  const slopes = regressors.length;
  if (companies <= slopes + 1) {
    return {
      reason: `The means of ${companies} companies cannot tell ${slopes} slopes and a constant and leave anything to judge them by.`,
    };
  }
  const isBalanced = sample.year.length === companies * sample.years.length;
  if (fit.yearColumns > 0 && !isBalanced) {
    return {
      reason:
        'Compares models without year effects: with different years a company they stay in the means.',
    };
  }
  const means = companyMeansFit(fit.outcome, regressors, new Float64Array(companies).fill(1));
  if (means.kept.length === slopes) return means;
  const missing = sample.regressorNames.filter((_, k) => !means.kept.includes(k));
  return {
    reason: `Between companies the means of ${missing.join(', ')} do not vary on their own.`,
  };
}

export const betweenEstimator: Estimator = {
  code: 'between',
  name: 'Between',
  definition:
    'Least squares of the companies’ means, each company counted once: the slopes come from differences between companies only.',
  source: 'Baltagi (2013), Econometric Analysis of Panel Data, 5th ed., §2.3',
  reference: 'between',
  figures: ({ sample, fit, specification }) => {
    const observations = sample.companies.length;
    const means = betweenFit(fit);
    if (isNotComputed(means)) return noFigures(means.reason, observations);
    const { coefficients, centres, outcomeCentre, residualSquares } = means;
    const degreesOfFreedom = observations - coefficients.length - 1;
    return {
      slopes: slopesWithIntervals(
        sample.regressorNames,
        coefficients,
        classicalCovariance(means.inverseR, residualSquares / degreesOfFreedom),
        {
          quantile: twoSidedQuantile(tQuantile, specification.confidence, degreesOfFreedom),
          reason: exactReason(fit, residualSquares, sumOfSquares(means.outcome)),
        },
      ),
      constant: centres.reduce((rest, value, k) => rest - value * coefficients[k], outcomeCentre),
      observations,
      degreesOfFreedom,
    };
  },
};
