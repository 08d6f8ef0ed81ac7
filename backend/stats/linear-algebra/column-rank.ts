import { Matrix, SingularValueDecomposition } from 'ml-matrix';

/** Singular values below this share of the largest count as zero, on columns of unit length. */
export const rankTolerance = 1e-10;

/** Weights below this share of the largest are rounding, not part of a combination. */
const combinationTolerance = 1e-6;

export interface ColumnRank {
  /** Largest by smallest singular value of the columns at unit length. */
  readonly conditionNumber: number;
  /** A combination of the columns that is zero, in their own measure; null where they are independent. */
  readonly combination: readonly { readonly column: number; readonly weight: number }[] | null;
}

/**
 * Tells from their R whether columns are linearly independent, and if not, by which combination.
 *
 * @param r  K × K, row-major, upper triangular, of columns none of which is zero.
 */
export function columnRank(r: Float64Array): ColumnRank {
  const size = Math.sqrt(r.length);
  const norms = columnNorms(r, size);
  const decomposition = unitDecomposition(r, norms);
  const values = decomposition.diagonal;
  const smallest = values[size - 1];
  const condition = smallest > 0 ? values[0] / smallest : Infinity;
  if (smallest > rankTolerance * values[0]) {
    return { conditionNumber: condition, combination: null };
  }
  const vector = decomposition.rightSingularVectors.getColumn(size - 1);
  const bound = combinationTolerance * Math.max(...vector.map(Math.abs));
  const involved = vector
    .map((value, column) => ({ column, share: value, weight: value / norms[column] }))
    .filter(({ share }) => Math.abs(share) > bound);
  const lead = involved[0].weight;
  return {
    conditionNumber: condition,
    combination: involved.map(({ column, weight }) => ({ column, weight: weight / lead })),
  };
}

/** Largest by smallest singular value of the columns at unit length; Infinity where one is zero. */
export function conditionNumber(r: Float64Array): number {
  const size = Math.sqrt(r.length);
  const norms = columnNorms(r, size);
  if (norms.some((norm) => norm === 0)) return Infinity;
  const values = unitDecomposition(r, norms).diagonal;
  return values[size - 1] > 0 ? values[0] / values[size - 1] : Infinity;
}

function unitDecomposition(r: Float64Array, norms: readonly number[]): SingularValueDecomposition {
  const size = norms.length;
  const unit = Array.from(r, (value, index) => value / norms[index % size]);
  return new SingularValueDecomposition(Matrix.from1DArray(size, size, unit), {
    autoTranspose: true,
  });
}

/** Lengths of R's columns, which are those of the columns it was made from; no square leaves a double's range. */
export function columnNorms(r: Float64Array, size: number): number[] {
  return Array.from({ length: size }, (_, column) =>
    Math.hypot(...Array.from({ length: column + 1 }, (__, row) => r[row * size + column])),
  );
}
