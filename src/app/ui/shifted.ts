/** The value times 10^shift, rounded once: the decimal point moves and no digit changes. */
export function shifted(value: number, shift: number): number {
  if (shift === 0) return value;
  const [mantissa, exponent = '0'] = String(value).split('e');
  return Number(`${mantissa}e${Number(exponent) + shift}`);
}
