/** Largest relative difference that a figure may have to its outside value. */
export const usualTolerance = 1e-9;

interface OwnTolerance {
  readonly tolerance: number;
  /** Why it is not the usual one. */
  readonly reason: string;
}

/** Figures with a tolerance of their own. */
const ownTolerances: Readonly<Record<string, OwnTolerance>> = {};

export function toleranceOf(figure: string): number {
  return ownTolerances[figure]?.tolerance ?? usualTolerance;
}
