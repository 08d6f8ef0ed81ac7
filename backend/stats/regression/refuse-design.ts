import { type ColumnRank, columnRank, rankTolerance } from '../linear-algebra/column-rank';
import { leastSquares } from '../linear-algebra/least-squares';
import type { PanelSample } from '../panel/panel-sample';
import type { WithinColumn } from '../panel/within-transform';
import { StatsError } from '../stats-error';
import { sumOfSquares } from './sum-of-squares';

/** Variation within companies below this share of a column's size is rounding of its numbers. */
const variationTolerance = 1e-14;

/** The demeaned columns of a regression: outcome, year columns if any, regressors. */
export interface DemeanedDesign {
  readonly outcome: WithinColumn;
  readonly years: readonly WithinColumn[];
  readonly regressors: readonly WithinColumn[];
}

/**
 * Refuses a design whose slopes are not determined.
 *
 * @returns the rank of the regressors without the effects, with their condition number.
 * @throws {StatsError} 'outcome-constant', 'constant-within-companies', 'same-for-all-companies',
 *   'collinear-regressors' or 'no-residual-degrees-of-freedom', naming what is concerned.
 */
export function refuseDesign(sample: PanelSample, design: DemeanedDesign): ColumnRank {
  const { outcome, years, regressors } = design;
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
  refuseDegreesOfFreedom(sample, years.length);
  const columns = withoutYears(sample, years, regressors);
  const rank = columnRank(columns);
  if (rank.combination === null) return rank;
  const combination = rank.combination.map(({ column, weight }) => ({
    column: names[column],
    weight,
  }));
  const involved = combination.map(({ column }) => column);
  throw new StatsError(
    'collinear-regressors',
    `within companies ${involved.join(', ')} move together exactly${years.length > 0 ? ' but for the year effects' : ''}: ${inWords(combination)} never varies`,
    { columns: involved, combination },
  );
}

/** The demeaned regressors less their year effects; as they are without any. */
function withoutYears(
  sample: PanelSample,
  years: readonly WithinColumn[],
  regressors: readonly WithinColumn[],
): Float64Array[] {
  if (years.length === 0) return regressors.map(({ values }) => values);
  const yearValues = years.map(({ values }) => values);
  const rest = regressors.map(({ values }) => leastSquares(yearValues, values).residuals);
  const same = sample.regressorNames.filter(
    (_, k) => sumOfSquares(rest[k]) <= rankTolerance ** 2 * sumOfSquares(regressors[k].values),
  );
  if (same.length === 0) return rest;
  throw new StatsError(
    'same-for-all-companies',
    `${same.join(', ')} moves by the same amount for all companies in every year: the year effects take it up entirely`,
    { columns: same },
  );
}

function refuseDegreesOfFreedom(sample: PanelSample, years: number): void {
  const observations = sample.year.length;
  const companies = sample.companies.length;
  const slopes = sample.regressorNames.length;
  if (observations - companies - years - slopes > 0) return;
  const effects = years > 0 ? `, ${years} year effects` : '';
  throw new StatsError(
    'no-residual-degrees-of-freedom',
    `${observations} rows leave nothing to judge the fit by: ${companies} company intercepts${effects} and ${slopes} slopes use them up`,
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
