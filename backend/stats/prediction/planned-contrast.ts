import { chosenYearEffect, gapShare, type Outlook } from './outlook';
import { type PredictionBasis, yearEffectOrder } from './prediction-basis';
import { weightedSum } from './quadratic-form';

/** A planned year in the model's scale: its point, and the weights of what of it is estimated. */
export interface PlannedContrast {
  readonly estimate: number;
  /** What of it no planned value moves, the own level apart: the year effect and the carried gap. */
  readonly besidePlan: number;
  /** Over the centred basis; see `PredictionBasis`. */
  readonly weights: readonly number[];
}

/**
 * a_own + x'b + c_h + s·e_last, s = ρ^h where the gap is carried and 0 at the model's level. As e_last is the last
 * outcome less a_own + x_last'b + c_last, what is estimated has own weight 1 − s, slope weights x − s·x_last and year
 * weights of c_h − s·c_last.
 *
 * @param regressors  x, in the model's scale.
 * @throws {RangeError} where the gap is to be carried and its persistence is not known.
 */
export function plannedContrast(
  basis: PredictionBasis,
  regressors: readonly number[],
  outlook: Outlook = {},
): PlannedContrast {
  const share = gapShare(basis, outlook);
  const distances = regressors.map((value, k) => value - basis.ownMeans[k]);
  const lastDistances =
    share === 0 ? [] : lastInModelScale(basis).map((x, k) => x - basis.ownMeans[k]);
  const ofSlopes = weightedSum(basis.coefficients.slice(1), distances);
  const years = yearPart(basis, share, outlook);
  const besidePlan = years.effect + share * basis.last.residual;
  return {
    estimate: basis.ownLevel + ofSlopes + besidePlan,
    besidePlan,
    weights: [
      1 - share,
      ...(share === 0 ? distances : distances.map((value, k) => value - share * lastDistances[k])),
      ...years.weights,
    ],
  };
}

/** What the model read in the own company's last year, in its own scale. */
export function lastInModelScale(basis: PredictionBasis): readonly number[] {
  const { regressors } = basis.last;
  return basis.form === 'log' ? regressors.map(Math.log) : regressors;
}

function yearPart(
  { yearEffects }: PredictionBasis,
  share: number,
  { yearEffect }: Outlook,
): { readonly effect: number; readonly weights: readonly number[] } {
  if (yearEffects === undefined || yearEffects === null) return { effect: 0, weights: [] };
  const { effect, estimated } = chosenYearEffect(yearEffects, yearEffect);
  const weights = yearEffectOrder.map((name) => {
    if (name === 'ownMean') return share - 1;
    if (name === 'ownLast') return -share;
    return name === estimated ? 1 : 0;
  });
  return { effect: effect - yearEffects.ownMean, weights };
}
