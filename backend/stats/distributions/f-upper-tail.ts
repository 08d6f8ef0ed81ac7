import betainc from '@stdlib/math-base-special-betainc';

/**
 * P(F > value) of the F distribution. The upper flag of the incomplete beta keeps its digits where 1 − cdf is 0.
 * @see NIST Digital Library of Mathematical Functions, §8.17.
 */
export function fUpperTail(value: number, df1: number, df2: number): number {
  if (value <= 0) return 1;
  const product = df1 * value;
  return betainc(product / (df2 + product), df1 / 2, df2 / 2, true, true);
}
