import { type ColumnRank, columnRank } from '../linear-algebra/column-rank';
import type { PanelSample } from '../panel/panel-sample';
import type { WithinColumn } from '../panel/within-transform';
import { StatsError } from '../stats-error';
import { sumOfSquares } from './sum-of-squares';

/** Variation within companies below this share of a column's size is rounding of its numbers. */
const variationTolerance = 1e-14;

/**
 * Refuses a design whose slopes are not determined.
 *
 * @returns the rank of the demeaned regressors, with their condition number.
 * @throws {StatsError} 'outcome-constant', 'constant-within-companies', 'collinear-regressors' or
 *   'no-residual-degrees-of-freedom', naming what is concerned.
 */
export function refuseDesign(
  sample: PanelSample,
  outcome: WithinColumn,
  regressors: readonly WithinColumn[],
): ColumnRank {
  if (isConstantWithin(sample.outcome, outcome)) {
    throw new StatsError(
      'outcome-constant',
      `${sample.outcomeName} never varies within a company, so nothing is left to explain`,
      { columns: [sample.outcomeName] },
    );
  }
  const names = sample.regressorNames;
  const constant = names.filter((_, k) => isConstantWithin(sample.regressors[k], regressors[k]));
  if (constant.length > 0) {
    throw new StatsError(
      'constant-within-companies',
      `${constant.join(', ')} never varies within a company: the company effects take it up entirely`,
      { columns: constant },
    );
  }
  refuseDegreesOfFreedom(sample);
  const rank = columnRank(regressors.map(({ values }) => values));
  if (rank.combination === null) return rank;
  const combination = rank.combination.map(({ column, weight }) => ({
    column: names[column],
    weight,
  }));
  const columns = combination.map(({ column }) => column);
  throw new StatsError(
    'collinear-regressors',
    `within companies ${columns.join(', ')} move together exactly: ${inWords(combination)} never varies`,
    { columns, combination },
  );
}

function refuseDegreesOfFreedom(sample: PanelSample): void {
  const observations = sample.year.length;
  const companies = sample.companies.length;
  const slopes = sample.regressorNames.length;
  if (observations - companies - slopes > 0) return;
  throw new StatsError(
    'no-residual-degrees-of-freedom',
    `${observations} rows leave nothing to judge the fit by: ${companies} company intercepts and ${slopes} slopes use them up`,
  );
}

function isConstantWithin(raw: Float64Array, within: WithinColumn): boolean {
  return sumOfSquares(within.values) <= variationTolerance ** 2 * sumOfSquares(raw);
}

function inWords(combination: readonly { column: string; weight: number }[]): string {
  return combination
    .map(({ column, weight }, index) => {
      const size = Number(Math.abs(weight).toPrecision(6));
      const term = size === 1 ? column : `${size} × ${column}`;
      if (index === 0) return weight < 0 ? `−${term}` : term;
      return weight < 0 ? ` − ${term}` : ` + ${term}`;
    })
    .join('');
}
