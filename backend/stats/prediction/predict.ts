import {
  type Decomposition,
  type DecompositionFromLast,
  decompositionFromLast,
  decompositionToBase,
  differenceOfPlans,
} from './decomposition';
import { beyondReason, type ExpectedValue, heldExpectedValue } from './expected-value';
import { type FamiliarRange, familiarRange } from './familiar-range';
import type { IntervalEstimate } from './interval-estimate';
import { type MarketValueBand, marketValueBand } from './market-value-band';
import { unreadableReason } from './model-scale';
import { carryingReason, type Outlook, stepsAhead } from './outlook';
import { heldRegressors, type PlanYear, planRegressors } from './plan-regressors';
import type { PredictionBasis } from './prediction-basis';
import type { TQuantile } from './two-sided-quantile';

export interface PredictRequest extends Omit<Outlook, 'year'> {
  /** The plan by years, in the panel's measure. */
  readonly years: readonly PlanYear[];
  /** Of the market value's band; 0.8 unless told otherwise. */
  readonly bandConfidence?: number;
}

/** What a fit says about one planned year, or why it says nothing. */
export type PredictedYear =
  | {
      readonly year: number;
      /** h: calendar years after the own company's last observed one. */
      readonly stepsAhead: number;
      /** What the model reads for this year, and the year these values are of: with a lag the one before. */
      readonly regressors: readonly number[];
      readonly of: number;
      readonly expected: ExpectedValue;
      readonly band: MarketValueBand;
      readonly familiar: FamiliarRange;
      /** The expected value of the base, which holds the last observed values, in the same year. */
      readonly base: ExpectedValue;
      /** Against the base, in the model's scale. */
      readonly difference: IntervalEstimate;
      /** The same taken apart. */
      readonly toBase: Decomposition;
      /** Against the last actual market value. */
      readonly fromLast: DecompositionFromLast;
    }
  | { readonly year: number; readonly expected: null; readonly reason: string };

const baseBeyondReason = 'The expected value of the base is beyond what a number can hold.';

/** Everything that is shown of a plan, year by year, in the order of the plan. */
export function predict(
  basis: PredictionBasis,
  { years, bandConfidence, ...outlook }: PredictRequest,
  tQuantile: TQuantile,
): readonly PredictedYear[] {
  return planRegressors(basis, years).map((readable): PredictedYear => {
    const { year } = readable;
    const none = (reason: string): PredictedYear => ({ year, expected: null, reason });
    if (readable.regressors === null) return none(readable.reason);
    const { regressors, of } = readable;
    const reason =
      unreadableReason(basis, regressors) ??
      (outlook.start === 'carry-the-gap' ? carryingReason(basis) : undefined);
    if (reason !== undefined) return none(reason);
    const inYear = { ...outlook, year };
    const expected = heldExpectedValue(basis, regressors, inYear);
    if (expected === null) return none(beyondReason);
    const held = heldRegressors(basis);
    const base = heldExpectedValue(basis, held, inYear);
    if (base === null) return none(baseBeyondReason);
    return {
      year,
      stepsAhead: stepsAhead(basis, inYear),
      regressors,
      of,
      expected,
      band: marketValueBand(basis, regressors, { ...inYear, bandConfidence }, tQuantile),
      familiar: familiarRange(basis, regressors),
      base,
      difference: differenceOfPlans(basis, regressors, held, tQuantile),
      toBase: decompositionToBase(basis, regressors, held, tQuantile),
      fromLast: decompositionFromLast(basis, regressors, tQuantile, inYear),
    };
  });
}
