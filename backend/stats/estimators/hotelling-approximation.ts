import {
  addScaled,
  bilinear,
  congruence,
  dot,
  type SquareMatrix,
  timesVector,
} from '../linear-algebra/square-matrix';
import { symmetricPower } from '../linear-algebra/symmetric-power';

/** Eigenvalues below this share of a covariance's trace say that a contrast has no variance. */
const singularTolerance = 1e-10;

/** What one cluster adds to the `cr2` covariance of q contrasts c_s of a regression with m parameters. */
export interface ClusterTerms {
  /** c_s'W_iS_iW_ic_t, q × q, row-major. */
  readonly own: SquareMatrix;
  /** S_iW_ic_s, q vectors of length m. */
  readonly shared: readonly Float64Array[];
  /** c_s'W_ig_i, length q: the cluster's part of the sandwich. */
  readonly score: Float64Array;
}

export interface HotellingTest {
  readonly statistic: number;
  /** q and η − q + 1. */
  readonly degreesOfFreedom: readonly [number, number];
}

/**
 * Wald test that q contrasts are all zero under `cr2` with a working identity, its distribution approximated by Hotelling's
 * T² with the η that matches the covariance's total variance: F = (η − q + 1)/(ηq)·Q.
 * With the contrasts scaled to a working covariance of 1 and P_jk = [j = k]·D_j − F_jF_k',
 * η = q(q + 1) / Σ_jk (tr(P_jkP_jk) + tr²(P_jk)); the sums over pairs of clusters are taken apart, so the cost is N·(qm)².
 *
 * @returns null where a contrast has no variance or η ≤ q − 1.
 * @see Pustejovsky & Tipton (2018), Journal of Business & Economic Statistics 36, 672–683, §3.
 */
export function hotellingApproximation(
  contrasts: Float64Array,
  clusters: readonly ClusterTerms[],
): HotellingTest | null {
  const q = contrasts.length;
  const working = new Float64Array(q * q);
  const covariance = new Float64Array(q * q);
  for (const { own, shared, score } of clusters) {
    addScaled(working, own, 1);
    addScaled(working, gram(shared), -1);
    addOuter(covariance, score);
  }
  const scale = symmetricPower(working, q, -0.5, singularTolerance * trace(working, q));
  if (scale.dropped > 0) return null;
  const scaled = congruence(scale.matrix, covariance, q);
  const inverse = symmetricPower(scaled, q, -1, singularTolerance * trace(scaled, q));
  if (inverse.dropped > 0) return null;
  const unit = timesVector(scale.matrix, contrasts);
  const eta = (q * (q + 1)) / totalVariance(clusters, scale.matrix, q);
  const rest = eta - q + 1;
  if (rest <= 0) return null;
  return {
    statistic: (rest / (eta * q)) * bilinear(inverse.matrix, unit, unit),
    degreesOfFreedom: [q, rest],
  };
}

/** Σ_jk (tr(P_jkP_jk) + tr²(P_jk)) of the scaled contrasts. */
function totalVariance(clusters: readonly ClusterTerms[], scale: SquareMatrix, q: number): number {
  const size = q * clusters[0].shared[0].length;
  // Σ_j vec(F_j)·vec(F_j)', entry (s, a) of F_j at s·m + a.
  const moments = new Float64Array(size * size);
  let sum = 0;
  for (const cluster of clusters) {
    const own = congruence(scale, cluster.own, q);
    const shared = mixed(scale, cluster.shared);
    const common = gram(shared);
    const ownTrace = trace(own, q);
    sum += dot(own, own) - 2 * dot(own, common);
    sum += ownTrace * (ownTrace - 2 * trace(common, q));
    addOuter(moments, flat(shared));
  }
  return sum + dot(moments, moments) + crossedSquares(moments, q);
}

/** Σ over s, t, a, b of M[(s, a), (t, b)]·M[(t, a), (s, b)]. */
function crossedSquares(moments: Float64Array, q: number): number {
  const size = Math.sqrt(moments.length);
  const m = size / q;
  let sum = 0;
  for (let s = 0; s < q; s += 1) {
    for (let t = 0; t < q; t += 1) {
      for (let a = 0; a < m; a += 1) {
        for (let b = 0; b < m; b += 1) {
          const straight = moments[(s * m + a) * size + t * m + b];
          sum += straight * moments[(t * m + a) * size + s * m + b];
        }
      }
    }
  }
  return sum;
}

/** The vectors mixed by the rows of a q × q matrix. */
function mixed(matrix: SquareMatrix, vectors: readonly Float64Array[]): Float64Array[] {
  const q = vectors.length;
  return vectors.map((vector, s) => {
    const result = new Float64Array(vector.length);
    for (let t = 0; t < q; t += 1) addScaled(result, vectors[t], matrix[s * q + t]);
    return result;
  });
}

/** Inner products of q vectors, q × q. */
function gram(vectors: readonly Float64Array[]): SquareMatrix {
  const q = vectors.length;
  const result = new Float64Array(q * q);
  for (let s = 0; s < q; s += 1) {
    for (let t = 0; t < q; t += 1) result[s * q + t] = dot(vectors[s], vectors[t]);
  }
  return result;
}

function flat(vectors: readonly Float64Array[]): Float64Array {
  const length = vectors[0].length;
  const result = new Float64Array(vectors.length * length);
  vectors.forEach((vector, s) => {
    result.set(vector, s * length);
  });
  return result;
}

/** target += v·v'. */
function addOuter(target: SquareMatrix, vector: Float64Array): void {
  const size = vector.length;
  for (let row = 0; row < size; row += 1) {
    const factor = vector[row];
    if (factor === 0) continue;
    for (let column = 0; column < size; column += 1) {
      target[row * size + column] += factor * vector[column];
    }
  }
}

function trace(matrix: SquareMatrix, size: number): number {
  let sum = 0;
  for (let k = 0; k < size; k += 1) sum += matrix[k * size + k];
  return sum;
}
