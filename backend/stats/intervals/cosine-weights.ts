/** Cosines that a calibrated interval uses at T years: max(3, round(0.4·T^⅔)). */
export function intervalCosines(years: number): number {
  return Math.max(fewestCosines, Math.round(0.4 * years ** (2 / 3)));
}

/** Cosines of rank sets, pair comparisons and the drift: max(3, floor(T/2.5)). */
export function rankCosines(years: number): number {
  return Math.max(fewestCosines, Math.floor(years / 2.5));
}

/** No interval rests on fewer. */
export const fewestCosines = 3;

/**
 * Equal-weighted cosines √(2/T)·cos(πj·u_t), j = 1 … B, t = 1 … T; on the calendar u_t = (t − ½)/T.
 *
 * @param places  u_t, where each year lies on the clock from 0 to 1.
 * @returns B arrays of T numbers.
 * @see Lazarus, Lewis, Stock & Watson (2018), Journal of Business & Economic Statistics 36, 541–559.
 */
export function cosineWeights(places: Float64Array, cosines: number): Float64Array[] {
  const scale = Math.sqrt(2 / places.length);
  return Array.from({ length: cosines }, (_, index) =>
    places.map((place) => scale * Math.cos(Math.PI * (index + 1) * place)),
  );
}
