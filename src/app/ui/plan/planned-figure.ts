import { type PredictionBasis, heldRegressors } from '@prediction';
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
  /** Whether the value is money; a difference of logs is none. */
  readonly isMoney: boolean;
  readonly inputs: {
    readonly label: string;
    readonly value: number;
    readonly isMoney: boolean;
    readonly figure: null;
  }[];
}

export function planLineage(
  wanted: PlannedFigureWanted,
  labels: readonly string[],
  basis: PredictionBasis,
): PlanLineage {
  const { year, kind } = wanted;
  const held = heldRegressors(basis);
  const read = valuesRead(wanted, basis);
  const planned = labels.map((label, k) =>
    input(`${capitalised(label)} ${read.words}`, read.values[k], k),
  );
  const base = labels.map((label, k) => input(`${capitalised(label)} of the base`, held[k], k));
  return {
    key: `${kind}.${year.year}`,
    value: year[kind],
    label: labelOf(wanted, basis.form === 'log'),
    isMoney: kind === 'expected' || basis.form !== 'log',
    inputs: kind === 'expected' ? planned : [...planned, ...base],
  };
}

function labelOf({ plan, year, kind }: PlannedFigureWanted, isLog: boolean): string {
  return kind === 'expected'
    ? `${plan.name}: expected value in ${year.year}${isLog ? ', the mean' : ''}`
    : `${plan.name}: difference to the base in ${year.year}${isLog ? ', in natural logs' : ''}`;
}

/** What the model read for the year: its own plan, or with a lag that of the year before. */
function valuesRead(
  { plan, year }: PlannedFigureWanted,
  basis: PredictionBasis,
): { readonly values: readonly number[]; readonly words: string } {
  if (basis.lag !== 1) return { values: year.values, words: 'planned' };
  const of = year.year - 1;
  const before = plan.years.find((planned) => planned.year === of);
  return before === undefined
    ? { values: heldRegressors(basis), words: `of FY${basis.last.year}` }
    : { values: before.values, words: `planned for FY${of}` };
}

function input(label: string, value: number, regressor: number): PlanLineage['inputs'][number] {
  return { label, value, isMoney: regressorKind(regressor) === 'money', figure: null };
}
