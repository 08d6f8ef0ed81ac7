import type { GapYear } from '../fit-result';
import type { WithinFit } from '../regression/within-fit';

/**
 * How far the own company lay above its peers, year by year:
 * d_t = (a_own + e_own,t) − (mean of all peers' a_j + mean of the present peers' e_jt). A peer that enters or leaves
 * makes no jump, for its intercept stays in the mean.
 *
 * @param own  index of the own company.
 * @returns the years that the own company has, oldest first.
 */
export function gapPath(fit: WithinFit, own: number): GapYear[] {
  const { sample, residuals, relativeIntercepts } = fit;
  const from = sample.starts[own];
  const to = sample.starts[own + 1];
  const sums = new Float64Array(sample.years.length);
  const counts = new Int32Array(sample.years.length);
  residuals.forEach((residual, row) => {
    if (row >= from && row < to) return;
    sums[sample.position[row]] += residual;
    counts[sample.position[row]] += 1;
  });
  const total = relativeIntercepts.reduce((sum, value) => sum + value, 0);
  const peerMean = (total - relativeIntercepts[own]) / (relativeIntercepts.length - 1);
  const level = relativeIntercepts[own] - peerMean;
  return Array.from({ length: to - from }, (_, index): GapYear => {
    const position = sample.position[from + index];
    const peers = counts[position];
    return {
      year: sample.year[from + index],
      gap: peers === 0 ? null : level + residuals[from + index] - sums[position] / peers,
      peers,
    };
  });
}
