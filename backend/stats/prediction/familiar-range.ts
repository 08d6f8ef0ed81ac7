import type { ObservedRange, PredictionBasis } from './prediction-basis';
import { quadraticForm } from './quadratic-form';

/** Where a planned value lies against an observed range. */
export type RangePlace = 'below' | 'within' | 'above';

export interface RegressorPlace {
  readonly regressor: string;
  readonly planned: number;
  readonly own: RangePlace;
  readonly peers: RangePlace;
}

/** How far a plan lies from what the peer group has shown. */
export interface FamiliarRange {
  /** `inside` up to the own company's largest leverage, `edge` up to the largest of any company, else `outside`. */
  readonly kind: 'inside' | 'edge' | 'outside';
  /** x̃'Q⁻¹x̃ of the plan's distance from the own company's means. */
  readonly leverage: number;
  readonly reasons: readonly RegressorPlace[];
  /** The last plan inside on the line from the last actual values to this plan; the plan itself where it is inside. */
  readonly nearestInside: readonly number[];
}

/**
 * Leverage of a plan against the sample's own, and each planned value against the observed ranges.
 *
 * @param regressors  planned values, in the order and measure of `basis.regressors`.
 */
export function familiarRange(
  basis: PredictionBasis,
  regressors: readonly number[],
): FamiliarRange {
  const leverage = leverageOf(basis, regressors);
  const kind =
    leverage <= basis.largestOwnLeverage
      ? 'inside'
      : leverage <= basis.largestLeverage
        ? 'edge'
        : 'outside';
  return {
    kind,
    leverage,
    reasons: basis.regressors.map((regressor, k) => ({
      regressor,
      planned: regressors[k],
      own: placeIn(basis.ownRange[k], regressors[k]),
      peers: placeIn(basis.peerRange[k], regressors[k]),
    })),
    nearestInside: kind === 'inside' ? regressors : shrinkInside(basis, regressors),
  };
}

function leverageOf(basis: PredictionBasis, regressors: readonly number[]): number {
  return quadraticForm(
    basis.inverseCrossProduct,
    regressors.map((value, k) => value - basis.ownMeans[k]),
  );
}

/** Bisection: leverage is convex along the line and the last actual values lie inside. */
function shrinkInside(basis: PredictionBasis, regressors: readonly number[]): readonly number[] {
  const start = basis.last.regressors;
  const at = (share: number): number[] =>
    start.map((value, k) => value + share * (regressors[k] - value));
  let inside = 0;
  let outside = 1;
  for (let step = 0; step < 60; step += 1) {
    const middle = (inside + outside) / 2;
    if (leverageOf(basis, at(middle)) <= basis.largestOwnLeverage) inside = middle;
    else outside = middle;
  }
  return at(inside);
}

function placeIn(range: ObservedRange, value: number): RangePlace {
  if (value < range.low) return 'below';
  return value > range.high ? 'above' : 'within';
}
