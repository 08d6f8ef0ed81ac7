import { Matrix, SingularValueDecomposition } from 'ml-matrix';
import { householderQr } from './householder';

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
 * Tells whether columns are linearly independent, and if not, by which combination.
 *
 * @param columns  K columns of n rows, n ≥ K, none of them zero; left unchanged.
 */
export function columnRank(columns: readonly Float64Array[]): ColumnRank {
  const size = columns.length;
  const norms = columns.map((column) => largest(column) * scaledNorm(column));
  const unit = columns.map((column, k) => column.map((value) => value / norms[k]));
  const { r } = householderQr(unit);
  const decomposition = new SingularValueDecomposition(
    Matrix.from1DArray(size, size, Array.from(r)),
    { autoTranspose: true },
  );
  const values = decomposition.diagonal;
  const smallest = values[size - 1];
  const conditionNumber = smallest > 0 ? values[0] / smallest : Infinity;
  if (smallest > rankTolerance * values[0]) return { conditionNumber, combination: null };
  const vector = decomposition.rightSingularVectors.getColumn(size - 1);
  const bound = combinationTolerance * Math.max(...vector.map(Math.abs));
  const involved = vector
    .map((value, column) => ({ column, share: value, weight: value / norms[column] }))
    .filter(({ share }) => Math.abs(share) > bound);
  const lead = involved[0].weight;
  return {
    conditionNumber,
    combination: involved.map(({ column, weight }) => ({ column, weight: weight / lead })),
  };
}

function largest(column: Float64Array): number {
  let result = 0;
  for (const value of column) result = Math.max(result, Math.abs(value));
  return result;
}

/** Euclidean norm of the column divided by its largest entry. */
function scaledNorm(column: Float64Array): number {
  const scale = largest(column);
  let sum = 0;
  for (const value of column) sum += (value / scale) ** 2;
  return Math.sqrt(sum);
}
