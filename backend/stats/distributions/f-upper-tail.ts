import betainc from '@stdlib/math-base-special-betainc';

/**
 * P(F > value) of the F distribution, never as 1 − cdf, and from whichever share of df1·value and df2 is the smaller:
 * the other one rounds to 1 in the far tail or near zero.
 * @see NIST Digital Library of Mathematical Functions, §8.17.
 */
export function fUpperTail(value: number, df1: number, df2: number): number {
  if (value <= 0) return 1;
  const product = df1 * value;
  return product < df2
    ? betainc(product / (df2 + product), df1 / 2, df2 / 2, true, true)
    : betainc(df2 / (df2 + product), df2 / 2, df1 / 2);
}
