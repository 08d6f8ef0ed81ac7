import { Invalid } from '../errors/app-error';
import { tQuantile } from '../stats';
import {
  atConfidence,
  type IntervalEstimate,
  predict,
  type PredictionBasis,
} from '../stats/prediction';
import type { PlanOutlookChoice } from './plan-types';

export interface PlannedYear {
  readonly year: number;
  readonly values: readonly number[];
}

export interface EvaluatedYear {
  readonly year: number;
  readonly expected: IntervalEstimate;
  /** Against the base; a difference of logs where the fit's form is log. */
  readonly difference: IntervalEstimate;
  readonly familiar: 'inside' | 'edge' | 'outside';
  /** Of the market value itself; missing where it was stored before bands were. */
  readonly band?: {
    readonly low: number | null;
    readonly high: number | null;
    readonly bandReason?: string;
  };
}

/**
 * Reads a plan through a fit, by the same code that the browser runs; the base holds the last observed values.
 *
 * @throws {Invalid} where the model cannot read a year of it.
 */
export function evaluatePlan(
  basis: PredictionBasis,
  plan: readonly PlannedYear[],
  outlook: PlanOutlookChoice,
): readonly EvaluatedYear[] {
  const { confidence, ...looked } = outlook;
  const years = plan.map(({ year, values }) => ({ year, regressors: values }));
  const atLevel = atConfidence(basis, confidence, tQuantile);
  return predict(atLevel, { years, ...looked }, tQuantile).map((predicted): EvaluatedYear => {
    if (predicted.expected === null) throw new Invalid(predicted.reason);
    const { year, expected, difference, familiar, band } = predicted;
    // Of the log form's figures the one shown is stored: what is confirmed, frozen and hashed has one shape for all fits.
    const { estimate, standardError, low, high, intervalReason } = expected;
    const shown = { estimate, standardError, low, high };
    return {
      year,
      expected: intervalReason === undefined ? shown : { ...shown, intervalReason },
      difference,
      familiar: familiar.kind,
      band:
        'bandReason' in band
          ? { low: null, high: null, bandReason: band.bandReason }
          : { low: band.low, high: band.high },
    };
  });
}
