import type { Estimator } from './estimator';

/** The fit itself, with the intervals of its specification. */
export const fixedEffectsEstimator: Estimator = {
  code: 'fixed-effects',
  name: 'Fixed effects',
  definition:
    'Least squares with an intercept for each company: the slopes come from changes within companies only.',
  source: 'Wooldridge (2010), Econometric Analysis of Cross Section and Panel Data, 2nd ed., §10.5',
  reference: 'within_fit',
  figures: ({ sample, inference }) => {
    const [first, ...others] = inference.slopes.map(({ degreesOfFreedom }) => degreesOfFreedom);
    return {
      slopes: inference.slopes.map(
        ({ name, estimate, standardError, low, high, intervalReason }) => ({
          name,
          estimate,
          standardError,
          low,
          high,
          ...(intervalReason === undefined ? {} : { intervalReason }),
        }),
      ),
      constant: null,
      observations: sample.year.length,
      // Satterthwaite's differ from slope to slope: then no one number is the estimator's.
      degreesOfFreedom: others.every((value) => value === first) ? first : null,
    };
  },
};
