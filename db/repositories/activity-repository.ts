import type { Kysely } from 'kysely';
import type { Database } from '../schema/database';

export interface ActivityEntry {
  readonly id: string;
  readonly personId: string | null;
  readonly action: string;
  readonly subjectId: string | null;
  readonly detail: object;
}

/** The append-only record of who did what. */
export class ActivityRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  /** Entries of one action about one thing, oldest first. */
  ofSubject(subjectId: string, action: string): Promise<{ readonly detail: object }[]> {
    return this.db
      .selectFrom('activity')
      .select('detail')
      .where('workspaceId', '=', this.workspaceId)
      .where('subjectId', '=', subjectId)
      .where('action', '=', action)
      .orderBy('at')
      .execute();
  }

  async append(entry: ActivityEntry): Promise<void> {
    await this.db
      .insertInto('activity')
      .values({
        ...entry,
        detail: JSON.stringify(entry.detail),
        workspaceId: this.workspaceId,
      })
      .execute();
  }
}
