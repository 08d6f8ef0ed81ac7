import type { PredictionBasis } from './prediction-basis';
import { type TQuantile, twoSidedQuantile } from './two-sided-quantile';

/**
 * The same basis with its intervals at another confidence level: t_B(1 − α/2) with B = `lambdas.length` for what has
 * own or year weights; contrasts of slopes follow `confidence` with their own degrees of freedom. Estimates and standard
 * errors stay.
 *
 * @returns the basis itself at its own level.
 * @throws {RangeError} unless confidence lies between 0 and 1.
 */
export function atConfidence(
  basis: PredictionBasis,
  confidence: number,
  tQuantile: TQuantile,
): PredictionBasis {
  if (confidence === basis.confidence) return basis;
  if (!(confidence > 0 && confidence < 1)) {
    throw new RangeError(`expected a confidence between 0 and 1; found ${confidence}`);
  }
  const cosines = basis.lambdas.length;
  // Without cosines there is no interval, and the quantile is of no account.
  const quantile =
    cosines === 0 ? basis.quantile : twoSidedQuantile(tQuantile, confidence, cosines);
  return { ...basis, confidence, quantile };
}
