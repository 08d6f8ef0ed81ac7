import type { PlanOutlook, PlanUncertainty } from '@contract';
import type { PredictionBasis, UncertainPlanRequest, UncertainYear } from '@prediction';
import type { PlannedYear } from '../../ui/plan/read-plan';

/** What is asked of the draws; plain data, which goes to a worker as it is. */
export interface UncertainQuestion {
  readonly basis: PredictionBasis;
  readonly request: UncertainPlanRequest;
}

export interface UncertainAnswer {
  readonly question: UncertainQuestion;
  readonly years: readonly UncertainYear[];
  /** What went wrong where nothing could be drawn. */
  readonly failure?: string;
}

export const usualDraws = 10_000;

/** A plan with its ranges as triangles, the planned amount the likeliest; null where every amount is certain. */
export function uncertainRequest(
  plan: readonly PlannedYear[],
  uncertainty: PlanUncertainty | null,
  { start, yearEffect }: Pick<PlanOutlook, 'start' | 'yearEffect'>,
): UncertainPlanRequest | null {
  if (uncertainty === null) return null;
  const { seed, ranges } = uncertainty;
  if (!ranges.some((ofYear) => ofYear.some((range) => range !== null))) return null;
  return {
    years: plan.map(({ year, values }, index) => ({
      year,
      inputs: values.map((likely, k) => {
        const range = ranges.at(index)?.[k] ?? null;
        return { low: range?.low ?? likely, likely, high: range?.high ?? likely };
      }),
    })),
    seed,
    draws: usualDraws,
    start,
    yearEffect,
  };
}

/** Whether two questions have the same draws for an answer. */
export function isSameQuestion(
  left: UncertainQuestion | null,
  right: UncertainQuestion | null,
): boolean {
  if (left === null || right === null) return left === right;
  return (
    left.basis === right.basis && JSON.stringify(left.request) === JSON.stringify(right.request)
  );
}
