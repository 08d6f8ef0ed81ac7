import { fUpperTail } from '../distributions/f-upper-tail';
import type { FitResult, FTest } from '../fit-result';
import { dot } from '../linear-algebra/square-matrix';
import { sumOfSquares } from './sum-of-squares';
import type { WithinFit } from './within-fit';

/**
 * A fit whose residuals are below this share of the outcome's variation is perfect but for rounding. The variation is
 * the total one of R², between companies too: rounding grows with the figures, and large companies' figures are large
 * however little they move from year to year.
 */
const perfectFitTolerance = 1e-20;

export const perfectFitReason = 'The fit is perfect: no residual is left to judge an estimate by.';

const effectsAloneReason =
  'The effects alone explain every row: they leave nothing for the slopes to explain.';

/** Σ(y − ȳ)² over all rows: within companies and between their means. */
export function totalSquares(fit: WithinFit): number {
  const { outcome, sample } = fit;
  let between = 0;
  outcome.means.forEach((mean, company) => {
    const rows = sample.starts[company + 1] - sample.starts[company];
    between += rows * (mean - outcome.grandMean) ** 2;
  });
  return outcome.squares + between;
}

export function isPerfectFit(fit: WithinFit): boolean {
  return fit.residualSquares <= perfectFitTolerance * totalSquares(fit);
}

/**
 * The F test that a drop in the sum of squares is chance, classical: (gain / df1) / (rest / df2).
 *
 * @param isPerfect  where true, neither value nor p value means anything.
 */
export function fTest(
  squares: { readonly gain: number; readonly rest: number; readonly isPerfect: boolean },
  df1: number,
  df2: number,
): FTest {
  if (squares.isPerfect) {
    return { value: null, df1, df2, pValue: null, pValueReason: perfectFitReason };
  }
  const value = Math.max(0, squares.gain) / df1 / (squares.rest / df2);
  return { value, df1, df2, pValue: fUpperTail(value, df1, df2) };
}

/**
 * What the slopes take off the sum of squares that the effects leave: the outcome's projections on the basis of the
 * regressors, which comes after that of the year columns.
 */
function explainedBySlopes(fit: WithinFit): number {
  return sumOfSquares(
    fit.basis.slice(fit.yearColumns).map((column) => dot(column, fit.outcome.values)),
  );
}

/**
 * Goodness of the fixed effects regression, each figure under its own name. R² is centred; the within R² is the share
 * of what the effects leave, both of them where there are year effects.
 */
export function goodnessOf(fit: WithinFit): FitResult['goodness'] {
  const rest = fit.residualSquares;
  const within = rest + explainedBySlopes(fit);
  const total = totalSquares(fit);
  const isPerfect = isPerfectFit(fit);
  const slopes = fit.slopes.length;
  const dummies = fit.sample.companies.length - 1 + fit.yearColumns;
  const df2 = fit.residualDegreesOfFreedom;
  // Where the effects explain every row, both are rounding.
  const isEffectsAlone = within <= perfectFitTolerance * total;
  return {
    withinRSquared: isEffectsAlone ? null : 1 - rest / within,
    ...(isEffectsAlone && { withinRSquaredReason: effectsAloneReason }),
    rSquared: 1 - rest / total,
    adjustedRSquared: 1 - rest / df2 / (total / (fit.sample.year.length - 1)),
    residualStandardError: Math.sqrt(rest / df2),
    f: fTest({ gain: total - rest, rest, isPerfect }, dummies + slopes, df2),
    fSlopes: fTest({ gain: within - rest, rest, isPerfect }, slopes, df2),
  };
}
