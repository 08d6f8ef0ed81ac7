import type { EstimatorSummary } from '../evidence/evidence';
import type { OpenFit } from '../fit-parts';

/** A way to estimate the slopes: one file an estimator, one line in the table. */
export interface Estimator {
  readonly code: EstimatorSummary['code'];
  readonly name: string;
  /** Its definition in a sentence. */
  readonly definition: string;
  /** Where it comes from. */
  readonly source: string;
  /** Block of the golden files that holds its outside result. */
  readonly reference: string;
  figures(ground: EstimatorGround): EstimatorFigures;
}

/** What an estimator may read of a fit. */
export type EstimatorGround = Pick<
  OpenFit,
  'sample' | 'fit' | 'pooled' | 'inference' | 'specification'
>;

export type EstimatorFigures = Omit<EstimatorSummary, 'code'>;

/** Why something cannot be computed, in words. */
export interface NotComputed {
  readonly reason: string;
}

export function isNotComputed(value: object | NotComputed): value is NotComputed {
  return 'reason' in value;
}

/** The figures of an estimator that cannot be computed. */
export function noFigures(reason: string, observations: number): EstimatorFigures {
  return { slopes: null, constant: null, observations, degreesOfFreedom: null, reason };
}
