import { basisError } from './basis-error';
import { shownFactor } from './expected-value';
import { fiellerRange, type FiellerRange } from './fieller';
import { inModelScale } from './model-scale';
import { heldNumber } from './out-of-logs';
import { carryingReason, type Outlook } from './outlook';
import { plannedContrast } from './planned-contrast';
import type { PredictionBasis } from './prediction-basis';
import { weightedSum } from './quadratic-form';
import { unreadableReason } from './model-scale';

export interface ReachRequest extends Outlook {
  /** The expected value wanted, in the panel's measure; in log form the mean or, where the gap is carried, the median. */
  readonly target: number;
  /** Index of the regressor that is solved for. */
  readonly regressor: number;
  /** What the model reads in that year, in the panel's measure: the other regressors as planned; see `planRegressors`. */
  readonly regressors: readonly number[];
}

/** The value of one regressor that reaches a target, or why there is none. Panel's measure. */
export type Reach =
  | {
      readonly value: number;
      /** All values whose expected value the data cannot tell from the target; may be no finite range. */
      readonly range: FiellerRange | null;
      /** Why there is no range. */
      readonly rangeReason?: string;
    }
  | { readonly value: null; readonly reason: string };

/**
 * Solves expected value = target for one regressor of one year. The range holds every ξ with
 * (A0 + ξA1 − target)² ≤ t_B²·c·T·mean_j(Λ_j0 + ξΛ_j1)², c and B taken once at the solution. Log form: on logs.
 *
 * @see Fieller (1954), Journal of the Royal Statistical Society B 16, 175–185.
 */
export function reachValue(basis: PredictionBasis, request: ReachRequest): Reach {
  const { target, regressor, regressors } = request;
  const isLog = basis.form === 'log';
  const reason = requestReason(basis, request);
  if (reason !== undefined) return { value: null, reason };
  // Where the solution starts from is of no account: the own company's mean keeps the digits.
  const start = basis.ownMeans[regressor];
  const values = inModelScale(
    basis,
    regressors.map((value, k) => (k === regressor ? (isLog ? 1 : 0) : value)),
  ).map((value, k) => (k === regressor ? start : value));
  const wanted = isLog ? Math.log(target / shownFactor(basis, request)) : target;
  const slope = basis.coefficients[regressor + 1];
  const solution = start + (wanted - plannedContrast(basis, values, request).estimate) / slope;
  const value = isLog ? Math.exp(solution) : solution;
  if (heldValue(value, isLog) === null) {
    return { value: null, reason: 'No value that a number can hold reaches it.' };
  }
  const atSolution = values.map((other, k) => (k === regressor ? solution : other));
  const { weights } = plannedContrast(basis, atSolution, request);
  const error = basisError(basis, weights);
  if (error.standardError === null) return { value, range: null, rangeReason: error.reason };
  const ofSlope = basis.lambdas.map((lambda) => lambda[regressor + 1]);
  const factor = (basis.quantile ** 2 * error.calibration * basis.years) / basis.lambdas.length;
  const range = fiellerRange(slope, {
    m00: factor * weightedSum(error.lambdas, error.lambdas),
    m01: factor * weightedSum(error.lambdas, ofSlope),
    m11: factor * weightedSum(ofSlope, ofSlope),
  });
  const toMeasure = (distance: number): number | null =>
    heldValue(isLog ? Math.exp(solution + distance) : solution + distance, isLog);
  const inMeasure = placed(range, toMeasure);
  return inMeasure === null
    ? { value, range: null, rangeReason: rangeBeyondReason }
    : { value, range: inMeasure };
}

function requestReason(basis: PredictionBasis, request: ReachRequest): string | undefined {
  const { target, regressor, regressors } = request;
  const others = regressors.map((value, k) => (k === regressor ? 1 : value));
  if (!Number.isFinite(target)) return 'No value to reach is given.';
  if (basis.form === 'log' && !(target > 0)) return 'The log form reaches only values above zero.';
  const name = basis.regressors[regressor];
  if (name === undefined) return `There is no regressor ${regressor}.`;
  if (basis.coefficients[regressor + 1] === 0) {
    return `The slope of ${name} is zero, so no value of it reaches another.`;
  }
  const carrying = request.start === 'carry-the-gap' ? carryingReason(basis) : undefined;
  return unreadableReason(basis, others) ?? carrying;
}

/** A value that a double holds and the model reads: above zero in log form. */
function heldValue(value: number, isLog: boolean): number | null {
  return isLog && value === 0 ? null : heldNumber(value);
}

const rangeBeyondReason = 'An end of its range lies beyond what a number can hold.';

/** The range in the panel's measure. A ray that holds no number is not there; an interval without an end is null. */
function placed(
  range: FiellerRange,
  toMeasure: (distance: number) => number | null,
): FiellerRange | null {
  const place = (end: number | null): number | null => (end === null ? null : toMeasure(end));
  if (range.kind === 'interval') {
    const low = toMeasure(range.low);
    const high = toMeasure(range.high);
    return low === null || high === null ? null : { kind: 'interval', low, high };
  }
  return range.kind === 'rays'
    ? { kind: 'rays', upTo: place(range.upTo), from: place(range.from) }
    : range;
}
