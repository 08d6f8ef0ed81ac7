import { basisError } from './basis-error';
import { shownFactor } from './expected-value';
import { type IntervalEstimate, symmetricInterval, withoutInterval } from './interval-estimate';
import { inModelScale } from './model-scale';
import { chosenYearEffect, gapShare, type Outlook } from './outlook';
import { lastInModelScale } from './planned-contrast';
import { type PredictionBasis, yearEffectOrder } from './prediction-basis';
import { differenceToBase } from './slope-contrast';
import type { TQuantile } from './two-sided-quantile';

/** b_k·Δx_k of one regressor, with its own interval. */
export interface DecompositionTerm extends IntervalEstimate {
  readonly regressor: string;
  /** Δx_k in the model's scale. */
  readonly change: number;
}

/**
 * A difference taken apart: `total` is the sum of the terms, in the model's scale. In log form these are logs, whose
 * `asFactor` multiply: the product of the factors is the ratio of the two values.
 */
export interface Decomposition {
  readonly terms: readonly DecompositionTerm[];
  readonly total: number;
}

/** The difference to the last actual market value: `total` is the sum of the terms and of all below. */
export interface DecompositionFromLast extends Decomposition {
  /** The part of the last actual value's distance from the model that fades, turned back: −(1 − ρ^h)·e_last, all of it at the model's level. */
  readonly fadingGap: number;
  /** The planned year's effect less the last one's; null without year effects. */
  readonly yearEffect: IntervalEstimate | null;
  /** In log form at the model's level: ln of the smearing factor, which makes a mean of the median; else 0. */
  readonly smearing: number;
}

/**
 * Plan against base, regressor by regressor: Σ b_k·Δx_k and nothing else.
 *
 * @param plan, base  in the order of `basis.regressors` and the panel's measure.
 * @throws {RangeError} for values the model cannot read.
 */
export function decompositionToBase(
  basis: PredictionBasis,
  plan: readonly number[],
  base: readonly number[],
  tQuantile: TQuantile,
): Decomposition {
  return slopeTerms(
    basis,
    differences(inModelScale(basis, plan), inModelScale(basis, base)),
    tQuantile,
  );
}

/** Plan against base as one figure with its interval, in the model's scale; plans as for `decompositionToBase`. */
export function differenceOfPlans(
  basis: PredictionBasis,
  plan: readonly number[],
  base: readonly number[],
  tQuantile: TQuantile,
): IntervalEstimate {
  const changes = differences(inModelScale(basis, plan), inModelScale(basis, base));
  return differenceToBase(basis, changes, tQuantile);
}

/**
 * Plan against the last actual market value: the slopes' terms, the part of the gap that fades and the change of the
 * year effect. In log form the total is ln(expected) − ln(last actual), of the mean or, where the gap is carried, the median.
 *
 * @throws {RangeError} as `expectedValue`.
 */
export function decompositionFromLast(
  basis: PredictionBasis,
  plan: readonly number[],
  tQuantile: TQuantile,
  outlook: Outlook = {},
): DecompositionFromLast {
  const changes = differences(inModelScale(basis, plan), lastInModelScale(basis));
  const { terms, total } = slopeTerms(basis, changes, tQuantile);
  const fadingGap = -(1 - gapShare(basis, outlook)) * basis.last.residual;
  const yearEffect = yearEffectChange(basis, outlook);
  const smearing = basis.form === 'log' ? Math.log(shownFactor(basis, outlook)) : 0;
  return {
    terms,
    fadingGap,
    yearEffect,
    smearing,
    total: total + fadingGap + (yearEffect?.estimate ?? 0) + smearing,
  };
}

/** b_k·Δx_k, one a regressor; `changes` in the model's scale. */
export function slopeTerms(
  basis: PredictionBasis,
  changes: readonly number[],
  tQuantile: TQuantile,
): Decomposition {
  const terms = basis.regressors.map((regressor, k): DecompositionTerm => {
    const change = changes[k];
    const alone = basis.regressors.map((_, index) => (index === k ? change : 0));
    return { regressor, change, ...differenceToBase(basis, alone, tQuantile) };
  });
  return { terms, total: terms.reduce((sum, term) => sum + term.estimate, 0) };
}

/** c_h − c_last with its calibrated interval. */
function yearEffectChange(
  basis: PredictionBasis,
  { yearEffect }: Outlook,
): IntervalEstimate | null {
  const { yearEffects } = basis;
  if (yearEffects === undefined || yearEffects === null) return null;
  const { effect, estimated } = chosenYearEffect(yearEffects, yearEffect);
  const estimate = effect - yearEffects.ownLast;
  if (estimated === 'last' && yearEffects.lastYear === basis.last.year) {
    return { estimate: 0, standardError: 0, low: 0, high: 0 };
  }
  const ofYears = yearEffectOrder.map((name) => {
    if (name === 'ownLast') return -1;
    return name === estimated ? 1 : 0;
  });
  const error = basisError(basis, [0, ...basis.regressors.map(() => 0), ...ofYears]);
  return error.standardError === null
    ? withoutInterval(estimate, error.reason)
    : symmetricInterval(estimate, error.standardError, basis.quantile);
}

function differences(left: readonly number[], right: readonly number[]): number[] {
  return left.map((value, k) => value - right[k]);
}
