export { applyRules, type RuledPlan, type RuleReason, type RuleRequest } from './apply-rules';
export { atConfidence } from './at-confidence';
export {
  type Decomposition,
  type DecompositionFromLast,
  type DecompositionTerm,
  decompositionFromLast,
  decompositionToBase,
  differenceOfPlans,
} from './decomposition';
export {
  differenceOfScenarios,
  type ScenarioDifference,
  type ScenarioSide,
} from './difference-of-scenarios';
export { differenceToPeer, type PeerDifference, peersMean } from './difference-to-peer';
export type { MarketFan } from './draw-year';
export { type ExpectedValue, expectedValue, type LogFigures } from './expected-value';
export {
  type FamiliarRange,
  familiarRange,
  type RangePlace,
  type RegressorPlace,
} from './familiar-range';
export { type Fan, fanPercents } from './fan';
export type { FiellerRange } from './fieller';
export { type IntervalEstimate, symmetricInterval, withoutInterval } from './interval-estimate';
export {
  bandErrors,
  type BandOutlook,
  type MarketValueBand,
  marketValueBand,
} from './market-value-band';
export { inModelScale, unreadableReason } from './model-scale';
export { asFactor, heldNumber, type OutOfLogs, outOfLogs } from './out-of-logs';
export {
  carryingReason,
  chosenYearEffect,
  type Outlook,
  type StartingPoint,
  stepsAhead,
  type YearEffectChoice,
} from './outlook';
export {
  heldRegressors,
  planRegressors,
  type PlanYear,
  type ReadableYear,
} from './plan-regressors';
export { percentile } from './percentile';
export type { PlanMove, PlanRule, TotalSpread } from './plan-rule';
export { type PredictedYear, type PredictRequest, predict } from './predict';
export {
  type ObservedRange,
  type OwnErrors,
  type OwnYear,
  type PeerYear,
  type PredictionBasis,
  type SlopeDegreesOfFreedom,
  type YearEffectEstimates,
  yearEffectOrder,
} from './prediction-basis';
export { quadraticForm } from './quadratic-form';
export { randomWords, seededWords } from './random-words';
export { type Reach, type ReachRequest, reachValue } from './reach-value';
export {
  type RegressorSensitivity,
  type Sensitivity,
  sensitivity,
  type SensitivityEnd,
  type SensitivityRequest,
} from './sensitivity';
export { contrastDegreesOfFreedom, differenceToBase, varianceTolerance } from './slope-contrast';
export { type Triangle, triangularQuantile } from './triangular';
export { type TQuantile, twoSidedQuantile } from './two-sided-quantile';
export {
  type UncertainPlanRequest,
  type UncertainPlanYear,
  type UncertainYear,
  uncertainPlan,
} from './uncertain-plan';
export { uniformDraws } from './uniform-draws';
