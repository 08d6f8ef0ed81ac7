import { tQuantile, tTwoSided } from '../distributions/t-distribution';
import type { SlopeEstimate } from '../fit-result';
import {
  type SlopeDegreesOfFreedom,
  symmetricInterval,
  twoSidedQuantile,
  varianceTolerance,
  withoutInterval,
} from '../prediction';
import { isPerfectFit, perfectFitReason } from '../regression/goodness';
import { classical } from './covariances/classical';
import type { MatrixMethod, SlopeCovariance } from './covariance-method';
import { satterthwaiteDegreesOfFreedom, satterthwaiteForms } from './satterthwaite';
import type { SlopeGround } from './slope-ground';

/** Slopes with a method's covariance and its degrees of freedom. */
export function slopeEstimates(
  ground: SlopeGround,
  method: MatrixMethod,
  covariance: SlopeCovariance,
  confidence: number,
): SlopeEstimate[] {
  const { fit } = ground;
  const size = fit.slopes.length;
  const judged = judgedSlopes(ground, covariance.matrix);
  const isPerfect = isPerfectFit(fit);
  return fit.sample.regressorNames.map((name, k): SlopeEstimate => {
    const estimate = fit.slopes[k];
    const degreesOfFreedom = slopeDegreesOfFreedom(ground, method, k);
    if (isPerfect || degreesOfFreedom === null || !judged[k]) {
      const reason = isPerfect ? perfectFitReason : method.noVarianceReason(ground);
      return {
        name,
        ...withoutInterval(estimate, reason),
        statistic: null,
        degreesOfFreedom,
        pValue: null,
      };
    }
    const standardError = Math.sqrt(covariance.matrix[k * size + k]);
    const quantile = twoSidedQuantile(tQuantile, confidence, degreesOfFreedom);
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

/** Whether each slope has more variance than rounding leaves: measured by its classical one. */
export function judgedSlopes(ground: SlopeGround, covariance: Float64Array): boolean[] {
  const size = ground.fit.slopes.length;
  const { matrix } = classical.covariance(ground);
  return Array.from({ length: size }, (_, k) => {
    const at = k * size + k;
    return covariance[at] > varianceTolerance * matrix[at];
  });
}

/** Degrees of freedom of every contrast of slopes, for prediction. */
export function contrastDegrees(ground: SlopeGround, method: MatrixMethod): SlopeDegreesOfFreedom {
  const { degreesOfFreedom } = method;
  return degreesOfFreedom === 'satterthwaite'
    ? satterthwaiteForms(ground.fit, ground.products)
    : { kind: 'fixed', value: degreesOfFreedom(ground) };
}

function slopeDegreesOfFreedom(
  { fit, products }: SlopeGround,
  { degreesOfFreedom }: MatrixMethod,
  slope: number,
): number | null {
  if (degreesOfFreedom !== 'satterthwaite') return degreesOfFreedom({ fit, products });
  const weights = fit.slopes.map((_, index) => (index === slope ? 1 : 0));
  return satterthwaiteDegreesOfFreedom(fit, products, weights);
}
