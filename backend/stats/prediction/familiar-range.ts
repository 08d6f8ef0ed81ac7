import { inModelScale, inPanelMeasure } from './model-scale';
import { lastInModelScale } from './planned-contrast';
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
  /** x̃'Q⁻¹x̃ of the plan's distance from the own company's means, in the model's scale and without the 1/T of an intercept. */
  readonly leverage: number;
  readonly reasons: readonly RegressorPlace[];
  /**
   * The last plan inside on the line from what the model last read to this plan; the plan itself where it is inside. In
   * log form that line is straight in logs. Panel's measure.
   */
  readonly nearestInside: readonly number[];
}

/**
 * Leverage of a plan against the sample's own, and each planned value against the observed ranges.
 *
 * @param regressors  planned values, in the order of `basis.regressors` and the panel's measure.
 * @throws {RangeError} for values the model cannot read.
 */
export function familiarRange(
  basis: PredictionBasis,
  regressors: readonly number[],
): FamiliarRange {
  const values = inModelScale(basis, regressors);
  const leverage = leverageOf(basis, values);
  const kind = kindOf(basis, leverage);
  return {
    kind,
    leverage,
    reasons: basis.regressors.map((regressor, k) => ({
      regressor,
      planned: regressors[k],
      own: placeIn(basis.ownRange[k], regressors[k]),
      peers: placeIn(basis.peerRange[k], regressors[k]),
    })),
    nearestInside: kind === 'inside' ? regressors : shrinkInside(basis, values),
  };
}

/**
 * Where a plan lies, and nothing else of its familiar range.
 *
 * @throws {RangeError} for values the model cannot read.
 */
export function familiarKind(
  basis: PredictionBasis,
  regressors: readonly number[],
): FamiliarRange['kind'] {
  return kindOf(basis, leverageOf(basis, inModelScale(basis, regressors)));
}

function kindOf(basis: PredictionBasis, leverage: number): FamiliarRange['kind'] {
  if (leverage <= basis.largestOwnLeverage) return 'inside';
  return leverage <= basis.largestLeverage ? 'edge' : 'outside';
}

function leverageOf(basis: PredictionBasis, values: readonly number[]): number {
  return quadraticForm(
    basis.inverseCrossProduct,
    values.map((value, k) => value - basis.ownMeans[k]),
  );
}

/** Bisection: leverage is convex along the line and what the model last read lies inside. Panel's measure. */
function shrinkInside(basis: PredictionBasis, values: readonly number[]): readonly number[] {
  const start = lastInModelScale(basis);
  const at = (share: number): readonly number[] =>
    inPanelMeasure(
      basis,
      start.map((value, k) => value + share * (values[k] - value)),
    );
  let nearest = basis.last.regressors;
  let inside = 0;
  let outside = 1;
  for (let step = 0; step < 60; step += 1) {
    const middle = (inside + outside) / 2;
    const candidate = at(middle);
    if (leverageOf(basis, inModelScale(basis, candidate)) <= basis.largestOwnLeverage) {
      inside = middle;
      nearest = candidate;
    } else outside = middle;
  }
  return nearest;
}

function placeIn(range: ObservedRange, value: number): RangePlace {
  if (value < range.low) return 'below';
  return value > range.high ? 'above' : 'within';
}
