import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import { Conflict } from '../errors/app-error';
import type { ImportCheck } from './import-draft';

/**
 * A commit makes the changes that its check showed. A version made since, as by a correction, would vanish behind it
 * unseen.
 *
 * @param newest  the newest version of the panel of the import's name.
 * @throws {Conflict} `stale-version` when the check compared the file with another version, or with none.
 */
export function assertCheckedOn(
  newest: PanelVersionRow | undefined,
  { changes }: Pick<ImportCheck, 'changes'>,
): void {
  if (newest === undefined || newest.id === changes?.panelVersionId) return;
  throw new Conflict(
    `${newest.createdByName} made version ${newest.number} of “${newest.panelName}” after this file was checked. Check the file again to see what it would change there.`,
    'stale-version',
    { latestId: newest.id },
  );
}
