import { chiSquaredUpperTail } from '../distributions/chi-squared-upper-tail';
import { classicalCovariance } from '../estimators/classical-slopes';
import { isNotComputed } from '../estimators/estimator';
import { randomEffectsFit } from '../estimators/random-effects';
import { yearEffectsReason } from '../estimators/year-effects-reason';
import { bilinear, type SquareMatrix } from '../linear-algebra/square-matrix';
import { symmetricPower } from '../linear-algebra/symmetric-power';
import type { EvidenceTest } from './evidence-test';

/** Eigenvalues of the difference below this share of the fixed effects' variances are rounding. */
const definiteTolerance = 1e-12;

const notDefiniteReason =
  'The difference of the two covariances is not positive definite, so the test is not defined.';

/** d'(V_fixed − V_random)⁻¹d with d the difference of the slopes and both covariances classical. */
export const hausmanClassicalTest: EvidenceTest = {
  code: 'hausman-classical',
  name: 'Hausman, classical',
  definition:
    'Compares the slopes of fixed and of random effects, each with its classical covariance.',
  source: 'Hausman (1978), Econometrica 46, 1251–1271',
  reference: 'tests.hausman',
  inHolm: true,
  caution: 'Assumes errors that do not persist and have the same variance in all companies.',
  readings: {
    rejects: 'Random effects mix in differences between companies: read the fixed effects.',
    keeps: 'Fixed and random effects agree within chance; the fixed effects hold either way.',
    none: 'It says nothing here; the fixed effects need no such test.',
  },
  compute: ({ fit }) => {
    if (fit.yearColumns > 0) return { statistic: null, reason: yearEffectsReason };
    const random = randomEffectsFit(fit);
    if (isNotComputed(random)) return { statistic: null, reason: random.reason };
    const variance = fit.residualSquares / fit.residualDegreesOfFreedom;
    const fixed = classicalCovariance(fit.inverseR, variance);
    const size = fit.slopes.length;
    // In units of the fixed effects' standard errors, so that no regressor's measure decides what is definite.
    const errors = Float64Array.from(fit.slopes, (_, k) => Math.sqrt(fixed[k * size + k]));
    const gap = fit.slopes.map((slope, k) => (slope - random.slopes[k]) / errors[k]);
    const difference: SquareMatrix = fixed.map(
      (value, index) =>
        (value - random.covariance[index]) /
        (errors[Math.floor(index / size)] * errors[index % size]),
    );
    const inverse = symmetricPower(difference, size, -1, definiteTolerance);
    if (inverse.dropped > 0) return { statistic: null, reason: notDefiniteReason };
    const statistic = bilinear(inverse.matrix, gap, gap);
    return {
      statistic,
      distribution: 'chi-squared',
      degreesOfFreedom: [size],
      pValue: chiSquaredUpperTail(statistic, size),
    };
  },
};
