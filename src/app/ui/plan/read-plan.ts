import {
  type Decomposition,
  type FamiliarRange,
  type IntervalEstimate,
  type PredictionBasis,
  type TQuantile,
  decompositionToBase,
  differenceToBase,
  expectedValue,
  familiarRange,
} from '@prediction';

/** Planned regressors of one year, in the fit's order and the panel's unit. */
export interface PlannedYear {
  readonly year: number;
  readonly values: readonly number[];
}

/** What the fit says about one planned year. */
export interface ReadYear extends PlannedYear {
  readonly expected: IntervalEstimate;
  /** Against the base, which holds the last actual values. */
  readonly difference: IntervalEstimate;
  readonly familiar: FamiliarRange;
  /** The difference taken apart, regressor by regressor. */
  readonly parts: Decomposition;
}

export interface PlanReading {
  /** The expected value with the last actual values held; the same in every year. */
  readonly base: IntervalEstimate;
  readonly years: readonly ReadYear[];
}

/** Reads a plan through a fit, by the code that the server confirms a saved plan with. */
export function readPlan(
  basis: PredictionBasis,
  plan: readonly PlannedYear[],
  tQuantile: TQuantile,
): PlanReading {
  const held = basis.last.regressors;
  return {
    base: expectedValue(basis, held),
    years: plan.map(({ year, values }) => ({
      year,
      values,
      expected: expectedValue(basis, values),
      difference: differenceToBase(
        basis,
        values.map((value, k) => value - held[k]),
        tQuantile,
      ),
      familiar: familiarRange(basis, values),
      parts: decompositionToBase(basis, values, held, tQuantile),
    })),
  };
}
