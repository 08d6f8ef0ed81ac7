import type { PlanOutlook } from '@contract';
import {
  type Decomposition,
  type DecompositionFromLast,
  type ExpectedValue,
  type FamiliarRange,
  type IntervalEstimate,
  type MarketValueBand,
  type Outlook,
  type PredictionBasis,
  type TQuantile,
  atConfidence,
  carryingReason,
  expectedValue,
  predict,
} from '@prediction';
import { heldPlan, mostYears } from './change-plan';
import type { PlannedYear } from './planned-year';

export type { PlannedYear } from './planned-year';

/** What the fit says about one planned year. */
export interface ReadYear extends PlannedYear {
  /** The year whose values the model read for it: with a lag the one before. */
  readonly of: number;
  readonly expected: ExpectedValue;
  /** Where the market value itself may lie. */
  readonly band: MarketValueBand;
  /** The expected value of the base in the same year. */
  readonly base: ExpectedValue;
  /** Against the base, which holds the last actual values; a difference of logs where the fit's form is log. */
  readonly difference: IntervalEstimate;
  readonly familiar: FamiliarRange;
  /** The difference taken apart, regressor by regressor. */
  readonly parts: Decomposition;
  /** Against the last actual market value, taken apart. */
  readonly fromLast: DecompositionFromLast;
}

export interface PlanReading {
  /** The fit's basis at the confidence of the outlook: what further figures of the plan are read by. */
  readonly basis: PredictionBasis;
  /** The base, which holds the last actual values, in every year that a plan may have. */
  readonly bases: readonly { readonly year: number; readonly estimate: number }[];
  readonly years: readonly ReadYear[];
  /** Planned years that the model cannot read, and why. */
  readonly refused: readonly { readonly year: number; readonly reason: string }[];
}

/**
 * Reads a plan through a fit, by the code that the server confirms a saved plan with.
 *
 * @param outlook  how it is looked at; the fit's own confidence and the model's level unless told otherwise.
 */
export function readPlan(
  basis: PredictionBasis,
  plan: readonly PlannedYear[],
  tQuantile: TQuantile,
  outlook?: PlanOutlook,
): PlanReading {
  const years: ReadYear[] = [];
  const refused: { year: number; reason: string }[] = [];
  const { confidence, ...looked } = outlook ?? { confidence: basis.confidence };
  const atLevel = atConfidence(basis, confidence, tQuantile);
  const asked = plan.map(({ year, values }) => ({ year, regressors: values }));
  predict(atLevel, { years: asked, ...looked }, tQuantile).forEach((predicted, index) => {
    if (predicted.expected === null) {
      refused.push({ year: predicted.year, reason: predicted.reason });
      return;
    }
    const { toBase, year, of, expected, band, base, difference, familiar, fromLast } = predicted;
    const { values } = plan[index];
    const figures = { expected, band, base, difference, familiar, parts: toBase, fromLast };
    years.push({ year, of, values, ...figures });
  });
  return { basis: atLevel, bases: basesOf(atLevel, looked), years, refused };
}

function basesOf(
  basis: PredictionBasis,
  outlook: Pick<Outlook, 'start' | 'yearEffect'>,
): PlanReading['bases'] {
  if (outlook.start === 'carry-the-gap' && carryingReason(basis) !== undefined) return [];
  return heldPlan(basis, mostYears).map(({ year, values }) => ({
    year,
    estimate: expectedValue(basis, values, { ...outlook, year }).estimate,
  }));
}
