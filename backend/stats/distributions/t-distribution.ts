import betainc from '@stdlib/math-base-special-betainc';
import t from '@stdlib/stats-base-dists-t';

/** Quantile of Student's t; degrees of freedom may be fractional. */
export function tQuantile(probability: number, degreesOfFreedom: number): number {
  return t.quantile(probability, degreesOfFreedom);
}

/** P(|t| > |value|), with all its digits in the far tail. */
export function tTwoSided(value: number, degreesOfFreedom: number): number {
  return betainc(degreesOfFreedom / (degreesOfFreedom + value * value), degreesOfFreedom / 2, 0.5);
}

/** P(t > value). */
export function tUpperTail(value: number, degreesOfFreedom: number): number {
  const half = tTwoSided(value, degreesOfFreedom) / 2;
  return value >= 0 ? half : 1 - half;
}
