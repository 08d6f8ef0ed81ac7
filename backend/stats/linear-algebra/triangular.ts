/**
 * Solves R·x = b by back substitution.
 *
 * @param r  K × K upper triangular, row-major, no zero on its diagonal.
 * @param b  length K; left unchanged.
 */
export function solveUpper(r: Float64Array, b: ArrayLike<number>): Float64Array {
  const size = b.length;
  const x = Float64Array.from(b);
  for (let row = size - 1; row >= 0; row -= 1) {
    for (let column = row + 1; column < size; column += 1)
      x[row] -= r[row * size + column] * x[column];
    x[row] /= r[row * size + row];
  }
  return x;
}

/** Solves R'·x = b by forward substitution; arguments as in `solveUpper`. */
export function solveUpperTransposed(r: Float64Array, b: ArrayLike<number>): Float64Array {
  const size = b.length;
  const x = Float64Array.from(b);
  for (let row = 0; row < size; row += 1) {
    for (let column = 0; column < row; column += 1) x[row] -= r[column * size + row] * x[column];
    x[row] /= r[row * size + row];
  }
  return x;
}

/** The inverse of an upper triangular matrix, row-major. */
export function invertUpper(r: Float64Array, size: number): Float64Array {
  const inverse = new Float64Array(size * size);
  const unit = new Float64Array(size);
  for (let column = 0; column < size; column += 1) {
    unit.fill(0);
    unit[column] = 1;
    const solution = solveUpper(r, unit);
    for (let row = 0; row <= column; row += 1) inverse[row * size + column] = solution[row];
  }
  return inverse;
}
