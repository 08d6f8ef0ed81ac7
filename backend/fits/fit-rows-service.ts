import type { WorkspaceRepositories } from '../../db/repositories/repositories';
import { findFinishedFit } from './fit-service';
import { readSubject } from './fit-subject';
import { rowsUsed, type RowUsed } from './replication/rows-used';

export type { RowUsed };

/** The rows of the panel that a finished fit was computed from. @throws {NotFound} */
export async function findRowsUsed(
  tx: WorkspaceRepositories,
  fitId: string,
): Promise<readonly RowUsed[]> {
  const found = await findFinishedFit(tx, fitId);
  const { columns } = await readSubject(tx, found);
  return [...rowsUsed(columns, found.result)];
}
