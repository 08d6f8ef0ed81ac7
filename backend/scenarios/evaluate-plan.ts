import { tQuantile } from '../stats';
import {
  differenceToBase,
  expectedValue,
  familiarRange,
  type IntervalEstimate,
  type PredictionBasis,
} from '../stats/prediction';

export interface PlannedYear {
  readonly year: number;
  readonly values: readonly number[];
}

export interface EvaluatedYear {
  readonly year: number;
  readonly expected: IntervalEstimate;
  readonly difference: IntervalEstimate;
  readonly familiar: 'inside' | 'edge' | 'outside';
}

/** Reads a plan through a fit, by the same code that the browser runs; the base holds the last actual values. */
export function evaluatePlan(
  basis: PredictionBasis,
  plan: readonly PlannedYear[],
): readonly EvaluatedYear[] {
  const base = basis.last.regressors;
  return plan.map(({ year, values }) => ({
    year,
    expected: expectedValue(basis, values),
    difference: differenceToBase(
      basis,
      values.map((value, k) => value - base[k]),
      tQuantile,
    ),
    familiar: familiarRange(basis, values).kind,
  }));
}
