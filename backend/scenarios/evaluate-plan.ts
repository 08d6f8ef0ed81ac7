import { Invalid } from '../errors/app-error';
import { tQuantile } from '../stats';
import { type IntervalEstimate, predict, type PredictionBasis } from '../stats/prediction';

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
}

/**
 * Reads a plan through a fit, by the same code that the browser runs; the base holds the last observed values.
 *
 * @throws {Invalid} where the model cannot read a year of it.
 */
export function evaluatePlan(
  basis: PredictionBasis,
  plan: readonly PlannedYear[],
): readonly EvaluatedYear[] {
  const years = plan.map(({ year, values }) => ({ year, regressors: values }));
  return predict(basis, { years }, tQuantile).map((predicted): EvaluatedYear => {
    if (predicted.expected === null) throw new Invalid(predicted.reason);
    const { year, expected, difference, familiar } = predicted;
    // Of the log form's figures the mean alone is stored: what is confirmed, frozen and hashed has one shape for all fits.
    const { estimate, standardError, low, high, intervalReason } = expected;
    const mean = { estimate, standardError, low, high };
    return {
      year,
      expected: intervalReason === undefined ? mean : { ...mean, intervalReason },
      difference,
      familiar: familiar.kind,
    };
  });
}
