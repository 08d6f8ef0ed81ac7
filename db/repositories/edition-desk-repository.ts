import type { Kysely } from 'kysely';
import type { Database } from '../schema/database';

export interface EditionCommentRow {
  readonly id: string;
  readonly editionId: string;
  readonly editionNumber: number;
  readonly block: string;
  readonly body: string;
  readonly writtenByName: string;
  readonly writtenAt: Date;
}

export interface EditionAccessRow {
  readonly personName: string;
  readonly kind: 'viewed' | 'exported';
  readonly format: string | null;
  readonly at: Date;
}

/** What surrounds editions and is never part of what they froze. */
export class EditionDeskRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  /** Ids of the warnings of an edition that a person has opened. */
  async openedWarnings(editionId: string, personId: string): Promise<string[]> {
    const found = await this.db
      .selectFrom('editionWarningOpened')
      .select('warningId')
      .where('workspaceId', '=', this.workspaceId)
      .where('editionId', '=', editionId)
      .where('personId', '=', personId)
      .execute();
    return found.map(({ warningId }) => warningId);
  }

  /** The first opening counts; later ones change nothing. */
  async openWarning(editionId: string, personId: string, warningId: string): Promise<void> {
    await this.db
      .insertInto('editionWarningOpened')
      .values({ workspaceId: this.workspaceId, editionId, personId, warningId })
      .onConflict((conflict) => conflict.doNothing())
      .execute();
  }

  /** Comments on an edition and on those it answers, one behind the other; oldest first. */
  comments(editionId: string): Promise<EditionCommentRow[]> {
    return this.db
      .withRecursive('thread', (db) =>
        db
          .selectFrom('edition')
          .select(['edition.id', 'edition.number', 'edition.answers'])
          .where('edition.workspaceId', '=', this.workspaceId)
          .where('edition.id', '=', editionId)
          .unionAll(
            db
              .selectFrom('edition')
              .innerJoin('thread', 'thread.answers', 'edition.id')
              .select(['edition.id', 'edition.number', 'edition.answers'])
              .where('edition.workspaceId', '=', this.workspaceId),
          ),
      )
      .selectFrom('editionComment')
      .innerJoin('thread', 'thread.id', 'editionComment.editionId')
      .innerJoin('person', 'person.id', 'editionComment.writtenBy')
      .select([
        'editionComment.id',
        'editionComment.editionId',
        'thread.number as editionNumber',
        'editionComment.block',
        'editionComment.body',
        'person.name as writtenByName',
        'editionComment.writtenAt',
      ])
      .where('editionComment.workspaceId', '=', this.workspaceId)
      .orderBy('editionComment.writtenAt')
      .execute();
  }

  async insertComment(comment: {
    readonly id: string;
    readonly editionId: string;
    readonly block: string;
    readonly body: string;
    readonly writtenBy: string;
    readonly writtenAt: Date;
  }): Promise<void> {
    await this.db
      .insertInto('editionComment')
      .values({ ...comment, workspaceId: this.workspaceId })
      .execute();
  }

  /** Who looked at an edition or took it out, newest first. */
  access(editionId: string): Promise<EditionAccessRow[]> {
    return this.db
      .selectFrom('editionAccess')
      .innerJoin('person', 'person.id', 'editionAccess.personId')
      .select(['person.name as personName', 'kind', 'format', 'at'])
      .where('workspaceId', '=', this.workspaceId)
      .where('editionId', '=', editionId)
      .orderBy('at', 'desc')
      .execute();
  }

  /** When a person last looked at an edition. */
  async lastViewed(editionId: string, personId: string): Promise<Date | undefined> {
    const found = await this.db
      .selectFrom('editionAccess')
      .select('at')
      .where('workspaceId', '=', this.workspaceId)
      .where('editionId', '=', editionId)
      .where('personId', '=', personId)
      .where('kind', '=', 'viewed')
      .orderBy('at', 'desc')
      .limit(1)
      .executeTakeFirst();
    return found?.at;
  }

  async insertAccess(access: {
    readonly id: string;
    readonly editionId: string;
    readonly personId: string;
    readonly kind: 'viewed' | 'exported';
    readonly format: string | null;
    readonly at: Date;
  }): Promise<void> {
    await this.db
      .insertInto('editionAccess')
      .values({ ...access, workspaceId: this.workspaceId })
      .execute();
  }
}
