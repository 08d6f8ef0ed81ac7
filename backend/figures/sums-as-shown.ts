/**
 * Whether parts, each rounded to so many digits after the point, still sum to their total rounded alike.
 *
 * @param parts, total  unrounded, in the unit shown; they sum to one another but for the last bits.
 */
export function sumsAsShown(parts: readonly number[], total: number, digits: number): boolean {
  // As Intl.NumberFormat rounds: what is compared is what is read.
  const format = new Intl.NumberFormat('en', {
    minimumFractionDigits: digits,
    maximumFractionDigits: digits,
    useGrouping: false,
  });
  const rounded = (value: number): number => Number(format.format(value));
  const sum = parts.reduce((all, part) => all + rounded(part), 0);
  return Math.abs(sum - rounded(total)) < 0.5 * 10 ** -digits;
}
