/** Cosines that a calibrated interval uses at T years: max(3, round(0.4·T^⅔)). */
export function intervalCosines(years: number): number {
  return Math.max(3, Math.round(0.4 * years ** (2 / 3)));
}

/** Cosines of rank sets, pair comparisons and the drift: max(3, floor(T/2.5)). */
export function rankCosines(years: number): number {
  return Math.max(3, Math.floor(years / 2.5));
}

/**
 * Equal-weighted cosines √(2/T)·cos(πj(p − ½)/T), j = 1 … B, p = 1 … T.
 *
 * @returns B arrays of T numbers.
 * @see Lazarus, Lewis, Stock & Watson (2018), Journal of Business & Economic Statistics 36, 541–559.
 */
export function cosineWeights(years: number, cosines: number): Float64Array[] {
  return Array.from({ length: cosines }, (_, index) =>
    Float64Array.from(
      { length: years },
      (__, position) =>
        Math.sqrt(2 / years) * Math.cos((Math.PI * (index + 1) * (position + 0.5)) / years),
    ),
  );
}
