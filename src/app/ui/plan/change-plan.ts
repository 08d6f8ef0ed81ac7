import { type PredictionBasis, heldRegressors } from '@prediction';
import type { PlannedYear } from './planned-year';

export const mostYears = 5;

/** The plan that changes nothing: the last actual values, for so many coming years. */
export function heldPlan(
  basis: Pick<PredictionBasis, 'held' | 'last'>,
  years: number,
): readonly PlannedYear[] {
  const { year } = basis.last;
  const values = heldRegressors(basis);
  return Array.from({ length: years }, (_, index) => ({
    year: year + 1 + index,
    values,
  }));
}

/** One more year, with the values of the plan's last one. */
export function withYearAdded(plan: readonly PlannedYear[]): readonly PlannedYear[] {
  const last = plan[plan.length - 1];
  return plan.length < mostYears ? [...plan, { year: last.year + 1, values: last.values }] : plan;
}

/** Without its last year; a plan keeps at least one. */
export function withYearRemoved(plan: readonly PlannedYear[]): readonly PlannedYear[] {
  return plan.length > 1 ? plan.slice(0, -1) : plan;
}

export function withYearSet(
  plan: readonly PlannedYear[],
  year: number,
  values: readonly number[],
): readonly PlannedYear[] {
  return plan.map((planned) => (planned.year === year ? { year, values } : planned));
}

export function withValue(
  plan: readonly PlannedYear[],
  year: number,
  regressor: number,
  value: number,
): readonly PlannedYear[] {
  return plan.map((planned) =>
    planned.year === year
      ? { year, values: planned.values.map((old, k) => (k === regressor ? value : old)) }
      : planned,
  );
}

/** Whether two plans ask for the same: the same years with the same values. */
export function isSamePlan(left: readonly PlannedYear[], right: readonly PlannedYear[]): boolean {
  return (
    left.length === right.length &&
    left.every(
      ({ year, values }, index) =>
        year === right[index].year &&
        values.length === right[index].values.length &&
        values.every((value, k) => value === right[index].values[k]),
    )
  );
}
