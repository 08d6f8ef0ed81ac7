/** Quantile of Student's t at fractional degrees of freedom. */
export type TQuantile = (probability: number, degreesOfFreedom: number) => number;

/** t(1 − α/2) = −t(α/2): from the lower tail, because 1 − α/2 is 1 in a double when α is its last digit. */
export function twoSidedQuantile(
  tQuantile: TQuantile,
  confidence: number,
  degreesOfFreedom: number,
): number {
  return -tQuantile((1 - confidence) / 2, degreesOfFreedom);
}
