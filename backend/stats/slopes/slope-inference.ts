import type { SlopeCovarianceName } from '../fit-result';
import type { CovarianceMethod, InferenceOptions, SlopeInference } from './covariance-method';
import { covarianceTable } from './covariance-table';
import { contrastDegrees, slopeEstimates } from './slope-estimates';
import type { SlopeGround } from './slope-ground';

export type { InferenceOptions, SlopeInference, SlopeNote } from './covariance-method';

/** The slopes with one covariance of the table. */
export function slopeInference(
  ground: SlopeGround,
  name: SlopeCovarianceName,
  options: InferenceOptions,
): SlopeInference {
  const method: CovarianceMethod = covarianceTable[name];
  if (method.kind === 'bootstrap') {
    return {
      ...method.bootstrap(ground, options),
      covariance: null,
      covarianceReason: method.covarianceReason,
      degrees: null,
    };
  }
  const covariance = method.covariance(ground);
  return {
    slopes: slopeEstimates(ground, method, covariance, options.confidence),
    covariance: covariance.matrix,
    degrees: contrastDegrees(ground, method),
    noVarianceReason: method.noVarianceReason(ground),
    notes: covariance.notes,
  };
}
