import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import type { WorkspaceRepositories } from '../../db/repositories/repositories';
import { NotFound } from '../errors/app-error';

/** @throws {NotFound} */
export async function findPanelVersion(
  tx: WorkspaceRepositories,
  id: string,
): Promise<PanelVersionRow> {
  const found = await tx.panels.findVersion(id);
  if (found === undefined) throw new NotFound('There is no such panel version.');
  return found;
}
