import type { PanelSample } from '../panel/panel-sample';

/** How strongly errors carry over from one calendar year to the next; corrected for the demeaning. */
export interface Persistence {
  /** ρ over all companies; null where no company has two consecutive years or T̄ is below 5. */
  readonly pooled: number | null;
  /** Each company's own ρ; NaN where it has fewer than 8 rows or no consecutive years. */
  readonly own: Float64Array;
  /** What the intervals use, max(pooled, own), one a company; zeros where `pooled` is null. */
  readonly used: Float64Array;
  /** Why there is no pooled ρ. */
  readonly reason?: string;
}

export const largestPersistence = 0.95;
const fewestRowsForOwn = 8;
const fewestMeanRows = 5;

/**
 * ρ̂ = Σe_t·e_{t−1} / Σe²_{t−1} over consecutive calendar years of the same company, then
 * ρ = clip((ρ̂ + 1/T̄) / (1 − 3/T̄), 0, 0.95), pooled with T̄ = n/N and for each company alone with its own T_i.
 *
 * @param residuals  length n, in the sample's order.
 * @see Kendall (1954), Biometrika 41, 403–404; Nickell (1981), Econometrica 49, 1417–1426.
 */
export function persistenceOf(sample: PanelSample, residuals: Float64Array): Persistence {
  const companies = sample.companies.length;
  const own = new Float64Array(companies).fill(NaN);
  const { starts, year } = sample;
  let products = 0;
  let squares = 0;
  for (let company = 0; company < companies; company += 1) {
    const from = starts[company];
    const to = starts[company + 1];
    let ownProducts = 0;
    let ownSquares = 0;
    for (let row = from + 1; row < to; row += 1) {
      if (year[row] - year[row - 1] !== 1) continue;
      ownProducts += residuals[row] * residuals[row - 1];
      ownSquares += residuals[row - 1] * residuals[row - 1];
    }
    products += ownProducts;
    squares += ownSquares;
    if (to - from >= fewestRowsForOwn && ownSquares > 0) {
      own[company] = corrected(ownProducts / ownSquares, to - from);
    }
  }
  const meanRows = sample.year.length / companies;
  const reason = whyNone(meanRows, squares);
  if (reason !== undefined) {
    return { pooled: null, own, used: new Float64Array(companies), reason };
  }
  const pooled = corrected(products / squares, meanRows);
  const used = own.map((value) => (Number.isNaN(value) ? pooled : Math.max(pooled, value)));
  return { pooled, own, used };
}

function whyNone(meanRows: number, squares: number): string | undefined {
  if (squares === 0) return 'No company has two fiscal years in a row, so persistence is unknown.';
  if (meanRows < fewestMeanRows) {
    return `Companies have ${meanRows.toFixed(1)} rows on average; at least ${fewestMeanRows} are needed to tell how errors persist.`;
  }
  return undefined;
}

function corrected(raw: number, rows: number): number {
  return Math.min(largestPersistence, Math.max(0, (raw + 1 / rows) / (1 - 3 / rows)));
}
