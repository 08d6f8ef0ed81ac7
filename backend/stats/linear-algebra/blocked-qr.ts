import { productOverRows } from './row-range';

/** R of a tall matrix and Q'y of one more column, without Q. */
export interface TriangularFactors {
  /** R, K × K, row-major, zero below the diagonal. */
  readonly r: Float64Array;
  /** The first K numbers of Q'y. */
  readonly head: Float64Array;
  /** Squares of the rest of Q'y: those of the least squares residuals. */
  readonly restSquares: number;
}

/** So many rows of a few columns stay in a processor's nearest memory. */
const blockRows = 256;

/**
 * Factors a tall matrix by Householder reflections of one block of rows after another, each put below the R of those
 * before it: every column is read from memory once, and nothing grows with the rows.
 *
 * @param columns  K columns of n rows, n ≥ K, whose squares stay within a double's range; left unchanged.
 * @param outcome  y, length n; left unchanged.
 * @returns cost 2nK² operations.
 * @see Demmel, Grigori, Hoemmen & Langou (2012), SIAM Journal on Scientific Computing 34, A206–A239, §4 (sequential TSQR).
 */
export function blockedQr(
  columns: readonly Float64Array[],
  outcome: Float64Array,
): TriangularFactors {
  const size = columns.length;
  const rows = outcome.length;
  const sources = [...columns, outcome];
  const width = size + 1;
  const stacked = new Float64Array(width * width);
  const block = sources.map(() => new Float64Array(Math.min(blockRows, rows)));
  for (let from = 0; from < rows; from += blockRows) {
    const count = Math.min(blockRows, rows - from);
    // The first reflection reads the columns and writes the block, the others work on the block.
    reflectBlock(stacked, 0, { source: sources, at: from, target: block, count });
    for (let k = 1; k < width; k += 1) {
      reflectBlock(stacked, k, { source: block, at: 0, target: block, count });
    }
  }
  const r = new Float64Array(size * size);
  const head = new Float64Array(size);
  for (let k = 0; k < size; k += 1) {
    for (let l = k; l < size; l += 1) r[k * size + l] = stacked[k * width + l];
    head[k] = stacked[k * width + size];
  }
  return { r, head, restSquares: stacked[width * width - 1] ** 2 };
}

/** Rows of the columns, from row `at` of the source and from row 0 of the target. */
interface Block {
  readonly source: readonly Float64Array[];
  readonly at: number;
  readonly target: readonly Float64Array[];
  readonly count: number;
}

/**
 * Takes column k of the block into row k of the R above it, by a reflection that leaves the other rows of R as they are.
 *
 * @param stacked  R so far, row-major; changed in row k.
 */
function reflectBlock(
  stacked: Float64Array,
  k: number,
  { source, at, target, count }: Block,
): void {
  const width = source.length;
  const vector = source[k];
  const rows = { from: at, to: at + count };
  const top = stacked[k * width + k];
  const norm = Math.sqrt(top * top + productOverRows(vector, vector, rows));
  const diagonal = top > 0 ? -norm : norm;
  const lead = top - diagonal;
  // A column of zeros so far needs no reflection.
  const scale = norm === 0 ? 0 : 1 / (diagonal * lead);
  stacked[k * width + k] = diagonal;
  for (let l = k + 1; l < width; l += 1) {
    const place = k * width + l;
    const factor = scale * (lead * stacked[place] + productOverRows(vector, source[l], rows));
    stacked[place] += factor * lead;
    reflect(source[l], target[l], { vector, factor, at, count });
  }
}

function reflect(
  source: Float64Array,
  target: Float64Array,
  {
    vector,
    factor,
    at,
    count,
  }: {
    readonly vector: Float64Array;
    readonly factor: number;
    readonly at: number;
    readonly count: number;
  },
): void {
  for (let row = 0; row < count; row += 1) {
    target[row] = source[at + row] + factor * vector[at + row];
  }
}
