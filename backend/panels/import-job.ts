import type { JobTicketRow } from '../../db/repositories/jobs-repository';
import type { Repositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import type { FilePanel } from '../compute/parse-messages';
import { type ParseProcess, ParseRefused } from '../compute/parse-process';
import { Conflict } from '../errors/app-error';
import { watchedRun } from '../jobs/watched-run';
import type { ImportCheck, PanelMapping } from './import-draft';
import { storeVersion } from './store-version';

/** 200,000 rows are written in two or three seconds: their number is to be seen growing. */
const watchEveryMs = 250;

/** What a commit works from, as it stood when the job took it up. */
interface Commit {
  readonly workspaceId: string;
  readonly commitId: string;
  readonly fileId: string;
  readonly fileName: string;
  readonly bytes: Buffer;
  readonly mapping: PanelMapping;
  readonly check: ImportCheck;
  readonly note: string;
  readonly personId: string;
}

/** Somebody cancelled in the moment before the transaction would have ended. */
class CommitCancelled extends Error {
  override readonly name = 'CommitCancelled';
}

/** Works one queued commit: the file is read anew and its rows become a panel version, all of them or none. */
export class ImportJob {
  constructor(
    private readonly repositories: Repositories,
    private readonly parser: ParseProcess,
  ) {}

  async run({ workspaceId, subjectId: commitId }: JobTicketRow): Promise<void> {
    const commit = await this.#takeUp(workspaceId, commitId);
    if (commit === undefined) return;
    try {
      await this.#work(commit);
    } catch (error) {
      if (error instanceof CommitCancelled) return;
      // The same file and mapping would be refused again, and a newer version stays: no second try.
      if (!(error instanceof ParseRefused || error instanceof Conflict)) throw error;
      await this.#fail(workspaceId, commitId, error.message);
    }
  }

  /** After the last try failed: whoever waits for it is told. */
  async giveUp({ workspaceId, subjectId: commitId }: JobTicketRow): Promise<void> {
    const failure =
      'The server could not finish this import. Start it again; if that fails too, tell whoever runs the server.';
    await this.#fail(workspaceId, commitId, failure);
  }

  async #takeUp(workspaceId: string, commitId: string): Promise<Commit | undefined> {
    return this.repositories.inWorkspace(workspaceId, async (tx) => {
      const found = await tx.imports.findCommitting(commitId);
      if (found === undefined) return undefined;
      const file = await tx.files.find(found.fileId);
      if (file === undefined) throw new Error(`file ${found.fileId} of an import is not there`);
      const { fileId, fileName, note, committedBy: personId } = found;
      const mapping = found.mapping as PanelMapping;
      const check = found.findings as ImportCheck;
      const bytes = file.content;
      return { workspaceId, commitId, fileId, fileName, bytes, mapping, check, note, personId };
    });
  }

  async #work(commit: Commit): Promise<void> {
    const { workspaceId, commitId, check } = commit;
    const of = check.rows;
    let written = 0;
    const write = async (signal: AbortSignal): Promise<void> => {
      const file = { owner: workspaceId, bytes: commit.bytes, name: commit.fileName };
      const panel = await this.parser.read(file, commit.mapping, signal);
      await this.#store(commit, panel, { signal, onWritten: (done) => (written = done) });
    };
    await watchedRun(
      (signal) => ({ answer: write(signal), progress: () => written / of }),
      (share) => {
        const progress = { done: Math.round(share * of), of };
        return this.repositories.inWorkspace(workspaceId, (tx) =>
          tx.imports.saveProgress(commitId, progress),
        );
      },
      watchEveryMs,
    );
  }

  async #store(
    { workspaceId, commitId, fileId, mapping, check, note, personId }: Commit,
    panel: FilePanel,
    writing: { readonly signal: AbortSignal; readonly onWritten: (rows: number) => void },
  ): Promise<void> {
    await this.repositories.inWorkspace(workspaceId, async (tx) => {
      const version = { fileId, mapping, check, note, personId, panel };
      const versionId = await storeVersion(tx, version, writing);
      if ((await tx.imports.findCommittingForUpdate(commitId)) === undefined)
        throw new CommitCancelled();
      await tx.imports.finishCommit(commitId, versionId);
      await record(tx, personId, 'panel-committed', versionId, { rows: panel.year.length });
    });
  }

  async #fail(workspaceId: string, commitId: string, failure: string): Promise<void> {
    await this.repositories.inWorkspace(workspaceId, (tx) =>
      tx.imports.failCommit(commitId, failure),
    );
  }
}
