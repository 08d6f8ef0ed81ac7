import { randomUUID } from 'node:crypto';
import { setTimeout as pause } from 'node:timers/promises';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { Conflict, NotFound, Unprocessable } from '../errors/app-error';
import type { JobQueue } from '../jobs/job-queue';
import { assertCheckedOn } from './assert-checked-on';
import {
  type Actor,
  findImport,
  type ImportCheck,
  type ImportDraft,
  toDraft,
} from './import-draft';
import { assertFewCommitting } from './storage-quota';

const lookEveryMs = 100;

/** Has a checked import made a panel version in the background, and cancels that. */
export class ImportCommitService {
  constructor(
    private readonly repositories: Repositories,
    private readonly queue: JobQueue,
  ) {}

  /**
   * Queues the commit; asked again while it runs or after it, the answer is the import as it stands.
   *
   * @throws {NotFound}; {Unprocessable} `import-not-ready` while the check has findings that block; {Conflict}
   *   `stale-version` when the panel has another version since the check; {TooManyRequests} `quota` while the workspace
   *   has several under way.
   */
  async start(actor: Actor, importId: string, note: string): Promise<ImportDraft> {
    const draft = await this.repositories.inWorkspace(actor.workspaceId, (tx) =>
      this.#queue(tx, { actor, importId, note }),
    );
    this.queue.wake('import');
    return draft;
  }

  async #queue(
    tx: WorkspaceRepositories,
    { actor, importId, note }: { actor: Actor; importId: string; note: string },
  ): Promise<ImportDraft> {
    await tx.members.lockWorkspace();
    const found = await tx.imports.findForUpdate(importId);
    if (found === undefined) throw new NotFound('There is no such import.');
    const draft = toDraft(found);
    if (draft.state === 'committing' || draft.state === 'committed') return draft;
    const { check, panelName } = ready(draft);
    assertCheckedOn(await tx.panels.findLatestByName(panelName), check);
    await assertFewCommitting(tx);
    const commitId = randomUUID();
    const commit = { commitId, note, committedBy: actor.personId };
    await tx.imports.startCommit(importId, commit, { done: 0, of: check.rows });
    await this.queue.enqueue(tx, 'import', commitId);
    return toDraft(await findImport(tx, importId));
  }

  /** The import is open again, as checked. @throws {NotFound}; {Conflict} when it is not being committed. */
  async cancel(actor: Actor, importId: string): Promise<void> {
    await this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const isCancelled = await tx.imports.cancelCommit(importId);
      const { state, fileId } = await findImport(tx, importId);
      if (state === 'committed')
        throw new Conflict('This import is a panel version already; it stays.');
      if (!isCancelled) throw new Conflict('This import is not being made a panel version.');
      await record(tx, actor.personId, 'import-cancelled', fileId);
    });
  }

  /**
   * Commits and waits for the end: for programs that fill a workspace. A server must be working the queues.
   *
   * @returns the panel version's id.
   * @throws what `start` throws; {Error} with the failure's words, or when it takes longer than `timeoutMs`.
   */
  async finish(actor: Actor, importId: string, note: string, timeoutMs = 60_000): Promise<string> {
    let draft = await this.start(actor, importId, note);
    for (const until = Date.now() + timeoutMs; Date.now() < until;) {
      if (draft.panelVersionId !== null) return draft.panelVersionId;
      if (draft.state !== 'committing')
        throw new Error(`the import ended ${draft.state}: ${draft.failure ?? 'cancelled'}`);
      await pause(lookEveryMs);
      draft = await this.repositories.inWorkspace(actor.workspaceId, async (tx) =>
        toDraft(await findImport(tx, importId)),
      );
    }
    throw new Error(`the import did not end within ${timeoutMs / 1000} seconds`);
  }
}

interface ReadyImport {
  readonly check: ImportCheck;
  readonly panelName: string;
}

/** @throws {Unprocessable} when something keeps the import from becoming a panel. */
function ready({ check, mapping: { panelName } }: ImportDraft): ReadyImport {
  if (check === null || panelName === undefined)
    throw new Unprocessable('Check the columns before committing.', 'import-not-ready');
  if (check.blockingCount > 0)
    throw new Unprocessable(
      `${check.blockingCount} findings keep this file from becoming a panel. Mend them, or leave their rows out.`,
      'import-not-ready',
    );
  if (check.rows === 0)
    throw new Unprocessable('The file has a header and no rows.', 'import-not-ready');
  return { check, panelName };
}
