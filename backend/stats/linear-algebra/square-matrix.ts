/** A small square matrix, row-major. */
export type SquareMatrix = Float64Array;

/** left'·M·right. */
export function bilinear(
  matrix: SquareMatrix,
  left: ArrayLike<number>,
  right: ArrayLike<number>,
): number {
  const size = left.length;
  let sum = 0;
  for (let row = 0; row < size; row += 1) {
    let inner = 0;
    for (let column = 0; column < size; column += 1)
      inner += matrix[row * size + column] * right[column];
    sum += left[row] * inner;
  }
  return sum;
}

/** M·vector. */
export function timesVector(matrix: SquareMatrix, vector: ArrayLike<number>): Float64Array {
  const size = vector.length;
  const product = new Float64Array(size);
  for (let row = 0; row < size; row += 1) {
    for (let column = 0; column < size; column += 1) {
      product[row] += matrix[row * size + column] * vector[column];
    }
  }
  return product;
}

/** left·right. */
export function times(left: SquareMatrix, right: SquareMatrix, size: number): SquareMatrix {
  const product = new Float64Array(size * size);
  for (let row = 0; row < size; row += 1) {
    for (let inner = 0; inner < size; inner += 1) {
      const factor = left[row * size + inner];
      for (let column = 0; column < size; column += 1) {
        product[row * size + column] += factor * right[inner * size + column];
      }
    }
  }
  return product;
}

export function transpose(matrix: SquareMatrix, size: number): SquareMatrix {
  const result = new Float64Array(size * size);
  for (let row = 0; row < size; row += 1) {
    for (let column = 0; column < size; column += 1)
      result[column * size + row] = matrix[row * size + column];
  }
  return result;
}

/** left·M·left', exactly symmetric. */
export function congruence(left: SquareMatrix, matrix: SquareMatrix, size: number): SquareMatrix {
  const product = times(times(left, matrix, size), transpose(left, size), size);
  for (let row = 0; row < size; row += 1) {
    for (let column = 0; column < row; column += 1) {
      const mean = (product[row * size + column] + product[column * size + row]) / 2;
      product[row * size + column] = mean;
      product[column * size + row] = mean;
    }
  }
  return product;
}

/** target += factor·addend. */
export function addScaled(target: Float64Array, addend: Float64Array, factor: number): void {
  for (let index = 0; index < target.length; index += 1) target[index] += factor * addend[index];
}

export function dot(left: ArrayLike<number>, right: ArrayLike<number>): number {
  let sum = 0;
  for (let index = 0; index < left.length; index += 1) sum += left[index] * right[index];
  return sum;
}

/** Rows as plain arrays, for a reply. */
export function toRows(matrix: SquareMatrix, size: number): number[][] {
  return Array.from({ length: size }, (_, row) =>
    Array.from(matrix.slice(row * size, (row + 1) * size)),
  );
}
