import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import type { SquareMatrix } from './square-matrix';

export interface SymmetricPower {
  /** Pseudo-power of the matrix, symmetric. */
  readonly matrix: SquareMatrix;
  /** Eigenvalues that were dropped. */
  readonly dropped: number;
}

/**
 * A power of a symmetric positive semi-definite matrix over its eigenvectors; eigenvalues below `floor` are dropped.
 *
 * @param matrix  size × size, row-major, symmetric.
 * @param exponent  −½ for the pseudo-inverse square root, −1 for the pseudo-inverse.
 */
export function symmetricPower(
  matrix: SquareMatrix,
  size: number,
  exponent: number,
  floor: number,
): SymmetricPower {
  const decomposition = new EigenvalueDecomposition(
    Matrix.from1DArray(size, size, Array.from(matrix)),
    {
      assumeSymmetric: true,
    },
  );
  const vectors = decomposition.eigenvectorMatrix;
  const result = new Float64Array(size * size);
  let dropped = 0;
  decomposition.realEigenvalues.forEach((eigenvalue, index) => {
    if (eigenvalue < floor) {
      dropped += 1;
      return;
    }
    const power = eigenvalue ** exponent;
    for (let row = 0; row < size; row += 1) {
      const left = power * vectors.get(row, index);
      for (let column = 0; column < size; column += 1) {
        result[row * size + column] += left * vectors.get(column, index);
      }
    }
  });
  return { matrix: result, dropped };
}
