/**
 * Householder's QR factors of a tall matrix, kept as reflections: Q = H₁ … H_K.
 * @see Golub & Van Loan (2013), Matrix Computations, 4th ed., §5.2.
 */
export interface HouseholderFactors {
  /** Reflection vectors, one a column; entries above the diagonal are 0. */
  readonly vectors: readonly Float64Array[];
  /** 2 / v'v of each reflection; 0 where the column was already zero below and on the diagonal. */
  readonly scales: Float64Array;
  /** R, K × K, row-major, zero below the diagonal. */
  readonly r: Float64Array;
}

/**
 * Factors a tall matrix.
 *
 * @param columns  K columns of n rows, n ≥ K; left unchanged.
 * @returns reflections and R; cost 2nK² operations, n·K numbers of memory.
 */
export function householderQr(columns: readonly Float64Array[]): HouseholderFactors {
  const size = columns.length;
  const work = columns.map((column) => column.slice());
  const scales = new Float64Array(size);
  const r = new Float64Array(size * size);
  for (let k = 0; k < size; k += 1) {
    const vector = work[k];
    const norm = normFrom(vector, k);
    if (norm > 0) {
      const diagonal = vector[k] > 0 ? -norm : norm;
      vector[k] -= diagonal;
      scales[k] = -1 / (diagonal * vector[k]);
      for (let j = k + 1; j < size; j += 1) reflect(vector, scales[k], work[j], k);
      r[k * size + k] = diagonal;
    }
    for (let j = k + 1; j < size; j += 1) r[k * size + j] = work[j][k];
    vector.fill(0, 0, k);
  }
  return { vectors: work, scales, r };
}

/** Overwrites `vector` with Q'·vector. */
export function applyTransposedQ(factors: HouseholderFactors, vector: Float64Array): void {
  for (let k = 0; k < factors.vectors.length; k += 1) {
    reflect(factors.vectors[k], factors.scales[k], vector, k);
  }
}

/** Overwrites `vector` with Q·vector. */
export function applyQ(factors: HouseholderFactors, vector: Float64Array): void {
  for (let k = factors.vectors.length - 1; k >= 0; k -= 1) {
    reflect(factors.vectors[k], factors.scales[k], vector, k);
  }
}

/** The first K columns of Q: an orthonormal basis of the columns' span. */
export function orthonormalColumns(factors: HouseholderFactors, rows: number): Float64Array[] {
  return factors.vectors.map((_, k) => {
    const column = new Float64Array(rows);
    column[k] = 1;
    applyQ(factors, column);
    return column;
  });
}

function reflect(vector: Float64Array, scale: number, target: Float64Array, from: number): void {
  let product = 0;
  for (let row = from; row < vector.length; row += 1) product += vector[row] * target[row];
  const factor = scale * product;
  for (let row = from; row < vector.length; row += 1) target[row] -= factor * vector[row];
}

function normFrom(vector: Float64Array, from: number): number {
  let sum = 0;
  for (let row = from; row < vector.length; row += 1) sum += vector[row] * vector[row];
  return Math.sqrt(sum);
}
