/** Numbers of the engine by the name of the figure; null where it says that one is not defined. */
export type FigureValues = Readonly<Record<string, readonly (number | null | undefined)[]>>;

interface Ends {
  readonly estimate: number;
  readonly standardError: number | null;
  readonly low: number | null;
  readonly high: number | null;
}

/** Estimate, standard error and ends, the order in which the outside values hold an interval. */
export function intervalValues({ estimate, standardError, low, high }: Ends): (number | null)[] {
  return [estimate, standardError, low, high];
}

/** The numbers, or one null in their place. */
export function orNull(values: readonly number[] | null): readonly (number | null)[] {
  return values ?? [null];
}
