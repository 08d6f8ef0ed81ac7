/** The largest distance from zero; 0 of nothing. */
export function largestOf(column: Float64Array): number {
  let result = 0;
  for (const value of column) result = Math.max(result, Math.abs(value));
  return result;
}
