import { tQuantile } from '../distributions/t-distribution';
import { leastSquares } from '../linear-algebra/least-squares';
import { invertUpper } from '../linear-algebra/triangular';
import type { PanelSample } from '../panel/panel-sample';
import { withinTransform } from '../panel/within-transform';
import { twoSidedQuantile } from '../prediction';
import { totalSquares } from '../regression/goodness';
import { sumOfSquares } from '../regression/sum-of-squares';
import type { WithinFit } from '../regression/within-fit';
import { classicalCovariance, exactReason, slopesWithIntervals } from './classical-slopes';
import { type Estimator, isNotComputed, noFigures, type NotComputed } from './estimator';
import { independentColumns } from './independent-columns';

/** D differences, K slopes. */
export interface FirstDifferencesFit {
  readonly slopes: Float64Array;
  readonly residualSquares: number;
  /** D − K, with year effects less one a year that a difference ends in. */
  readonly degreesOfFreedom: number;
  /** K × K. */
  readonly inverseR: Float64Array;
}

interface YearlyRows {
  readonly ordered: Int32Array;
  readonly starts: Int32Array;
}

/**
 * Least squares of year-on-year changes without constant. With year effects every year that a change ends in has its own
 * constant, which is what differences make of them.
 *
 * @param rows  the later row of each pair, as `consecutiveRows` gives them.
 * @see Wooldridge (2010), Econometric Analysis of Cross Section and Panel Data, 2nd ed., §10.6.
 */
export function firstDifferencesFit(
  fit: WithinFit,
  rows: Int32Array,
): FirstDifferencesFit | NotComputed {
  const { sample } = fit;
  const slopes = sample.regressors.length;
  const { ordered, starts } =
    fit.yearColumns === 0 ? { ordered: rows, starts: null } : byYear(sample, rows);
  const years = starts === null ? 0 : starts.length - 1;
  const degreesOfFreedom = rows.length - years - slopes;
  if (degreesOfFreedom <= 0) {
    return {
      reason: `${rows.length} changes between consecutive fiscal years leave nothing to judge ${slopes} slopes by.`,
    };
  }
  const differenced = (column: Float64Array): Float64Array =>
    Float64Array.from(ordered, (row) => column[row] - column[row - 1]);
  const taken = (column: Float64Array): Float64Array =>
    starts === null ? column : withinTransform(column, starts).values;
  const changes = sample.regressors.map(differenced);
  const columns = changes.map(taken);
  const kept = independentColumns(
    columns,
    changes.map((change) => Math.sqrt(sumOfSquares(change))),
  );
  if (kept.length < slopes) {
    const missing = sample.regressorNames.filter((_, k) => !kept.includes(k));
    return {
      reason: `Between consecutive fiscal years ${missing.join(', ')} does not change on its own.`,
    };
  }
  const { coefficients, residuals, r } = leastSquares(columns, taken(differenced(sample.outcome)));
  return {
    slopes: coefficients,
    residualSquares: sumOfSquares(residuals),
    degreesOfFreedom,
    inverseR: invertUpper(r, slopes),
  };
}

/** Rows whose company also has a row one calendar year earlier, which then is the row before. */
export function consecutiveRows({ companies, starts, year }: PanelSample): Int32Array {
  const rows: number[] = [];
  for (let company = 0; company < companies.length; company += 1) {
    for (let row = starts[company] + 1; row < starts[company + 1]; row += 1) {
      if (year[row] - year[row - 1] === 1) rows.push(row);
    }
  }
  return Int32Array.from(rows);
}

/** The rows in order of their year, and where each year among them starts, their end last. */
function byYear({ position, years }: PanelSample, rows: Int32Array): YearlyRows {
  const ends = new Int32Array(years.length);
  for (const row of rows) ends[position[row]] += 1;
  for (let year = 1; year < ends.length; year += 1) ends[year] += ends[year - 1];
  const next = Int32Array.from(ends, (_, year) => (year === 0 ? 0 : ends[year - 1]));
  const ordered = new Int32Array(rows.length);
  for (const row of rows) {
    ordered[next[position[row]]] = row;
    next[position[row]] += 1;
  }
  // A year that no change ends in starts where it ends.
  return { ordered, starts: Int32Array.from(new Set([0, ...ends])) };
}

export const firstDifferencesEstimator: Estimator = {
  code: 'first-differences',
  name: 'First differences',
  definition:
    'Least squares of the changes from one calendar year to the next, without constant: a gap in the years makes no change.',
  source: 'Wooldridge (2010), Econometric Analysis of Cross Section and Panel Data, 2nd ed., §10.6',
  reference: 'first_difference_no_const',
  figures: ({ sample, fit, specification }) => {
    const rows = consecutiveRows(sample);
    const differences = firstDifferencesFit(fit, rows);
    if (isNotComputed(differences)) return noFigures(differences.reason, rows.length);
    const { slopes, residualSquares, degreesOfFreedom, inverseR } = differences;
    return {
      slopes: slopesWithIntervals(
        sample.regressorNames,
        slopes,
        classicalCovariance(inverseR, residualSquares / degreesOfFreedom),
        {
          quantile: twoSidedQuantile(tQuantile, specification.confidence, degreesOfFreedom),
          reason: exactReason(fit, residualSquares, totalSquares(fit)),
        },
      ),
      constant: null,
      observations: rows.length,
      degreesOfFreedom,
    };
  },
};
