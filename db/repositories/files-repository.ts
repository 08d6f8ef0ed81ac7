import { type Kysely, sql } from 'kysely';
import type { Database } from '../schema/database';

export interface StoredFileRow {
  readonly id: string;
  readonly name: string;
  readonly byteSize: number;
  readonly sha256: string;
  readonly content: Buffer;
}

/** Bytes a statement reads: a file in one piece keeps this process from answering others while it is decoded. */
const sliceBytes = 1 << 20;

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

  async find(id: string): Promise<StoredFileRow | undefined> {
    const found = await this.db
      .selectFrom('storedFile')
      .select(['id', 'name', 'byteSize', 'sha256'])
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .executeTakeFirst();
    return found === undefined ? undefined : { ...found, content: await this.#content(found) };
  }

  /** What the workspace's files take together. */
  usage(): Promise<{ readonly files: number; readonly bytes: number }> {
    return this.db
      .selectFrom('storedFile')
      .select(({ fn }) => [
        fn.countAll<number>().as('files'),
        sql<number>`coalesce(sum(byte_size), 0)::bigint`.as('bytes'),
      ])
      .where('workspaceId', '=', this.workspaceId)
      .executeTakeFirstOrThrow();
  }

  async remove(id: string): Promise<void> {
    await this.db
      .deleteFrom('storedFile')
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .execute();
  }

  /**
   * The content is stored uncompressed, so that PostgreSQL reads a slice without the rest. Base64 takes half the time of
   * the hexadecimal digits that bytes travel as.
   */
  async #content({ id, byteSize }: { id: string; byteSize: number }): Promise<Buffer> {
    const content = Buffer.alloc(byteSize);
    for (let start = 0; start < byteSize; start += sliceBytes) {
      const slice = await this.db
        .selectFrom('storedFile')
        .select(
          sql<string>`encode(substring(content from ${start + 1} for ${sliceBytes}), 'base64')`.as(
            'bytes',
          ),
        )
        .where('workspaceId', '=', this.workspaceId)
        .where('id', '=', id)
        .executeTakeFirstOrThrow();
      content.write(slice.bytes, start, 'base64');
    }
    return content;
  }
}
