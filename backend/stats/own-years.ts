import type { OwnYear } from './fit-result';
import type { WithinFit } from './regression/within-fit';

/** The own company's years, oldest first. */
export function ownYearsOf(fit: WithinFit, own: number): OwnYear[] {
  const { sample } = fit;
  const from = sample.starts[own];
  return Array.from({ length: sample.starts[own + 1] - from }, (_, index): OwnYear => {
    const row = from + index;
    return {
      year: sample.year[row],
      fileRow: sample.fileRow[row],
      actual: sample.outcome[row],
      fitted: sample.outcome[row] - fit.residuals[row],
      residual: fit.residuals[row],
      regressors: sample.regressors.map((column) => column[row]),
    };
  });
}
