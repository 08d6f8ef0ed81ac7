import type { SlopeCovarianceName, SlopeEstimate } from '../fit-result';
import type { SquareMatrix } from '../linear-algebra/square-matrix';
import type { SlopeDegreesOfFreedom } from '../prediction';
import { slopeCovariance } from './slope-covariance';
import { contrastDegrees, slopeEstimates } from './slope-estimates';
import type { SlopeGround } from './slope-ground';

export interface SlopeInference {
  readonly slopes: readonly SlopeEstimate[];
  /** K × K; null with a reason where the method has none. */
  readonly covariance: SquareMatrix | null;
  readonly covarianceReason?: string;
  /** Degrees of freedom of every contrast of slopes, for prediction; null without a covariance. */
  readonly degrees: SlopeDegreesOfFreedom | null;
  /** What has to be said beside the figures. */
  readonly notes: readonly SlopeNote[];
}

export interface SlopeNote {
  readonly code: 'wild-set-disconnected' | 'negative-eigenvalues';
  readonly detail: string;
}

export interface InferenceOptions {
  readonly confidence: number;
  /** Of the bootstrap's draws; null for the others. */
  readonly seed: number | null;
  /** Told the share done, 0 to 1; of a bootstrap, the only one that takes long. */
  readonly onProgress?: (share: number) => void;
}

/** The slopes with one covariance of the table. */
export function slopeInference(
  ground: SlopeGround,
  name: SlopeCovarianceName,
  { confidence }: InferenceOptions,
): SlopeInference {
  const { fit, products } = ground;
  const known = name as 'cr2';
  const covariance = slopeCovariance(fit, products, known);
  return {
    slopes: slopeEstimates(fit, products, covariance, { name: known, confidence }),
    covariance,
    degrees: contrastDegrees(fit, products, known),
    notes: [],
  };
}
