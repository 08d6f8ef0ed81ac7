import type { PanelRows, PanelVersionRow } from '../../../db/repositories/panels-repository';
import type { WorkspaceRepositories } from '../../../db/repositories/repositories';
import type { FitSubject } from '../../compute/messages';
import { NotFound } from '../../errors/app-error';
import { toPanelColumns } from '../panel-columns';
import { membersOf, type TrialGroup, type TrialRequest } from './trial-groups';

/** A trial with the rows of everybody in it. */
export interface TrialGround {
  readonly request: TrialRequest;
  readonly version: PanelVersionRow;
  readonly rows: PanelRows;
}

/** @throws {NotFound} */
export async function readTrialGround(
  tx: WorkspaceRepositories,
  request: TrialRequest,
): Promise<TrialGround> {
  const version = await tx.panels.findVersion(request.panelVersionId);
  if (version === undefined) throw new NotFound('There is no such panel version.');
  const { ownCompany, peers, candidates } = request;
  const rows = await tx.panels.rows(version.id, [ownCompany, ...peers, ...candidates]);
  return { request, version, rows };
}

/** What a worker needs to fit a group: the same rows in the same order as of a saved group of these members. */
export function trialSubject(
  { request, version, rows }: TrialGround,
  group: TrialGroup,
): FitSubject {
  const members = membersOf(request, group);
  const { outcome: _, regressors: __, ...specification } = request.specification;
  return {
    columns: toPanelColumns(version, rowsOf(rows, new Set(members)), request.specification),
    specification,
    own: request.ownCompany,
    members,
  };
}

function rowsOf(rows: PanelRows, companies: ReadonlySet<string>): PanelRows {
  const isOf = (_: unknown, row: number): boolean => companies.has(rows.company[row]);
  return {
    company: rows.company.filter(isOf),
    year: rows.year.filter(isOf),
    fileRow: rows.fileRow.filter(isOf),
    cells: rows.cells.filter(isOf),
  };
}
