import { isPerfectFit, perfectFitReason } from '../regression/goodness';
import type { WithinFit } from '../regression/within-fit';
import type { Contrast } from './contrast';
import type { Persistence } from './persistence';

const fewestYears = 6;

/** A company with fewer rows has no interval of its own and no rank. */
export const fewestRowsForRank = 3;
const heavyWeight = 0.5;

/** Why no contrast of this fit has a calibrated interval; undefined where they have. */
export function fitIntervalReason(fit: WithinFit, persistence: Persistence): string | undefined {
  if (isPerfectFit(fit)) return perfectFitReason;
  const years = fit.sample.years.length;
  if (years < fewestYears) {
    return `The sample has ${years} fiscal years; an interval over time needs at least ${fewestYears}.`;
  }
  return persistence.reason;
}

/** Why this contrast has no calibrated interval: it leans on a company of fewer than 3 rows. */
export function contrastIntervalReason(fit: WithinFit, contrast: Contrast): string | undefined {
  const index = contrast.companies.findIndex(
    (company, place) =>
      Math.abs(contrast.weights[place]) >= heavyWeight && rowsOf(fit, company) < fewestRowsForRank,
  );
  if (index === -1) return undefined;
  const company = contrast.companies[index];
  return `${fit.sample.companies[company]} has ${rowsOf(fit, company)} rows; an interval needs at least ${fewestRowsForRank}.`;
}

export function rowsOf(fit: WithinFit, company: number): number {
  return fit.sample.starts[company + 1] - fit.sample.starts[company];
}
