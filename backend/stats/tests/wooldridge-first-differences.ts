import { fUpperTail } from '../distributions/f-upper-tail';
import { columnRank } from '../linear-algebra/column-rank';
import { factorColumns, solveLeastSquares } from '../linear-algebra/least-squares';
import type { PanelSample } from '../panel/panel-sample';
import { withinTransform } from '../panel/within-transform';
import { clusteredLagSlope, laggedPairs } from './clustered-lag-slope';
import type { EvidenceTest } from './evidence-test';
import { largestOf } from './largest-of';

/** Differences that vary by less than this share of their size do not vary. */
const variationTolerance = 1e-13;

/** Fewer pairs leave the slope on the one before no degrees of freedom. */
const fewestPairs = 3;

const undeterminedReason = 'The first differences do not determine this test.';

/**
 * Wooldridge's test on first differences: errors that do not persist in levels give differenced errors a correlation of
 * −½ with the one before. The differences are regressed on the differenced regressors and a constant; their residuals
 * on the one before within the company; F(1, pairs − 2). As in the outside result, differences and pairs are between
 * rows next to each other: a difference across a calendar gap counts as one, unlike in the first-difference estimates,
 * which leave it out.
 *
 * @see Wooldridge (2010), Econometric Analysis of Cross Section and Panel Data, 2nd ed., §10.6.3.
 */
export const wooldridgeFirstDifferencesTest: EvidenceTest = {
  code: 'wooldridge-first-differences',
  name: 'Wooldridge, first differences',
  definition:
    'Slope of each first-difference residual on the one before against −½, clustered by company without a factor, F(1, pairs − 2).',
  source:
    'Wooldridge (2010), Econometric Analysis of Cross Section and Panel Data, 2nd ed., §10.6.3',
  reference: 'tests.wooldridge_fd_h0fe',
  inHolm: true,
  readings: {
    rejects: 'First differences too show errors that persist from year to year.',
    keeps: 'First differences do not show errors that persist from year to year.',
    none: 'First differences leave open whether errors persist.',
  },
  compute({ sample, fit }) {
    if (fit.yearColumns > 0) {
      return {
        statistic: null,
        reason:
          'Not computed with year effects: its definition has company effects only. The test on within residuals stands.',
      };
    }
    const residuals = differenceResiduals(sample);
    if (residuals === null) return { statistic: null, reason: undeterminedReason };
    const starts = sample.starts.map((start, company) => start - company);
    const pairs = laggedPairs(residuals, starts);
    if (pairs.value.length < fewestPairs) return { statistic: null, reason: undeterminedReason };
    const slope = clusteredLagSlope(pairs);
    if (slope === null) return { statistic: null, reason: undeterminedReason };
    const statistic = (slope.slope + 0.5) ** 2 / slope.variance;
    const df2 = pairs.value.length - 2;
    return {
      statistic,
      distribution: 'F',
      degreesOfFreedom: [1, df2],
      pValue: fUpperTail(statistic, 1, df2),
    };
  },
};

/** Residuals of the differenced regression, n − N of them in the sample's order; null where it is not determined. */
function differenceResiduals(sample: PanelSample): Float64Array | null {
  const outcome = differencesOf(sample.outcome, sample.starts);
  const everyRow = Int32Array.of(0, outcome.length);
  const columns: Float64Array[] = [];
  for (const regressor of sample.regressors) {
    const differences = differencesOf(regressor, sample.starts);
    const { values } = withinTransform(differences, everyRow);
    if (!(largestOf(values) > variationTolerance * largestOf(differences))) return null;
    columns.push(values);
  }
  if (outcome.length <= columns.length + 1) return null;
  const factored = factorColumns(columns, withinTransform(outcome, everyRow).values);
  if (columnRank(factored.r).combination !== null) return null;
  return solveLeastSquares(factored).residuals;
}

/** Each row minus the row before of the same company. */
function differencesOf(column: Float64Array, starts: Int32Array): Float64Array {
  const companies = starts.length - 1;
  const result = new Float64Array(column.length - companies);
  for (let company = 0; company < companies; company += 1) {
    for (let row = starts[company] + 1; row < starts[company + 1]; row += 1) {
      result[row - company - 1] = column[row] - column[row - 1];
    }
  }
  return result;
}
