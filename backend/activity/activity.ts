import { randomUUID } from 'node:crypto';
import type { WorkspaceRepositories } from '../../db/repositories/repositories';

/** What people do that an auditor may ask for. */
export type ActivityAction =
  | 'workspace-created'
  | 'signed-in'
  | 'member-invited'
  | 'invitation-withdrawn'
  | 'member-joined'
  | 'roles-changed'
  | 'member-removed'
  | 'file-uploaded'
  | 'file-downloaded'
  | 'panel-committed'
  | 'import-cancelled'
  | 'import-discarded'
  | 'panel-corrected'
  | 'panel-restored'
  | 'panel-exported'
  | 'flag-dismissed'
  | 'flag-dismissal-taken-back'
  | 'peer-group-saved'
  | 'peer-trial-started'
  | 'peer-trial-cancelled'
  | 'fit-started'
  | 'fit-cancelled'
  | 'fit-exported'
  | 'bootstrap-started'
  | 'bootstrap-cancelled'
  | 'scenario-saved'
  | 'scenario-deleted'
  | 'scenario-restored'
  | 'edition-published'
  | 'edition-viewed'
  | 'edition-exported'
  | 'edition-commented'
  | 'edition-signed'
  | 'edition-returned';

/** Writes an entry of the append-only record within the transaction of what it records. */
export async function record(
  tx: WorkspaceRepositories,
  personId: string,
  action: ActivityAction,
  subjectId: string | null,
  detail: object = {},
): Promise<void> {
  await tx.activity.append({ id: randomUUID(), personId, action, subjectId, detail });
}
