import type { PlanOutlook } from '@contract';
import {
  type PredictionBasis,
  type ScenarioDifference,
  type TQuantile,
  atConfidence,
  differenceOfScenarios,
  planRegressors,
} from '@prediction';
import { type PlannedYear, type ReadYear, readPlan } from '../../ui/plan/read-plan';

/** A plan to stand beside others of its fit; `id` null for the one on the page. */
export interface ComparedPlan {
  readonly id: string | null;
  readonly name: string;
  readonly plan: readonly PlannedYear[];
  readonly outlook: PlanOutlook;
}

export const mostCompared = 4;

/** A plan as its own outlook reads it, and why some of its years cannot be read. */
export interface ReadCompared extends ComparedPlan {
  readonly years: readonly ReadYear[];
  readonly refused: readonly { readonly year: number; readonly reason: string }[];
}

export function readCompared(
  basis: PredictionBasis,
  plans: readonly ComparedPlan[],
  tQuantile: TQuantile,
): readonly ReadCompared[] {
  return plans.map((compared) => {
    const { years, refused } = readPlan(basis, compared.plan, tQuantile, compared.outlook);
    return { ...compared, years, refused };
  });
}

/** One plan less the one it is compared with, in a year that both have. */
export interface ComparedDifference {
  readonly plan: ReadCompared;
  readonly year: number;
  readonly difference: ScenarioDifference;
}

/**
 * Each of the plans less another of them, year by year, as one contrast with its own interval at the confidence of that
 * other's outlook. Years that one of the two cannot be read in are left out.
 */
export function comparedDifferences(
  basis: PredictionBasis,
  plans: readonly ReadCompared[],
  to: ReadCompared,
  tQuantile: TQuantile,
): readonly ComparedDifference[] {
  const atLevel = atConfidence(basis, to.outlook.confidence, tQuantile);
  const sideOf = ({ plan, outlook: { start, yearEffect } }: ReadCompared, year: number) => {
    const asked = plan.map((planned) => ({ year: planned.year, regressors: planned.values }));
    const read = planRegressors(basis, asked).find((readable) => readable.year === year);
    return read === undefined || read.regressors === null
      ? null
      : { regressors: read.regressors, outlook: { start, yearEffect, year } };
  };
  return plans
    .filter((plan) => plan !== to)
    .flatMap((plan) =>
      plan.years.flatMap(({ year }) => {
        if (!to.years.some((other) => other.year === year)) return [];
        const [left, right] = [sideOf(plan, year), sideOf(to, year)];
        if (left === null || right === null) return [];
        const difference = differenceOfScenarios(atLevel, left, right, tQuantile);
        return [{ plan, year, difference }];
      }),
    );
}
