import {
  addScaled,
  bilinear,
  congruence,
  dot,
  type SquareMatrix,
  times,
  timesVector,
  toRows,
  transpose,
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
  const size = fit.slopes.length;
  const contrast = timesVector(transpose(fit.inverseR, size), weights);
  const outer = new Float64Array(size * size);
  let trace = 0;
  let squares = 0;
  for (const { cross, adjustment } of products) {
    const adjusted = timesVector(adjustment, contrast);
    const shared = timesVector(cross, adjusted);
    const own = bilinear(cross, adjusted, adjusted);
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

/** The same for any contrast, as forms in its weights; cost N·K⁴/4. */
export function satterthwaiteForms(
  fit: WithinFit,
  products: readonly CompanyProduct[],
): SlopeDegreesOfFreedom {
  const size = fit.slopes.length;
  const pairs = (size * (size + 1)) / 2;
  const s = new Float64Array(size * size);
  const quartic = new Float64Array(pairs * pairs);
  // Rows: pairs (a, b) of the outer product Σ B_icc'B_i', columns: pairs of c; off-diagonal rows count twice.
  const outer = new Float64Array(pairs * pairs);
  for (const { cross, adjustment } of products) {
    const own = congruence(
      fit.inverseR,
      times(times(adjustment, cross, size), adjustment, size),
      size,
    );
    const shared = times(times(cross, adjustment, size), transpose(fit.inverseR, size), size);
    const common = times(transpose(shared, size), shared, size);
    addScaled(s, own, 1);
    addScaled(s, common, -1);
    addPairProducts(quartic, upperPairs(own, size), upperPairs(own, size), 1);
    addPairProducts(quartic, upperPairs(own, size), upperPairs(common, size), -1);
    addPairProducts(quartic, upperPairs(common, size), upperPairs(own, size), -1);
    addOuter(outer, shared, size);
  }
  addOuterSquares(quartic, outer, size);
  return { kind: 'satterthwaite', s: toRows(s, size), quartic: Array.from(quartic) };
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

/** Adds the linear map from pairs c_k·c_l to entries (a, b) of B_icc'B_i'. */
function addOuter(outer: Float64Array, shared: SquareMatrix, size: number): void {
  let index = 0;
  for (let a = 0; a < size; a += 1) {
    for (let b = a; b < size; b += 1) {
      for (let k = 0; k < size; k += 1) {
        for (let l = k; l < size; l += 1) {
          const straight = shared[a * size + k] * shared[b * size + l];
          const crossed = shared[a * size + l] * shared[b * size + k];
          outer[index++] += (straight + crossed) / 2;
        }
      }
    }
  }
}

function addOuterSquares(quartic: Float64Array, outer: Float64Array, size: number): void {
  const pairs = (size * (size + 1)) / 2;
  let row = 0;
  for (let a = 0; a < size; a += 1) {
    for (let b = a; b < size; b += 1) {
      const entry = outer.subarray(row * pairs, (row + 1) * pairs);
      addPairProducts(quartic, entry, entry, a === b ? 1 : 2);
      row += 1;
    }
  }
}
