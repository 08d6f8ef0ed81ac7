import type { WithinFit } from '../regression/within-fit';

/**
 * Variance inflation of each regressor, 1 / (1 − R²_j), R²_j of the regressor on the others, all without the fit's
 * effects. From R of the one factorisation, whose last K rows and columns are those of the regressors less the year
 * columns: the squared length of column j times that of row j of the inverse.
 *
 * @returns K values of 1 or more, in the order of the regressors.
 * @see Belsley, Kuh & Welsch (1980), Regression Diagnostics, §3.1.
 */
export function varianceInflation(fit: WithinFit): number[] {
  const size = fit.coefficients.length;
  return fit.regressors.map((_, k) => {
    const place = fit.yearColumns + k;
    let length = 0;
    let inverseLength = 0;
    for (let other = fit.yearColumns; other < size; other += 1) {
      length += fit.r[other * size + place] ** 2;
      inverseLength += fit.inverseR[place * size + other] ** 2;
    }
    return length * inverseLength;
  });
}
