/** A figure as computed outside: its numbers, what made them, and the sizes that differences are held against. */
export interface OutsideFigure {
  readonly call: string;
  readonly value: readonly (number | null)[];
  /** Beside a number's own size, where that says little: an interval's end is held against the standard error. One for all or one each. */
  readonly scale?: number | readonly number[];
  /** Why the outside program computes none. */
  readonly refused?: string;
}

/**
 * Largest difference of a figure's numbers, each relative to the larger of the outside value and its scale. Infinite
 * where one side has a number and the other none, or another count of numbers.
 */
export function outsideDifference(
  ours: readonly (number | null | undefined)[],
  { value, scale }: OutsideFigure,
): number {
  if (ours.length !== value.length) return Infinity;
  return value.reduce<number>((largest, expected, index) => {
    const actual = ours[index] ?? null;
    if (expected === null || actual === null) {
      return expected === actual ? largest : Infinity;
    }
    if (expected === actual) return largest;
    const size = typeof scale === 'number' ? scale : (scale?.[index] ?? 0);
    const apart = Math.abs(actual - expected) / Math.max(Math.abs(expected), size);
    return Number.isNaN(apart) ? Infinity : Math.max(largest, apart);
  }, 0);
}
