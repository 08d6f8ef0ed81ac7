import type { SquareMatrix } from '../linear-algebra/square-matrix';

/** Orthonormal columns and the residuals of a regression on them: within companies, or pooled. */
export interface ScoreDesign {
  /** K columns of n rows. */
  readonly basis: readonly Float64Array[];
  readonly residuals: Float64Array;
}

/**
 * Σ of the rows' scores uₜ·eₜ over each group.
 *
 * @param group  length n, codes 0 … groups − 1.
 * @returns groups × K, row-major.
 */
export function groupScores(
  { basis, residuals }: ScoreDesign,
  group: Int32Array,
  groups: number,
): Float64Array {
  const size = basis.length;
  const scores = new Float64Array(groups * size);
  for (let k = 0; k < size; k += 1) {
    const column = basis[k];
    for (let row = 0; row < residuals.length; row += 1) {
      scores[group[row] * size + k] += column[row] * residuals[row];
    }
  }
  return scores;
}

/**
 * Σ_g s_g·s_{g−lag}', K × K; symmetric with no lag.
 *
 * @param scores  groups × K, row-major.
 */
export function scoreProducts(scores: Float64Array, size: number, lag = 0): SquareMatrix {
  const products = new Float64Array(size * size);
  for (let start = lag * size; start < scores.length; start += size) {
    const earlier = start - lag * size;
    for (let k = 0; k < size; k += 1) {
      for (let l = 0; l < size; l += 1) {
        products[k * size + l] += scores[start + k] * scores[earlier + l];
      }
    }
  }
  return products;
}

/**
 * Σₜ weightₜ·eₜ²·uₜuₜ', K × K.
 *
 * @param weight  of each row; left out, every row weighs 1.
 */
export function rowProducts(
  { basis, residuals }: ScoreDesign,
  weight?: (row: number) => number,
): SquareMatrix {
  const size = basis.length;
  const squares = residuals.map((value, row) => value * value * (weight?.(row) ?? 1));
  const products = new Float64Array(size * size);
  for (let k = 0; k < size; k += 1) {
    for (let l = 0; l <= k; l += 1) {
      let sum = 0;
      for (let row = 0; row < squares.length; row += 1) {
        sum += squares[row] * basis[k][row] * basis[l][row];
      }
      products[k * size + l] = sum;
      products[l * size + k] = sum;
    }
  }
  return products;
}
