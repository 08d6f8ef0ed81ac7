import { basisError } from './basis-error';
import { differenceOfPlans } from './decomposition';
import { shownFactor } from './expected-value';
import { type IntervalEstimate, symmetricInterval, withoutInterval } from './interval-estimate';
import { inModelScale } from './model-scale';
import type { Outlook } from './outlook';
import { plannedContrast } from './planned-contrast';
import type { PredictionBasis } from './prediction-basis';
import type { TQuantile } from './two-sided-quantile';

/** One scenario in one year. */
export interface ScenarioSide {
  /** What the model reads in that year, in the panel's measure; see `planRegressors`. */
  readonly regressors: readonly number[];
  readonly outlook: Outlook;
}

/** The expected value of one scenario less that of another, in the model's scale: in logs `asFactor` is their ratio. */
export interface ScenarioDifference extends IntervalEstimate {
  /** Whose interval it is: that of a contrast of slopes alone, or the calibrated one. */
  readonly kind: 'slopes' | 'calibrated';
  /** In log form, where one side shows a mean and the other a median: what of the estimate is ln of Duan's factor, taken as known; else 0. */
  readonly smearing: number;
}

/**
 * Left less right as one contrast w = w_left − w_right over the centred basis, never as the difference of two intervals.
 * Where the sides start alike and take the same year effect, own and year weights cancel exactly: a contrast of slopes
 * b'(x_left − x_right) is left, with the covariance chosen for them and Satterthwaite's degrees of freedom of that
 * contrast. Otherwise the own weight s_right − s_left (s = ρ^h where the gap is carried) or a year's weight stays, and the
 * calibrated interval of w holds. A given year effect, like the last actual value, is a number and has no weight.
 *
 * @throws {RangeError} as `expectedValue`.
 */
export function differenceOfScenarios(
  basis: PredictionBasis,
  left: ScenarioSide,
  right: ScenarioSide,
  tQuantile: TQuantile,
): ScenarioDifference {
  const [of, less] = [left, right].map(({ regressors, outlook }) =>
    plannedContrast(basis, inModelScale(basis, regressors), outlook),
  );
  const weights = of.weights.map((weight, index) => weight - less.weights[index]);
  const slopes = differenceOfPlans(basis, left.regressors, right.regressors, tQuantile);
  const smearing = smearingOf(basis, left.outlook) - smearingOf(basis, right.outlook);
  const beside = of.besidePlan - less.besidePlan + smearing;
  if (isOfSlopesAlone(basis, weights)) {
    return { kind: 'slopes', smearing, ...moved(slopes, beside) };
  }
  const estimate = slopes.estimate + beside;
  const error = basisError(basis, weights);
  const interval =
    error.standardError === null
      ? withoutInterval(estimate, error.reason)
      : symmetricInterval(estimate, error.standardError, basis.quantile);
  return { kind: 'calibrated', smearing, ...interval };
}

function isOfSlopesAlone(basis: PredictionBasis, weights: readonly number[]): boolean {
  const size = basis.regressors.length;
  return weights.every((weight, index) => weight === 0 || (index > 0 && index <= size));
}

function moved(interval: IntervalEstimate, by: number): IntervalEstimate {
  const { estimate, low, high } = interval;
  const move = (end: number | null): number | null => (end === null ? null : end + by);
  return { ...interval, estimate: estimate + by, low: move(low), high: move(high) };
}

/** ln of what makes the shown value of exp(·); 0 in levels. */
function smearingOf(basis: PredictionBasis, outlook: Outlook): number {
  return basis.form === 'log' ? Math.log(shownFactor(basis, outlook)) : 0;
}
