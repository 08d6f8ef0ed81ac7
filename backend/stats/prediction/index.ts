export {
  type Decomposition,
  type DecompositionFromLast,
  type DecompositionTerm,
  decompositionFromLast,
  decompositionToBase,
} from './decomposition';
export { expectedValue } from './expected-value';
export {
  type FamiliarRange,
  familiarRange,
  type RangePlace,
  type RegressorPlace,
} from './familiar-range';
export { type IntervalEstimate, symmetricInterval, withoutInterval } from './interval-estimate';
export type {
  ObservedRange,
  OwnYear,
  PredictionBasis,
  SlopeDegreesOfFreedom,
} from './prediction-basis';
export { quadraticForm } from './quadratic-form';
export { contrastDegreesOfFreedom, differenceToBase, varianceTolerance } from './slope-contrast';
export { type TQuantile, twoSidedQuantile } from './two-sided-quantile';
