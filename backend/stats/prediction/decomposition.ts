import type { IntervalEstimate } from './interval-estimate';
import type { PredictionBasis } from './prediction-basis';
import { differenceToBase } from './slope-contrast';
import type { TQuantile } from './two-sided-quantile';

/** b_k·Δx_k of one regressor, with its own interval. */
export interface DecompositionTerm extends IntervalEstimate {
  readonly regressor: string;
  readonly change: number;
}

/** A difference of expected values taken apart: `total` is the sum of the terms. */
export interface Decomposition {
  readonly terms: readonly DecompositionTerm[];
  readonly total: number;
}

/** The difference to the last actual market value: `total` is the sum of the terms and `fadingGap`. */
export interface DecompositionFromLast extends Decomposition {
  /** The last actual value's distance from the model, turned back: −e_last, for the model's level has no gap. */
  readonly fadingGap: number;
}

/** Plan against base, regressor by regressor: Σ b_k·Δx_k and nothing else. */
export function decompositionToBase(
  basis: PredictionBasis,
  plan: readonly number[],
  base: readonly number[],
  tQuantile: TQuantile,
): Decomposition {
  const terms = basis.regressors.map((regressor, k): DecompositionTerm => {
    const change = plan[k] - base[k];
    const weights = basis.regressors.map((_, index) => (index === k ? change : 0));
    return { regressor, change, ...differenceToBase(basis, weights, tQuantile) };
  });
  return { terms, total: terms.reduce((sum, term) => sum + term.estimate, 0) };
}

/** Plan against the last actual market value: the slopes' terms and the part of the gap that fades. */
export function decompositionFromLast(
  basis: PredictionBasis,
  plan: readonly number[],
  tQuantile: TQuantile,
): DecompositionFromLast {
  const { terms, total } = decompositionToBase(basis, plan, basis.last.regressors, tQuantile);
  const fadingGap = -basis.last.residual;
  return { terms, fadingGap, total: total + fadingGap };
}
