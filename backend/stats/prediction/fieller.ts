/** A ratio's range: an interval, or none that is finite, and what there is then. */
export type FiellerRange =
  | { readonly kind: 'interval'; readonly low: number; readonly high: number }
  /** Not a finite range: everything up to `upTo` and everything from `from` on; null for a ray that is not there. */
  | { readonly kind: 'rays'; readonly upTo: number | null; readonly from: number | null }
  /** Not a finite range: no value can be ruled out. */
  | { readonly kind: 'every-value' };

/** A leading coefficient below this share of what it is the difference of is zero. */
const leadingTolerance = 1e-14;

/**
 * Distances δ from the solution with (δ·slope)² ≤ m00 + 2δ·m01 + δ²·m11: a quadratic in δ.
 *
 * @param slope  b of the line that is solved.
 * @param moments  reach² of the line at the solution (m00 > 0), of its slope (m11), and their product (m01).
 * @see Fieller (1954), Journal of the Royal Statistical Society B 16, 175–185.
 */
export function fiellerRange(
  slope: number,
  { m00, m01, m11 }: { readonly m00: number; readonly m01: number; readonly m11: number },
): FiellerRange {
  const leading = slope * slope - m11;
  if (Math.abs(leading) <= leadingTolerance * Math.max(slope * slope, m11)) {
    if (m01 === 0) return { kind: 'every-value' };
    const end = -m00 / (2 * m01);
    return m01 > 0
      ? { kind: 'rays', upTo: null, from: end }
      : { kind: 'rays', upTo: end, from: null };
  }
  const discriminant = m01 * m01 + leading * m00;
  if (discriminant < 0 || (discriminant === 0 && leading < 0)) return { kind: 'every-value' };
  // The root away from zero is taken without cancellation, the other from their product −m00/leading.
  const sum = m01 + (m01 < 0 ? -1 : 1) * Math.sqrt(discriminant);
  const other = sum === 0 ? 0 : -m00 / sum;
  const roots = [sum / leading, other].sort((left, right) => left - right);
  return leading > 0
    ? { kind: 'interval', low: roots[0], high: roots[1] }
    : { kind: 'rays', upTo: roots[0], from: roots[1] };
}
