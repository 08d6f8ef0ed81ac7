import type { EditionRow, EditionState } from '../../db/repositories/editions-repository';
import type { WorkspaceRepositories } from '../../db/repositories/repositories';
import { NotFound } from '../errors/app-error';

/** Who asks for an edition. */
export interface Reader {
  readonly personId: string;
  readonly workspaceId: string;
  readonly roles: readonly string[];
}

const everyState: readonly EditionState[] = ['waiting', 'signed', 'returned', 'superseded'];
/** What somebody who only reads may see: what was signed, whether or not a later one superseded it. */
const signedStates: readonly EditionState[] = ['signed', 'superseded'];

export function visibleStates(reader: Reader): readonly EditionState[] {
  return seesDrafts(reader) ? everyState : signedStates;
}

/** Whether somebody sees editions before they are signed, and who looked at one. */
export function seesDrafts(reader: Reader): boolean {
  return reader.roles.includes('analyst') || reader.roles.includes('cfo');
}

/** @throws {NotFound}, also for one that this reader may not see. */
export async function findEdition(
  tx: WorkspaceRepositories,
  reader: Reader,
  id: string,
): Promise<EditionRow> {
  const found = await tx.editions.find(id);
  if (found === undefined || !visibleStates(reader).includes(found.state))
    throw new NotFound('There is no such edition.');
  return found;
}
