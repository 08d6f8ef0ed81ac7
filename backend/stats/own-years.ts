import type { OwnYear, Smearing } from './fit-result';
import type { WithinFit } from './regression/within-fit';

/**
 * The own company's years, oldest first. Actual, fitted and regressors in the panel's measure, the residual in the
 * model's scale; in log form the fitted value is the mean, exp(·) · smear.
 *
 * @param smearing  null in levels.
 * @returns null where a double cannot hold a fitted value.
 */
export function ownYearsOf(
  fit: WithinFit,
  own: number,
  smearing: Smearing | null,
): OwnYear[] | null {
  if (smearing?.factor === null) return null;
  const smear = smearing?.factor ?? null;
  const { sample } = fit;
  const { levels } = sample;
  const from = sample.starts[own];
  const years = Array.from({ length: sample.starts[own + 1] - from }, (_, index): OwnYear => {
    const row = from + index;
    const fitted = sample.outcome[row] - fit.residuals[row];
    return {
      year: sample.year[row],
      fileRow: sample.fileRow[row],
      actual: levels.outcome[row],
      fitted: smear === null ? fitted : Math.exp(fitted) * smear,
      residual: fit.residuals[row],
      regressors: levels.regressors.map((column) => column[row]),
    };
  });
  return years.every(({ fitted }) => Number.isFinite(fitted)) ? years : null;
}
