import type { Kysely, UpdateObject } from 'kysely';
import type { Database } from '../schema/database';
import type { ImportProgress, ImportState } from '../schema/panel-tables';

export interface ImportRow {
  readonly id: string;
  readonly fileId: string;
  readonly fileName: string;
  readonly byteSize: number;
  readonly state: ImportState;
  readonly preview: object;
  readonly mapping: object;
  readonly findings: object | null;
  readonly progress: ImportProgress | null;
  readonly failure: string | null;
  readonly panelVersionId: string | null;
}

/** An import that is not a panel version yet; without its file's content and its check. */
export interface OpenImportRow {
  readonly id: string;
  readonly fileName: string;
  readonly state: Exclude<ImportState, 'committed'>;
  readonly createdAt: Date;
  /** Name of the person. */
  readonly createdBy: string;
}

/** An import that is being committed. */
export interface CommittingRow extends ImportRow {
  readonly note: string;
  readonly committedBy: string;
}

const open: readonly ImportState[] = ['mapped', 'checked', 'failed'];

/** Imports on their way from an uploaded file to a panel version. */
export class ImportsRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  async insert(draft: {
    readonly id: string;
    readonly fileId: string;
    readonly preview: object;
    readonly mapping: object;
    readonly createdBy: string;
  }): Promise<void> {
    await this.db
      .insertInto('importDraft')
      .values({
        ...draft,
        workspaceId: this.workspaceId,
        state: 'mapped',
        preview: JSON.stringify(draft.preview),
        mapping: JSON.stringify(draft.mapping),
      })
      .execute();
  }

  /** The newest first. */
  listOpen(): Promise<OpenImportRow[]> {
    return this.db
      .selectFrom('importDraft')
      .innerJoin('storedFile', (join) =>
        join
          .onRef('storedFile.workspaceId', '=', 'importDraft.workspaceId')
          .onRef('storedFile.id', '=', 'importDraft.fileId'),
      )
      .innerJoin('person', 'person.id', 'importDraft.createdBy')
      .select([
        'importDraft.id',
        'storedFile.name as fileName',
        'importDraft.state',
        'importDraft.createdAt',
        'person.name as createdBy',
      ])
      .where('importDraft.workspaceId', '=', this.workspaceId)
      .where('importDraft.state', '!=', 'committed')
      .$narrowType<{ state: OpenImportRow['state'] }>()
      .orderBy('importDraft.createdAt', 'desc')
      .execute();
  }

  find(id: string): Promise<ImportRow | undefined> {
    return this.#select().where('importDraft.id', '=', id).executeTakeFirst();
  }

  /** As `find`, and holds the row until the transaction ends. */
  findForUpdate(id: string): Promise<ImportRow | undefined> {
    return this.#select()
      .where('importDraft.id', '=', id)
      .forUpdate('importDraft')
      .executeTakeFirst();
  }

  /** Undefined once the commit is cancelled or has ended. */
  findCommitting(commitId: string): Promise<CommittingRow | undefined> {
    return this.#selectCommitting(commitId).executeTakeFirst();
  }

  /** As `findCommitting`, and holds the row until the transaction ends. */
  findCommittingForUpdate(commitId: string): Promise<CommittingRow | undefined> {
    return this.#selectCommitting(commitId).forUpdate('importDraft').executeTakeFirst();
  }

  /** How many imports of the workspace are being committed. */
  async committing(): Promise<number> {
    const { count } = await this.db
      .selectFrom('importDraft')
      .select(({ fn }) => fn.countAll<number>().as('count'))
      .where('workspaceId', '=', this.workspaceId)
      .where('state', '=', 'committing')
      .executeTakeFirstOrThrow();
    return count;
  }

  /** Another way of reading the file; what was checked before is forgotten. False for one that is not open. */
  saveReading(id: string, preview: object, mapping: object): Promise<boolean> {
    return this.#changeOpen(id, {
      state: 'mapped',
      preview: JSON.stringify(preview),
      mapping: JSON.stringify(mapping),
      findings: null,
      failure: null,
    });
  }

  /** False for an import that is not open. */
  saveCheck(
    id: string,
    { preview, mapping, check }: { preview: object; mapping: object; check: object },
  ): Promise<boolean> {
    return this.#changeOpen(id, {
      state: 'checked',
      preview: JSON.stringify(preview),
      mapping: JSON.stringify(mapping),
      findings: JSON.stringify(check),
      failure: null,
    });
  }

  /** False for an import that is not open. */
  startCommit(
    id: string,
    commit: { readonly commitId: string; readonly committedBy: string; readonly note: string },
    progress: ImportProgress,
  ): Promise<boolean> {
    return this.#changeOpen(id, {
      ...commit,
      state: 'committing',
      failure: null,
      progress: JSON.stringify(progress),
    });
  }

  /** False when the commit was cancelled or has ended. */
  saveProgress(commitId: string, progress: ImportProgress): Promise<boolean> {
    return this.#changeCommitting(commitId, { progress: JSON.stringify(progress) });
  }

  failCommit(commitId: string, failure: string): Promise<boolean> {
    return this.#changeCommitting(commitId, { state: 'failed', failure, progress: null });
  }

  finishCommit(commitId: string, panelVersionId: string): Promise<boolean> {
    return this.#changeCommitting(commitId, {
      state: 'committed',
      panelVersionId,
      progress: null,
    });
  }

  /** Back to where the commit began; false for an import that is not being committed. */
  async cancelCommit(id: string): Promise<boolean> {
    const result = await this.db
      .updateTable('importDraft')
      .set({ state: 'checked', progress: null, commitId: null })
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .where('state', '=', 'committing')
      .executeTakeFirst();
    return result.numUpdatedRows > 0n;
  }

  async remove(id: string): Promise<void> {
    await this.db
      .deleteFrom('importDraft')
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .where('state', 'in', open)
      .execute();
  }

  async #changeOpen(id: string, change: UpdateObject<Database, 'importDraft'>): Promise<boolean> {
    const result = await this.db
      .updateTable('importDraft')
      .set(change)
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .where('state', 'in', open)
      .executeTakeFirst();
    return result.numUpdatedRows > 0n;
  }

  async #changeCommitting(
    commitId: string,
    change: UpdateObject<Database, 'importDraft'>,
  ): Promise<boolean> {
    const result = await this.db
      .updateTable('importDraft')
      .set(change)
      .where('workspaceId', '=', this.workspaceId)
      .where('commitId', '=', commitId)
      .where('state', '=', 'committing')
      .executeTakeFirst();
    return result.numUpdatedRows > 0n;
  }

  #selectCommitting(commitId: string) {
    return (
      this.#select()
        .select(['importDraft.note', 'importDraft.committedBy'])
        // A constraint has them there while the state is this one.
        .$narrowType<{ note: string; committedBy: string }>()
        .where('importDraft.commitId', '=', commitId)
        .where('importDraft.state', '=', 'committing')
    );
  }

  #select() {
    return this.db
      .selectFrom('importDraft')
      .innerJoin('storedFile', (join) =>
        join
          .onRef('storedFile.workspaceId', '=', 'importDraft.workspaceId')
          .onRef('storedFile.id', '=', 'importDraft.fileId'),
      )
      .select([
        'importDraft.id',
        'importDraft.fileId',
        'storedFile.name as fileName',
        'storedFile.byteSize',
        'importDraft.state',
        'importDraft.preview',
        'importDraft.mapping',
        'importDraft.findings',
        'importDraft.progress',
        'importDraft.failure',
        'importDraft.panelVersionId',
      ])
      .where('importDraft.workspaceId', '=', this.workspaceId);
  }
}
