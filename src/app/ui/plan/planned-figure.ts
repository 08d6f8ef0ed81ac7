import type { PlannedFigureWanted } from './plan-table';
import { capitalised } from './plan-words';
import { regressorKind } from './regressor-labels';

/** What only the screen knows of a plan's figure, for the lineage drawer: its value and the amounts planned. */
export interface PlanLineage {
  readonly key: string;
  readonly value: {
    readonly estimate: number;
    readonly standardError: number | null;
    readonly low: number | null;
    readonly high: number | null;
    readonly intervalReason?: string;
  };
  readonly label: string;
  readonly inputs: {
    readonly label: string;
    readonly value: number;
    readonly isMoney: boolean;
    readonly figure: null;
  }[];
}

export function planLineage(
  { plan, year, kind }: PlannedFigureWanted,
  labels: readonly string[],
  held: readonly number[],
): PlanLineage {
  const planned = labels.map((label, k) =>
    input(`${capitalised(label)} planned`, year.values[k], k),
  );
  const base = labels.map((label, k) => input(`${capitalised(label)} of the base`, held[k], k));
  return {
    key: `${kind}.${year.year}`,
    value: year[kind],
    label:
      kind === 'expected'
        ? `${plan.name}: expected value in ${year.year}`
        : `${plan.name}: difference to the base in ${year.year}`,
    inputs: kind === 'expected' ? planned : [...planned, ...base],
  };
}

function input(label: string, value: number, regressor: number): PlanLineage['inputs'][number] {
  return { label, value, isMoney: regressorKind(regressor) === 'money', figure: null };
}
