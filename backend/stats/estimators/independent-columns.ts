import { rankTolerance } from '../linear-algebra/column-rank';
import { addScaled, dot } from '../linear-algebra/square-matrix';

/**
 * Tells which columns add a direction to those before them, by Gram–Schmidt done twice.
 *
 * @param columns  K columns of n rows; left unchanged.
 * @param sizes  length K, what each column's remainder is measured against; a column of size 0 adds nothing.
 * @returns indices of the columns that do, ascending; cost 4nK² operations.
 * @see Björck (1994), Linear Algebra and its Applications 197, 297–316.
 */
export function independentColumns(
  columns: readonly Float64Array[],
  sizes: ArrayLike<number>,
): number[] {
  const kept: number[] = [];
  const basis: Float64Array[] = [];
  columns.forEach((column, k) => {
    const rest = Float64Array.from(column);
    for (const direction of [...basis, ...basis]) addScaled(rest, direction, -dot(direction, rest));
    const norm = Math.sqrt(dot(rest, rest));
    if (norm <= rankTolerance * sizes[k]) return;
    kept.push(k);
    basis.push(rest.map((value) => value / norm));
  });
  return kept;
}
