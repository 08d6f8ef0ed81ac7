import type { WithinColumn } from '../panel/within-transform';
import type { PooledFit } from '../regression/pooled-fit';
import type { WithinFit } from '../regression/within-fit';
import type { CompanyLine, LineEnds, RegressorLines } from './evidence';

/** More lines than this are one grey area on any screen. */
export const mostCompanyLines = 500;

/**
 * One picture a regressor, in the model's scale: every company's line of slope b_k through its own means over its
 * observed range, y = ȳ_i + b_k·(x − x̄_ik), and the pooled line through the means of all rows over all rows' range.
 *
 * @param own  index of the own company, whose line is always kept; −1 without one.
 */
export function regressorLines(
  fit: WithinFit,
  { pooled }: Pick<PooledFit, 'pooled'>,
  own: number,
): RegressorLines[] {
  const { sample } = fit;
  const kept = keptCompanies(sample.companies.length, own);
  return sample.regressorNames.map((regressor, k): RegressorLines => {
    const values = sample.regressors[k];
    const column = fit.regressors[k];
    const lineOf = (company: number): CompanyLine => {
      const range = rangeOf(values, sample.starts[company], sample.starts[company + 1]);
      const centre: Centre = [companyMean(column, company), companyMean(fit.outcome, company)];
      return { company: sample.companies[company], ...line(range, centre, fit.slopes[k]) };
    };
    return {
      regressor,
      companies: kept.map(lineOf),
      of: sample.companies.length,
      pooled: line(
        rangeOf(values, 0, values.length),
        [column.origin + column.grandMean, fit.outcome.origin + fit.outcome.grandMean],
        pooled.slopes[regressor],
      ),
    };
  });
}

type Centre = readonly [x: number, y: number];

/** Evenly spaced over the companies in the sample's order, the own one among them. */
function keptCompanies(companies: number, own: number): number[] {
  if (companies <= mostCompanyLines) return Array.from({ length: companies }, (_, index) => index);
  const kept = new Set(own === -1 ? [] : [own]);
  for (let place = 0; kept.size < mostCompanyLines; place += 1) {
    kept.add(Math.floor((place * companies) / mostCompanyLines));
  }
  return [...kept].sort((left, right) => left - right);
}

function companyMean(column: WithinColumn, company: number): number {
  return column.origin + column.means[company];
}

function rangeOf(values: Float64Array, from: number, to: number): [number, number] {
  let low = Infinity;
  let high = -Infinity;
  for (let row = from; row < to; row += 1) {
    low = Math.min(low, values[row]);
    high = Math.max(high, values[row]);
  }
  return [low, high];
}

function line([low, high]: readonly [number, number], [x, y]: Centre, slope: number): LineEnds {
  return { from: [low, y + slope * (low - x)], to: [high, y + slope * (high - x)] };
}
