import {
  addScaled,
  dot,
  type SquareMatrix,
  timesVector,
  toRows,
} from '../linear-algebra/square-matrix';
import type { SlopeDegreesOfFreedom } from '../prediction';
import type { WithinFit } from '../regression/within-fit';
import type { CompanyProduct } from './company-products';

/** A contrast whose working variance is below this share of the classical one is determined by one company alone. */
const traceTolerance = 1e-10;

/**
 * Satterthwaite degrees of freedom of one contrast of slopes under `cr2` with a working identity.
 * With p_i = (I − H)_i'·A_i·U_i·c they are (Σ p_i'p_i)² / Σ_ij (p_i'p_j)², and
 * p_i'p_j = [i = j]·c'W_iS_iW_ic − (B_ic)'(B_jc) with B_i = S_iW_i: linear in the number of companies.
 *
 * @param weights  length K, over the slopes; not all zero.
 * @returns null where the contrast has no variance under the working model.
 * @see Pustejovsky & Tipton (2018), Journal of Business & Economic Statistics 36, 672–683.
 */
export function satterthwaiteDegreesOfFreedom(
  fit: WithinFit,
  products: readonly CompanyProduct[],
  weights: ArrayLike<number>,
): number | null {
  const size = fit.coefficients.length;
  const contrast = basisContrast(fit, weights);
  const outer = new Float64Array(size * size);
  let trace = 0;
  let squares = 0;
  for (const { cross, adjustment } of products) {
    const adjusted = timesVector(adjustment, contrast);
    const shared = timesVector(cross, adjusted);
    const own = dot(adjusted, shared);
    const common = dot(shared, shared);
    trace += own - common;
    squares += own * own - 2 * own * common;
    for (let k = 0; k < size; k += 1) {
      for (let l = 0; l < size; l += 1) outer[k * size + l] += shared[k] * shared[l];
    }
  }
  squares += dot(outer, outer);
  const isJudged = trace > traceTolerance * dot(contrast, contrast);
  return isJudged ? (trace * trace) / squares : null;
}

/**
 * The same for any contrast of the K slopes, as forms in its weights: K × K, and pairs of slopes × pairs of slopes, however
 * many year columns there are; cost N·(P²K + P²K²/4).
 */
export function satterthwaiteForms(
  fit: WithinFit,
  products: readonly CompanyProduct[],
): SlopeDegreesOfFreedom {
  const size = fit.slopes.length;
  const all = fit.coefficients.length;
  const pairs = (size * (size + 1)) / 2;
  const contrasts = Array.from({ length: size }, (_, k) =>
    basisContrast(
      fit,
      Float64Array.from({ length: size }, (__, index) => (index === k ? 1 : 0)),
    ),
  );
  const s = new Float64Array(size * size);
  const quartic = new Float64Array(pairs * pairs);
  // Rows: pairs (a, b) of the outer product Σ B_icc'B_i', columns: pairs of c; off-diagonal rows count twice.
  const outer = new Float64Array(((all * (all + 1)) / 2) * pairs);
  for (const { cross, adjustment } of products) {
    const adjusted = contrasts.map((contrast) => timesVector(adjustment, contrast));
    const shared = adjusted.map((vector) => timesVector(cross, vector));
    const own = innerProducts(adjusted, shared);
    const common = innerProducts(shared, shared);
    addScaled(s, own, 1);
    addScaled(s, common, -1);
    const ownPairs = upperPairs(own, size);
    const commonPairs = upperPairs(common, size);
    addPairProducts(quartic, ownPairs, ownPairs, 1);
    addPairProducts(quartic, ownPairs, commonPairs, -1);
    addPairProducts(quartic, commonPairs, ownPairs, -1);
    addOuter(outer, shared);
  }
  addOuterSquares(quartic, outer, all, pairs);
  return { kind: 'satterthwaite', s: toRows(s, size), quartic: Array.from(quartic) };
}

/** R⁻ᵀ·w of a contrast with weights on the slopes only: P numbers, 0 on the year columns. */
function basisContrast(fit: WithinFit, weights: ArrayLike<number>): Float64Array {
  const size = fit.coefficients.length;
  const contrast = new Float64Array(size);
  for (let slope = 0; slope < weights.length; slope += 1) {
    const row = fit.yearColumns + slope;
    for (let k = row; k < size; k += 1)
      contrast[k] += weights[slope] * fit.inverseR[row * size + k];
  }
  return contrast;
}

/** left_k'right_l, K × K; of vectors whose products are symmetric. */
function innerProducts(
  left: readonly Float64Array[],
  right: readonly Float64Array[],
): SquareMatrix {
  const size = left.length;
  const products = new Float64Array(size * size);
  for (let k = 0; k < size; k += 1) {
    for (let l = 0; l <= k; l += 1) {
      const value = (dot(left[k], right[l]) + dot(left[l], right[k])) / 2;
      products[k * size + l] = value;
      products[l * size + k] = value;
    }
  }
  return products;
}

function upperPairs(matrix: SquareMatrix, size: number): Float64Array {
  const pairs = new Float64Array((size * (size + 1)) / 2);
  let index = 0;
  for (let k = 0; k < size; k += 1) {
    for (let l = k; l < size; l += 1) pairs[index++] = matrix[k * size + l];
  }
  return pairs;
}

function addPairProducts(
  target: Float64Array,
  left: Float64Array,
  right: Float64Array,
  factor: number,
): void {
  for (let row = 0; row < left.length; row += 1) {
    const scale = factor * left[row];
    for (let column = 0; column < right.length; column += 1) {
      target[row * right.length + column] += scale * right[column];
    }
  }
}

/**
 * Adds the linear map from pairs c_k·c_l to entries (a, b) of B_icc'B_i'.
 *
 * @param shared  the columns of B_i in the slopes, K of P numbers.
 */
function addOuter(outer: Float64Array, shared: readonly Float64Array[]): void {
  const all = shared[0].length;
  let index = 0;
  for (let a = 0; a < all; a += 1) {
    for (let b = a; b < all; b += 1) {
      for (let k = 0; k < shared.length; k += 1) {
        for (let l = k; l < shared.length; l += 1) {
          const straight = shared[k][a] * shared[l][b];
          const crossed = shared[l][a] * shared[k][b];
          outer[index++] += (straight + crossed) / 2;
        }
      }
    }
  }
}

function addOuterSquares(
  quartic: Float64Array,
  outer: Float64Array,
  all: number,
  pairs: number,
): void {
  let row = 0;
  for (let a = 0; a < all; a += 1) {
    for (let b = a; b < all; b += 1) {
      const entry = outer.subarray(row * pairs, (row + 1) * pairs);
      addPairProducts(quartic, entry, entry, a === b ? 1 : 2);
      row += 1;
    }
  }
}
