import type { Smearing } from '../fit-result';
import type { WithinFit } from './within-fit';

/**
 * Duan's smearing factor: the mean of exp(e), which turns the exponential of a log prediction into a mean.
 *
 * @param own  index of the own company; −1 without one.
 * @see Duan (1983), Journal of the American Statistical Association 78, 605–610.
 */
export function smearingOf({ sample, residuals }: WithinFit, own: number): Smearing {
  const meanOver = (from: number, to: number): number => {
    let sum = 0;
    for (let row = from; row < to; row += 1) sum += Math.exp(residuals[row]);
    return sum / (to - from);
  };
  return {
    factor: meanOver(0, residuals.length),
    own: own === -1 ? null : meanOver(sample.starts[own], sample.starts[own + 1]),
  };
}
