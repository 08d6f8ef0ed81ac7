import { betweenEstimator } from './between';
import type { Estimator } from './estimator';
import { firstDifferencesEstimator } from './first-differences';
import { fixedEffectsEstimator } from './fixed-effects';
import { pooledEstimator } from './pooled';
import { randomEffectsEstimator } from './random-effects';

/** Every estimator of the slopes, in the order they are shown; a new one is one file and one line here. */
export const estimatorTable: readonly Estimator[] = [
  fixedEffectsEstimator,
  pooledEstimator,
  betweenEstimator,
  randomEffectsEstimator,
  firstDifferencesEstimator,
];
