/**
 * What a column keeps after the orthonormal columns of a basis are taken out. Twice, since once leaves rounding in
 * those directions where little is left.
 *
 * @returns a new column; its share of Σ² that is left tells whether it lies in the basis.
 * @see Giraud, Langou & Rozložník (2005), Computers & Mathematics with Applications 50, 1069–1075.
 */
export function residualOffBasis(
  column: Float64Array,
  basis: readonly Float64Array[],
): Float64Array {
  const rest = Float64Array.from(column);
  for (let pass = 0; pass < 2; pass += 1) {
    for (const direction of basis) {
      let product = 0;
      for (let row = 0; row < rest.length; row += 1) product += direction[row] * rest[row];
      for (let row = 0; row < rest.length; row += 1) rest[row] -= product * direction[row];
    }
  }
  return rest;
}
