import type { PredictionBasis, YearEffectEstimates } from './prediction-basis';

/**
 * Where a plan starts from: the model's level, which forgets how far the own company last lay from it, or that gap, of
 * which the share ρ^h is left after h years.
 *
 * @see Goldberger (1962), JASA 57, 369–375; Baltagi & Li (1992), Econometric Theory 8, 561–567, for the gap's share.
 */
export type StartingPoint = 'model-level' | 'carry-the-gap';

/** The effect of a planned year: an estimated one, or a number in the model's scale, taken as known. */
export type YearEffectChoice = 'last' | 'mean-of-last-three' | { readonly given: number };

/** How a planned year is looked at. */
export interface Outlook {
  /** The planned year; the first after the own company's last one unless told otherwise. */
  readonly year?: number;
  /** 'model-level' unless told otherwise. */
  readonly start?: StartingPoint;
  /** 'last' unless told otherwise; of no account in a fit without year effects. */
  readonly yearEffect?: YearEffectChoice;
}

/** h: calendar years after the own company's last observed one. */
export function stepsAhead(basis: PredictionBasis, { year }: Outlook): number {
  return year === undefined ? 1 : year - basis.last.year;
}

/**
 * ρ^h: the share of the last gap that is left; 0 at the model's level.
 *
 * @throws {RangeError} where `carryingReason` gives one.
 */
export function gapShare(basis: PredictionBasis, outlook: Outlook): number {
  if (outlook.start !== 'carry-the-gap') return 0;
  const persistence = basis.ownErrors?.persistence ?? null;
  if (persistence === null) throw new RangeError(carryingReason(basis));
  return persistence ** stepsAhead(basis, outlook);
}

/** Why the gap cannot be carried; undefined where it can. */
export function carryingReason(basis: PredictionBasis): string | undefined {
  if (basis.ownErrors === undefined) return earlierEngineReason;
  return basis.ownErrors.persistence === null
    ? (basis.ownErrors.persistenceReason ?? 'How errors persist is unknown.')
    : undefined;
}

export const earlierEngineReason =
  'This fit was made before the own company’s errors were kept; run it again.';

/** The chosen year effect, and which of the estimated ones it is: undefined for a given one. */
export function chosenYearEffect(
  effects: YearEffectEstimates,
  choice: YearEffectChoice = 'last',
): { readonly effect: number; readonly estimated?: 'last' | 'lastThree' } {
  if (typeof choice === 'object') return { effect: choice.given };
  const estimated = choice === 'last' ? 'last' : 'lastThree';
  return { effect: effects[estimated], estimated };
}
