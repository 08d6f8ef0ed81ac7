import type { WithinFit } from '../regression/within-fit';

/** A leverage this close to 1 is 1: the row determines itself, and its residual is 0 but for rounding. */
export const leverageTolerance = 1e-10;

/**
 * Leverages of the full dummy regression, one a row: 1/T_i of the company's own dummy plus the squared row of the
 * demeaned design's orthonormal basis. They add up to N + P.
 */
export function dummyLeverages({ sample, basis }: WithinFit): Float64Array {
  const leverages = new Float64Array(sample.year.length);
  for (let company = 0; company < sample.companies.length; company += 1) {
    const from = sample.starts[company];
    const to = sample.starts[company + 1];
    leverages.fill(1 / (to - from), from, to);
  }
  for (const column of basis) {
    for (let row = 0; row < leverages.length; row += 1) leverages[row] += column[row] ** 2;
  }
  return leverages;
}
