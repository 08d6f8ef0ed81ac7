import gammainc from '@stdlib/math-base-special-gammainc';

/**
 * P(χ² > value), never as 1 − cdf.
 * @see NIST Digital Library of Mathematical Functions, §8.2.
 */
export function chiSquaredUpperTail(value: number, degreesOfFreedom: number): number {
  if (value <= 0) return 1;
  return gammainc(value / 2, degreesOfFreedom / 2, true, true);
}
