/** −log10 of the relative error; of the absolute error where zero is expected. */
export function logRelativeError(actual: number, expected: number): number {
  const error = Math.abs(actual - expected) / (expected === 0 ? 1 : Math.abs(expected));
  if (Number.isNaN(error)) return -Infinity;
  return error === 0 ? 17 : -Math.log10(error);
}

/** Holds a figure to an outside value by its number of correct significant digits. */
export function expectDigits(
  actual: number | null | undefined,
  expected: number,
  digits: number,
  context = '',
): void {
  expect(logRelativeError(actual ?? NaN, expected))
    .withContext(`${context}: ${String(actual)} against ${expected}`)
    .toBeGreaterThanOrEqual(digits);
}
