import { heldNumber } from './out-of-logs';
import { percentile } from './percentile';

/** The percents of the draws that lie below the figures of a fan. */
export const fanPercents = [5, 10, 25, 50, 75, 90, 95] as const;

/** Where draws lie, in the panel's measure. */
export interface Fan {
  /** Null where there is none, or none that a double can hold. */
  readonly mean: number | null;
  /** In the order of `fanPercents`, type 7; null beyond what a double can hold. */
  readonly percentiles: readonly (number | null)[];
}

/**
 * @param draws  one at least; sorted by this.
 * @param mean  the draws' own, or null where they have none.
 */
export function fanOf(draws: Float64Array, mean: number | null): Fan {
  draws.sort();
  return {
    mean: mean === null ? null : heldNumber(mean),
    percentiles: fanPercents.map((percent) => heldNumber(percentile(draws, percent / 100))),
  };
}

/** The sum of the draws over their number. */
export function meanOf(draws: Float64Array): number {
  let sum = 0;
  for (const draw of draws) sum += draw;
  return sum / draws.length;
}
