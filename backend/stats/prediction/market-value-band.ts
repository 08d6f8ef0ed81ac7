import { basisError } from './basis-error';
import { inModelScale } from './model-scale';
import { heldNumber } from './out-of-logs';
import { earlierEngineReason, type Outlook, stepsAhead } from './outlook';
import { plannedContrast } from './planned-contrast';
import type { PredictionBasis } from './prediction-basis';
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
  const errors = bandErrors(basis, outlook);
  if (errors.reason !== undefined) return none(errors.reason);
  const { estimate, weights } = plannedContrast(basis, inModelScale(basis, regressors), outlook);
  const error = basisError(basis, weights);
  if (error.standardError === null) return none(error.reason);
  const { degreesOfFreedom } = errors;
  const standardError = Math.sqrt(bandVariance(errors, error.standardError ** 2));
  const reach = twoSidedQuantile(tQuantile, confidence, degreesOfFreedom) * standardError;
  const measure = basis.form === 'log' ? Math.exp : (value: number): number => value;
  const low = heldNumber(measure(estimate - reach));
  const high = heldNumber(measure(estimate + reach));
  if (low === null || high === null) {
    return none('An end of the band lies beyond what a number can hold.');
  }
  return { confidence, low, high, standardError, degreesOfFreedom };
}

/** The market value's own errors in one planned year, in the model's scale, or why there is no band. */
export type BandErrors =
  | {
      /** s²(1 − (2/T_own)·Σ_s ρ^(planned year − s)) at the model's level; `ahead` where the gap is carried. */
      readonly around: number;
      /** s²(1 − ρ^2h). */
      readonly ahead: number;
      readonly degreesOfFreedom: number;
      readonly reason?: undefined;
    }
  | { readonly reason: string };

/** What of a band no planned value moves. */
export function bandErrors(basis: PredictionBasis, outlook: Outlook): BandErrors {
  const { ownErrors } = basis;
  if (ownErrors === undefined) return { reason: earlierEngineReason };
  const { years, variance } = ownErrors;
  const rows = years.length;
  if (rows < fewestOwnRows) {
    return {
      reason: `${basis.company} has ${rows} rows; a band needs at least ${fewestOwnRows}.`,
    };
  }
  const persistence = ownErrors.persistence ?? 0;
  const squared = persistence ** 2;
  const steps = stepsAhead(basis, outlook);
  const ahead = variance * (1 - persistence ** (2 * steps));
  const planned = basis.last.year + steps;
  const shared = years.reduce((sum, year) => sum + persistence ** (planned - year), 0);
  return {
    around: outlook.start === 'carry-the-gap' ? ahead : variance * (1 - (2 / rows) * shared),
    ahead,
    degreesOfFreedom: Math.max(2, (rows * (1 - squared)) / (1 + squared) - 1),
  };
}

/** Of the market value around a plan's expected value, whose own variance is given. */
export function bandVariance(
  { around, ahead }: Pick<Extract<BandErrors, { ahead: number }>, 'around' | 'ahead'>,
  ofMean: number,
): number {
  return Math.max(around + ofMean, ahead);
}
