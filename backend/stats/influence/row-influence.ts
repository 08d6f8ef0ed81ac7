import type { WithinFit } from '../regression/within-fit';
import { isPerfectFit } from '../regression/goodness';
import { dummyLeverages, leverageTolerance } from '../slopes/dummy-leverages';

/** How each row bears on the fit, n values each in the sample's order; NaN where not defined. */
export interface RowInfluence {
  /** Of the full dummy regression, own 1/T_i included. */
  readonly leverage: Float64Array;
  /** Residual over its standard error, e / (s√(1 − h)): internally studentised. */
  readonly standardised: Float64Array;
  /** The same with s from the fit without the row: externally studentised, t with n − N − P − 1 degrees of freedom. */
  readonly studentised: Float64Array;
  /** Cook's distance, standardised² · h / (1 − h) / (N + P). */
  readonly cook: Float64Array;
}

/** A rest of Σe² without the row below this share of it is rounding. */
const restTolerance = 1e-12;

/**
 * Leverages, studentised residuals and Cook's distance of every row in the full dummy regression, year columns
 * included, from the one factorisation. N companies, P parameters beside the intercepts; cost n·P.
 *
 * @see Belsley, Kuh & Welsch (1980), Regression Diagnostics, §2.1; Cook (1977), Technometrics 19, 15–18.
 */
export function rowInfluence(fit: WithinFit): RowInfluence {
  const { residuals, residualSquares, residualDegreesOfFreedom: degrees } = fit;
  const rows = residuals.length;
  const parameters = fit.sample.companies.length + fit.coefficients.length;
  const leverage = dummyLeverages(fit);
  const standardised = new Float64Array(rows).fill(NaN);
  const studentised = new Float64Array(rows).fill(NaN);
  const cook = new Float64Array(rows).fill(NaN);
  if (isPerfectFit(fit)) return { leverage, standardised, studentised, cook };
  const variance = residualSquares / degrees;
  for (let row = 0; row < rows; row += 1) {
    const free = 1 - leverage[row];
    if (free < leverageTolerance) continue;
    standardised[row] = residuals[row] / Math.sqrt(variance * free);
    cook[row] = (standardised[row] ** 2 * leverage[row]) / free / parameters;
    const rest = residualSquares - residuals[row] ** 2 / free;
    if (degrees < 2 || rest <= restTolerance * residualSquares) continue;
    studentised[row] = residuals[row] / Math.sqrt((rest / (degrees - 1)) * free);
  }
  return { leverage, standardised, studentised, cook };
}
