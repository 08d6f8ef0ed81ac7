import type { Kysely } from 'kysely';
import type { Database } from '../schema/database';

export interface ImportRow {
  readonly id: string;
  readonly fileId: string;
  readonly fileName: string;
  readonly byteSize: number;
  readonly state: 'mapped' | 'checked' | 'committed';
  readonly preview: object;
  readonly mapping: object;
  readonly findings: object | null;
  readonly panelVersionId: string | null;
}

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

  find(id: string): Promise<ImportRow | undefined> {
    return this.select().where('importDraft.id', '=', id).executeTakeFirst();
  }

  /** As `find`, and holds the row until the transaction ends. */
  findForUpdate(id: string): Promise<ImportRow | undefined> {
    return this.select()
      .where('importDraft.id', '=', id)
      .forUpdate('importDraft')
      .executeTakeFirst();
  }

  async saveCheck(id: string, mapping: object, findings: object): Promise<void> {
    await this.db
      .updateTable('importDraft')
      .set({
        state: 'checked',
        mapping: JSON.stringify(mapping),
        findings: JSON.stringify(findings),
      })
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .where('state', '!=', 'committed')
      .execute();
  }

  async markCommitted(id: string, panelVersionId: string): Promise<void> {
    await this.db
      .updateTable('importDraft')
      .set({ state: 'committed', panelVersionId })
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .execute();
  }

  async remove(id: string): Promise<void> {
    await this.db
      .deleteFrom('importDraft')
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .where('state', '!=', 'committed')
      .execute();
  }

  private select() {
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
        'importDraft.panelVersionId',
      ])
      .where('importDraft.workspaceId', '=', this.workspaceId);
  }
}
