/** Values and the values one row earlier of the same company. */
export interface LaggedPairs {
  readonly before: Float64Array;
  readonly value: Float64Array;
  /** Company i holds pairs starts[i] … starts[i + 1] − 1. */
  readonly starts: Int32Array;
}

/** A slope of values on values before, with a variance that allows for any dependence within a company. */
export interface ClusteredSlope {
  readonly slope: number;
  readonly variance: number;
}

/** A standard error of this slope, which has no unit, below this is rounding. */
const smallestStandardError = 1e-10;

/**
 * Pairs of rows next to each other within a company, whatever the calendar years between them.
 *
 * @param starts  company i holds rows starts[i] … starts[i + 1] − 1 of `values`.
 */
export function laggedPairs(values: Float64Array, starts: Int32Array): LaggedPairs {
  const companies = starts.length - 1;
  const pairStarts = starts.map((start, company) => start - company);
  const before = new Float64Array(values.length - companies);
  const value = new Float64Array(values.length - companies);
  let pair = 0;
  for (let company = 0; company < companies; company += 1) {
    for (let row = starts[company] + 1; row < starts[company + 1]; row += 1) {
      before[pair] = values[row - 1];
      value[pair] = values[row];
      pair += 1;
    }
  }
  return { before, value, starts: pairStarts };
}

/**
 * Least squares of each value on a constant and the one before, clustered by company without a factor:
 * V = Σ_i (Σ_t (b_t − b̄)u_t)² / (Σ (b_t − b̄)²)².
 *
 * @returns null where the values before do not vary or the variance is rounding.
 * @see Arellano (1987), Oxford Bulletin of Economics and Statistics 49, 431–434.
 */
export function clusteredLagSlope({ before, value, starts }: LaggedPairs): ClusteredSlope | null {
  const pairs = value.length;
  const meanBefore = meanOf(before);
  const meanValue = meanOf(value);
  let squares = 0;
  let products = 0;
  for (let pair = 0; pair < pairs; pair += 1) {
    squares += (before[pair] - meanBefore) ** 2;
    products += (before[pair] - meanBefore) * (value[pair] - meanValue);
  }
  if (squares === 0) return null;
  const slope = products / squares;
  let scores = 0;
  for (let company = 0; company + 1 < starts.length; company += 1) {
    let score = 0;
    for (let pair = starts[company]; pair < starts[company + 1]; pair += 1) {
      const distance = before[pair] - meanBefore;
      score += distance * (value[pair] - meanValue - slope * distance);
    }
    scores += score * score;
  }
  const variance = scores / squares ** 2;
  return variance <= smallestStandardError ** 2 ? null : { slope, variance };
}

function meanOf(values: Float64Array): number {
  let sum = 0;
  for (const value of values) sum += value;
  return sum / values.length;
}
