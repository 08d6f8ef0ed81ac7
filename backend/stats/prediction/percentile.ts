/**
 * The value below which a share of the values lies, on a line between the two nearest: type 7.
 *
 * @param sorted  one value at least, ascending.
 * @param share  from 0, the smallest value, to 1, the largest.
 * @see Hyndman & Fan (1996), The American Statistician 50, 361–365.
 */
export function percentile(sorted: ArrayLike<number>, share: number): number {
  const place = (sorted.length - 1) * share;
  const below = Math.floor(place);
  const low = sorted[below];
  const high = sorted[Math.min(below + 1, sorted.length - 1)];
  // Between equal neighbours, infinite ones among them, there is no line to go along.
  return low === high ? low : low + (place - below) * (high - low);
}
