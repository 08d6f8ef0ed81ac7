import type { WorkspaceRepositories } from '../../db/repositories/repositories';
import type { FitSubject } from '../compute/messages';
import type { FitOnGround } from './fit-service';
import { toPanelColumns } from './panel-columns';

/** The own company first, then the peers that are in. */
export function memberNames({ peerGroup }: Pick<FitOnGround, 'peerGroup'>): readonly string[] {
  const peers = peerGroup.choices.filter((choice) => choice.isIncluded);
  return [peerGroup.ownCompany, ...peers.map((choice) => choice.company)];
}

/** Reads what a worker needs of a fit. */
export async function readSubject(
  tx: WorkspaceRepositories,
  found: FitOnGround,
): Promise<FitSubject> {
  const { fit, panelVersion, peerGroup } = found;
  const members = memberNames(found);
  const rows = await tx.panels.rows(panelVersion.id, members);
  const { outcome: _, regressors: __, ...specification } = fit.specification;
  return {
    columns: toPanelColumns(panelVersion, rows, fit.specification),
    specification,
    own: peerGroup.ownCompany,
    members,
  };
}
