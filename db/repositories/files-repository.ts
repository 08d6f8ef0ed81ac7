import type { Kysely } from 'kysely';
import type { Database } from '../schema/database';

export interface StoredFileRow {
  readonly id: string;
  readonly name: string;
  readonly byteSize: number;
  readonly sha256: string;
  readonly content: Buffer;
}

/** Uploaded files, exactly as they came. */
export class FilesRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  async insert(file: StoredFileRow & { readonly createdBy: string }): Promise<void> {
    await this.db
      .insertInto('storedFile')
      .values({ ...file, workspaceId: this.workspaceId })
      .execute();
  }

  find(id: string): Promise<StoredFileRow | undefined> {
    return this.db
      .selectFrom('storedFile')
      .select(['id', 'name', 'byteSize', 'sha256', 'content'])
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .executeTakeFirst();
  }

  async remove(id: string): Promise<void> {
    await this.db
      .deleteFrom('storedFile')
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .execute();
  }
}
