import t from '@stdlib/stats-base-dists-t';

/** Quantile of Student's t for the prediction code; the server injects the same function. */
export function tQuantile(probability: number, degreesOfFreedom: number): number {
  return t.quantile(probability, degreesOfFreedom);
}
