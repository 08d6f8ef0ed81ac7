import erfc from '@stdlib/math-base-special-erfc';

/** P(Z > value) of the standard normal distribution, with all its digits in the far tail. */
export function normalUpperTail(value: number): number {
  return erfc(value / Math.SQRT2) / 2;
}

/** P(|Z| > |value|). */
export function normalTwoSided(value: number): number {
  return erfc(Math.abs(value) / Math.SQRT2);
}
