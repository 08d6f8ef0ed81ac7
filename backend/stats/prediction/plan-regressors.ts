import type { PredictionBasis } from './prediction-basis';

/** Planned regressors of one year, in the order of the basis and the panel's measure. */
export interface PlanYear {
  readonly year: number;
  readonly regressors: readonly number[];
}

/** What the model reads for one year of a plan, or why it has nothing to read. */
export type ReadableYear =
  | (PlanYear & {
      /** The year whose values these are: with a lag the one before. */
      readonly of: number;
    })
  | { readonly year: number; readonly regressors: null; readonly reason: string };

/** The last observed regressors, which the base holds; what the model last read where it cannot read one of them. */
export function heldRegressors(basis: Pick<PredictionBasis, 'held' | 'last'>): readonly number[] {
  return basis.held ?? basis.last.regressors;
}

/**
 * A plan by years as the model reads it, one entry a planned year. With a lag the plan of a year acts in the next one,
 * and the first year reads the last observed values.
 */
export function planRegressors(
  basis: PredictionBasis,
  plan: readonly PlanYear[],
): readonly ReadableYear[] {
  return plan.map(({ year, regressors }): ReadableYear => {
    if (year <= basis.last.year) {
      return {
        year,
        regressors: null,
        reason: `FY${year} is not after FY${basis.last.year}, the last observed year of ${basis.company}.`,
      };
    }
    return basis.lag === 1 ? readLagged(basis, plan, year) : { year, regressors, of: year };
  });
}

function readLagged(basis: PredictionBasis, plan: readonly PlanYear[], year: number): ReadableYear {
  const of = year - 1;
  const regressors =
    of === basis.last.year ? basis.held : plan.find((planned) => planned.year === of)?.regressors;
  if (regressors !== undefined && regressors !== null) return { year, regressors, of };
  const absent =
    of === basis.last.year
      ? `${basis.company} has no values of FY${of} that the model can read; they`
      : `The plan has no values of FY${of}; they`;
  return {
    year,
    regressors: null,
    reason: `${absent} act in FY${year}.`,
  };
}
