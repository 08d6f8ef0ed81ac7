import {
  type Decomposition,
  type FamiliarRange,
  type IntervalEstimate,
  type PredictionBasis,
  type TQuantile,
  expectedValue,
  heldRegressors,
  predict,
} from '@prediction';

/** Planned regressors of one year, in the fit's order and the panel's unit. */
export interface PlannedYear {
  readonly year: number;
  readonly values: readonly number[];
}

/** What the fit says about one planned year. */
export interface ReadYear extends PlannedYear {
  /** The year whose values the model read for it: with a lag the one before. */
  readonly of: number;
  readonly expected: IntervalEstimate;
  /** Against the base, which holds the last actual values; a difference of logs where the fit's form is log. */
  readonly difference: IntervalEstimate;
  readonly familiar: FamiliarRange;
  /** The difference taken apart, regressor by regressor. */
  readonly parts: Decomposition;
}

export interface PlanReading {
  /** The expected value with the last actual values held; the same in every year. */
  readonly base: IntervalEstimate;
  readonly years: readonly ReadYear[];
  /** Planned years that the model cannot read, and why. */
  readonly refused: readonly { readonly year: number; readonly reason: string }[];
}

/** Reads a plan through a fit, by the code that the server confirms a saved plan with. */
export function readPlan(
  basis: PredictionBasis,
  plan: readonly PlannedYear[],
  tQuantile: TQuantile,
): PlanReading {
  const years: ReadYear[] = [];
  const refused: { year: number; reason: string }[] = [];
  const asked = plan.map(({ year, values }) => ({ year, regressors: values }));
  predict(basis, { years: asked }, tQuantile).forEach((predicted, index) => {
    if (predicted.expected === null) {
      refused.push({ year: predicted.year, reason: predicted.reason });
      return;
    }
    const { year, of, expected, difference, familiar, toBase } = predicted;
    const { values } = plan[index];
    years.push({ year, of, values, expected, difference, familiar, parts: toBase });
  });
  return { base: expectedValue(basis, heldRegressors(basis)), years, refused };
}
