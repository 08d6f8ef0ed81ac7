import type { Smearing } from '../fit-result';
import { heldNumber } from '../prediction';
import type { WithinFit } from './within-fit';

/** What a mean beyond the range of a double is given as its reason. */
export const beyondSmearReason =
  'The residuals scatter so far that their smearing factor is beyond what a number can hold.';

/**
 * Duan's smearing factor: the mean of exp(e), which turns the exponential of a log prediction into a mean.
 *
 * @param own  index of the own company; −1 without one.
 * @returns means that a double cannot hold are null, with the reason.
 * @see Duan (1983), Journal of the American Statistical Association 78, 605–610.
 */
export function smearingOf({ sample, residuals }: WithinFit, own: number): Smearing {
  const meanOver = (from: number, to: number): number | null => {
    let sum = 0;
    for (let row = from; row < to; row += 1) sum += Math.exp(residuals[row]);
    return heldNumber(sum / (to - from));
  };
  const factor = meanOver(0, residuals.length);
  return {
    factor,
    own: own === -1 ? null : meanOver(sample.starts[own], sample.starts[own + 1]),
    // The own company's rows are among all: its mean is not beyond where that of all is not.
    ...(factor === null && { reason: beyondSmearReason }),
  };
}
