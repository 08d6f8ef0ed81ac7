import { basisError } from './basis-error';
import { inModelScale } from './model-scale';
import { heldNumber } from './out-of-logs';
import { earlierEngineReason, type Outlook, stepsAhead } from './outlook';
import { plannedContrast } from './planned-contrast';
import type { OwnErrors, PredictionBasis } from './prediction-basis';
import { type TQuantile, twoSidedQuantile } from './two-sided-quantile';

/** Where the market value itself may lie; in log form around the median, without smearing. */
export type MarketValueBand =
  | {
      readonly confidence: number;
      readonly low: number;
      readonly high: number;
      /** In the model's scale: logs in log form. */
      readonly standardError: number;
      readonly degreesOfFreedom: number;
    }
  | {
      readonly confidence: number;
      readonly low: null;
      readonly high: null;
      readonly bandReason: string;
    };

export interface BandOutlook extends Outlook {
  /** 0.8 unless told otherwise. */
  readonly bandConfidence?: number;
}

const usualConfidence = 0.8;
const fewestOwnRows = 5;

/**
 * The band that holds the market value itself, not only its expected value. With s² and ρ of the own company's errors,
 * h years ahead and the expected value's standard error se:
 * model level: max(s²(1 − (2/T_own)·Σ_s ρ^(planned year − s)) + se², s²(1 − ρ^2h)), s over the own years;
 * carry the gap: s²(1 − ρ^2h) + se². On t with max(2, T_own(1 − ρ²)/(1 + ρ²) − 1) degrees of freedom.
 *
 * @throws {RangeError} as `expectedValue`.
 * @see Baltagi & Li (1992), Econometric Theory 8, 561–567, for the prediction error under persistent errors.
 */
export function marketValueBand(
  basis: PredictionBasis,
  regressors: readonly number[],
  outlook: BandOutlook,
  tQuantile: TQuantile,
): MarketValueBand {
  const confidence = outlook.bandConfidence ?? usualConfidence;
  const none = (bandReason: string): MarketValueBand => ({
    confidence,
    low: null,
    high: null,
    bandReason,
  });
  const { ownErrors } = basis;
  if (ownErrors === undefined) return none(earlierEngineReason);
  const rows = ownErrors.years.length;
  if (rows < fewestOwnRows) {
    return none(`${basis.company} has ${rows} rows; a band needs at least ${fewestOwnRows}.`);
  }
  const { estimate, weights } = plannedContrast(basis, inModelScale(basis, regressors), outlook);
  const error = basisError(basis, weights);
  if (error.standardError === null) return none(error.reason);
  const variance = bandVariance(basis.last.year, ownErrors, outlook, {
    ofMean: error.standardError ** 2,
    steps: stepsAhead(basis, outlook),
  });
  const standardError = Math.sqrt(variance);
  const squared = (ownErrors.persistence ?? 0) ** 2;
  const degreesOfFreedom = Math.max(2, (rows * (1 - squared)) / (1 + squared) - 1);
  const reach = twoSidedQuantile(tQuantile, confidence, degreesOfFreedom) * standardError;
  const measure = basis.form === 'log' ? Math.exp : (value: number): number => value;
  const low = heldNumber(measure(estimate - reach));
  const high = heldNumber(measure(estimate + reach));
  if (low === null || high === null) {
    return none('An end of the band lies beyond what a number can hold.');
  }
  return { confidence, low, high, standardError, degreesOfFreedom };
}

function bandVariance(
  lastYear: number,
  errors: OwnErrors,
  { start }: Outlook,
  { ofMean, steps }: { readonly ofMean: number; readonly steps: number },
): number {
  const persistence = errors.persistence ?? 0;
  const ahead = errors.variance * (1 - persistence ** (2 * steps));
  if (start === 'carry-the-gap') return ahead + ofMean;
  const shared = errors.years.reduce(
    (sum, year) => sum + persistence ** (lastYear + steps - year),
    0,
  );
  const around = errors.variance * (1 - (2 / errors.years.length) * shared) + ofMean;
  return Math.max(around, ahead);
}
