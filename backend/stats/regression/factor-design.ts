import { columnRank, rankTolerance } from '../linear-algebra/column-rank';
import { type FactoredColumns, factorColumns } from '../linear-algebra/least-squares';
import type { PanelSample } from '../panel/panel-sample';
import type { WithinColumn } from '../panel/within-transform';
import { StatsError } from '../stats-error';

/** Variation within companies below this share of a column's size is rounding of its numbers. */
const variationTolerance = 1e-14;

/** The demeaned columns of a regression: outcome, year columns if any, regressors. */
export interface DemeanedDesign {
  readonly outcome: WithinColumn;
  readonly years: readonly WithinColumn[];
  readonly regressors: readonly WithinColumn[];
}

/** The design's one factorisation. */
export interface FactoredDesign {
  /** The year columns, then the regressors, with the outcome. */
  readonly factored: FactoredColumns;
  /** Of the scaled regressors without the effects. */
  readonly conditionNumber: number;
}

/**
 * Factors a design, and refuses one whose slopes are not determined.
 *
 * @throws {StatsError} 'outcome-constant', 'constant-within-companies', 'same-for-all-companies',
 *   'collinear-regressors' or 'no-residual-degrees-of-freedom', naming what is concerned.
 */
export function factorDesign(sample: PanelSample, design: DemeanedDesign): FactoredDesign {
  const { outcome, years, regressors } = design;
  if (isConstantWithin(outcome)) {
    throw new StatsError(
      'outcome-constant',
      `${sample.outcomeName} never varies within a company, so nothing is left to explain`,
      { columns: [sample.outcomeName] },
    );
  }
  const names = sample.regressorNames;
  const constant = names.filter((_, k) => isConstantWithin(regressors[k]));
  if (constant.length > 0) {
    throw new StatsError(
      'constant-within-companies',
      `${constant.join(', ')} never varies within a company: the company effects take it up entirely`,
      { columns: constant },
    );
  }
  refuseDegreesOfFreedom(sample, years.length);
  const columns = [...years, ...regressors].map(({ values }) => values);
  const factored = factorColumns(columns, outcome.values);
  const rank = columnRank(withoutYears(names, factored.r, years.length));
  if (rank.combination === null) return { factored, conditionNumber: rank.conditionNumber };
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

/**
 * R of the regressors less their year effects, K × K: the last block of the R of year columns and regressors together.
 *
 * @throws {StatsError} 'same-for-all-companies' where year effects leave nothing of a regressor.
 */
function withoutYears(names: readonly string[], r: Float64Array, years: number): Float64Array {
  const size = years + names.length;
  const lengthFrom = (row: number, column: number): number =>
    Math.hypot(
      ...Array.from({ length: column + 1 - row }, (_, index) => r[(row + index) * size + column]),
    );
  const same = names.filter(
    (_, k) => lengthFrom(years, years + k) <= rankTolerance * lengthFrom(0, years + k),
  );
  if (same.length > 0) {
    throw new StatsError(
      'same-for-all-companies',
      `${same.join(', ')} moves by the same amount for all companies in every year: the year effects take it up entirely`,
      { columns: same },
    );
  }
  return Float64Array.from({ length: names.length ** 2 }, (_, index) => {
    const row = years + Math.floor(index / names.length);
    return r[row * size + years + (index % names.length)];
  });
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

function isConstantWithin({ squares, rawSquares }: WithinColumn): boolean {
  return squares <= variationTolerance ** 2 * rawSquares;
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
