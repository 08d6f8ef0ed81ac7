import { tQuantile } from '../distributions/t-distribution';
import { twoSidedQuantile } from '../prediction';
import { totalSquares } from '../regression/goodness';
import { sumOfSquares } from '../regression/sum-of-squares';
import { classicalCovariance, exactReason, slopesWithIntervals } from './classical-slopes';
import type { Estimator } from './estimator';

/** The pooled regression of the fit, with classical intervals. */
export const pooledEstimator: Estimator = {
  code: 'pooled',
  name: 'Pooled',
  definition:
    'Least squares with one constant for all companies and years, as if every row were a company of its own.',
  source: 'Wooldridge (2010), Econometric Analysis of Cross Section and Panel Data, 2nd ed., §7.8',
  reference: 'pooled_ols',
  figures: ({ sample, fit, pooled, specification }) => {
    const names = sample.regressorNames;
    const observations = sample.year.length;
    const degreesOfFreedom = observations - names.length - 1;
    const rest = sumOfSquares(pooled.residuals);
    return {
      slopes: slopesWithIntervals(
        names,
        names.map((name) => pooled.pooled.slopes[name]),
        classicalCovariance(pooled.inverseR, rest / degreesOfFreedom),
        {
          quantile: twoSidedQuantile(tQuantile, specification.confidence, degreesOfFreedom),
          reason: exactReason(fit, rest, totalSquares(fit)),
        },
      ),
      constant: pooled.pooled.constant,
      observations,
      degreesOfFreedom,
      ...(fit.yearColumns === 0 ? {} : { reason: 'Without the year effects of this fit.' }),
    };
  },
};
