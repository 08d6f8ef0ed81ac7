import { createReadStream } from 'node:fs';
import { readTable } from '../../backend/compute/parsing/read-table';
import { toPanelColumns } from '../../backend/compute/parsing/to-panel-columns';
import { openFit, type PanelColumns, type Specification } from '../../backend/stats';
import type { OpenFit } from '../../backend/stats/fit-parts';
import { sha256 } from '../../backend/stats/testing/golden-panels';
import { engineFigures } from '../../backend/stats/testing/outside/engine-figures';
import {
  outsideDifference,
  type OutsideFigure,
} from '../../backend/stats/testing/outside/outside-difference';
import type { OutsideCase } from './cases';

/** What `compute.R` answers. */
export interface OutsideAnswer {
  readonly r: string;
  readonly packages: Readonly<Record<string, string>>;
  readonly cases: readonly OutsideCaseAnswer[];
}

export interface OutsideCaseAnswer {
  readonly id: string;
  readonly plans: readonly (readonly number[])[];
  readonly figures: Readonly<Record<string, OutsideFigure>>;
}

/** A figure of one case held against the outside value; infinitely far where the engine has no such figure. */
export interface FigureCheck {
  readonly figure: string;
  readonly caseId: string;
  readonly difference: number;
}

/** The same case as the server would compute it, from the file on. */
export async function openCase(root: URL, outside: OutsideCase): Promise<OpenFit> {
  const table = await readTable(createReadStream(new URL(outside.file, root)));
  return openData(toPanelColumns(table, outside).data, outside, 'cr2');
}

/** A case with one covariance of the slopes. */
export function openData(
  data: PanelColumns,
  outside: OutsideCase,
  slopes: Specification['slopes'],
): OpenFit {
  const { own, effects, form, lag, confidence } = outside;
  const seed = slopes === 'wild' ? 1 : null;
  const specification: Specification = { effects, form, lag, slopes, confidence, seed };
  return openFit({ data, specification, own, members: undefined }, { sha256 });
}

/** Every outside figure of a case beside the engine's. */
export function checkCase(open: OpenFit, answer: OutsideCaseAnswer): readonly FigureCheck[] {
  const ours = engineFigures(open, answer.plans);
  return Object.entries(answer.figures).map(([figure, outside]) => {
    const values = ours[figure];
    const difference = values === undefined ? Infinity : outsideDifference(values, outside);
    return { figure, caseId: answer.id, difference };
  });
}
