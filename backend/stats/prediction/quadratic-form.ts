/** w'·M·w of a symmetric matrix given by rows. */
export function quadraticForm(
  matrix: readonly (readonly number[])[],
  weights: readonly number[],
): number {
  let sum = 0;
  matrix.forEach((row, index) => (sum += weights[index] * weightedSum(row, weights)));
  return sum;
}

/** Σ values·weights. */
export function weightedSum(values: readonly number[], weights: readonly number[]): number {
  let sum = 0;
  values.forEach((value, index) => (sum += value * weights[index]));
  return sum;
}
