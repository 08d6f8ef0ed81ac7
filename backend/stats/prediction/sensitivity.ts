import { differenceOfPlans } from './decomposition';
import { beyondReason, type ExpectedValue, heldExpectedValue } from './expected-value';
import { familiarKind, type FamiliarRange } from './familiar-range';
import type { IntervalEstimate } from './interval-estimate';
import { unreadableReason } from './model-scale';
import { carryingReason, type Outlook } from './outlook';
import type { PredictionBasis } from './prediction-basis';
import type { TQuantile } from './two-sided-quantile';

export interface SensitivityRequest extends Outlook {
  /** What the model reads in that year, in the panel's measure; see `planRegressors`. */
  readonly regressors: readonly number[];
}

/** The plan with one regressor at an end of the peers' spread, all else as planned. */
export type SensitivityEnd = {
  /** The regressor's value there, in the panel's measure. */
  readonly value: number;
  /** Where the whole plan lies with that value. */
  readonly familiar: FamiliarRange['kind'];
} & ({ readonly expected: ExpectedValue } | { readonly expected: null; readonly reason: string });

export interface RegressorSensitivity {
  /** Index in `basis.regressors`, and the name there. */
  readonly index: number;
  readonly regressor: string;
  readonly planned: number;
  /** At the peers' 10th and at their 90th percentile. */
  readonly low: SensitivityEnd;
  readonly high: SensitivityEnd;
  /** High end less low end: a contrast of one slope, in the model's scale; in logs `asFactor` is the ratio. */
  readonly change: IntervalEstimate;
}

export type Sensitivity =
  | {
      /** One a regressor, the largest change first; equal ones in the order of the basis. */
      readonly regressors: readonly RegressorSensitivity[];
    }
  | { readonly regressors: null; readonly reason: string };

const earlierSpreadReason =
  'This fit was made before the spread of the peers’ values was kept; run it again.';

/** How far one planned year's expected value moves when one regressor goes over the peers' spread. */
export function sensitivity(
  basis: PredictionBasis,
  { regressors, ...outlook }: SensitivityRequest,
  tQuantile: TQuantile,
): Sensitivity {
  const { peerSpread } = basis;
  if (peerSpread === undefined) return { regressors: null, reason: earlierSpreadReason };
  const reason =
    unreadableReason(basis, regressors) ??
    (outlook.start === 'carry-the-gap' ? carryingReason(basis) : undefined);
  if (reason !== undefined) return { regressors: null, reason };
  const found = basis.regressors.map((regressor, index): RegressorSensitivity => {
    const { low, high } = peerSpread[index];
    const [atLow, atHigh] = [low, high].map((value) => regressors.with(index, value));
    const [lowEnd, highEnd] = [atLow, atHigh].map((values): SensitivityEnd => ({
      value: values[index],
      familiar: familiarKind(basis, values),
      ...expectedAt(basis, values, outlook),
    }));
    return {
      index,
      regressor,
      planned: regressors[index],
      low: lowEnd,
      high: highEnd,
      change: differenceOfPlans(basis, atHigh, atLow, tQuantile),
    };
  });
  return { regressors: found.toSorted((left, right) => sizeOf(right) - sizeOf(left)) };
}

function expectedAt(
  basis: PredictionBasis,
  regressors: readonly number[],
  outlook: Outlook,
): { expected: ExpectedValue } | { expected: null; reason: string } {
  const expected = heldExpectedValue(basis, regressors, outlook);
  return expected === null ? { expected, reason: beyondReason } : { expected };
}

function sizeOf({ change }: RegressorSensitivity): number {
  return Math.abs(change.estimate);
}
