import type { Kysely } from 'kysely';
import { withNamedErrors } from '../errors';
import type { Database } from '../schema/database';

export type EditionState = 'waiting' | 'signed' | 'returned' | 'superseded';

export interface EditionRow {
  readonly id: string;
  readonly number: number;
  readonly fitId: string;
  readonly sha256: string;
  readonly confidentiality: 'confidential' | 'inside-information';
  readonly state: EditionState;
  readonly publishedBy: string;
  readonly publishedByName: string;
  readonly publishedAt: Date;
  readonly decidedByName: string | null;
  readonly decidedAt: Date | null;
  readonly decisionComment: string | null;
  readonly supersededByNumber: number | null;
}

export interface Decision {
  readonly state: 'signed' | 'returned';
  readonly by: string;
  readonly at: Date;
  readonly comment: string;
}

export class EditionsRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  async nextNumber(): Promise<number> {
    const found = await this.db
      .selectFrom('edition')
      .select((eb) => eb.fn.max('number').as('last'))
      .where('workspaceId', '=', this.workspaceId)
      .executeTakeFirst();
    return (found?.last ?? 0) + 1;
  }

  async insert(edition: {
    readonly id: string;
    readonly number: number;
    readonly fitId: string;
    readonly content: string;
    readonly sha256: string;
    readonly confidentiality: 'confidential' | 'inside-information';
    readonly publishedBy: string;
    readonly publishedAt: Date;
    /** The returned edition that it answers. */
    readonly answers: string | null;
  }): Promise<void> {
    await this.db
      .insertInto('edition')
      .values({ ...edition, state: 'waiting', workspaceId: this.workspaceId })
      .execute();
  }

  find(id: string): Promise<EditionRow | undefined> {
    return this.editions().where('edition.id', '=', id).executeTakeFirst();
  }

  /** The frozen content, exactly the text that was hashed. */
  async content(id: string): Promise<string | undefined> {
    const found = await this.db
      .selectFrom('edition')
      .select('content')
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .executeTakeFirst();
    return found?.content;
  }

  list(states: readonly EditionState[]): Promise<EditionRow[]> {
    return this.editions()
      .where('edition.state', 'in', [...states])
      .orderBy('edition.number', 'desc')
      .execute();
  }

  /** Every edition that was ever signed with its content, oldest first. */
  async signedContents(): Promise<(EditionRow & { readonly content: string })[]> {
    return this.editions()
      .select('edition.content')
      .where('edition.state', 'in', ['signed', 'superseded'])
      .orderBy('edition.number')
      .execute();
  }

  findSigned(): Promise<EditionRow | undefined> {
    return this.editions().where('edition.state', '=', 'signed').executeTakeFirst();
  }

  async countWaiting(): Promise<number> {
    const found = await this.db
      .selectFrom('edition')
      .select((eb) => eb.fn.countAll<number>().as('waiting'))
      .where('workspaceId', '=', this.workspaceId)
      .where('state', '=', 'waiting')
      .executeTakeFirstOrThrow();
    return found.waiting;
  }

  /**
   * Decides a waiting edition; false when it no longer waits.
   * @throws {CheckViolation} `edition_four_eyes` when the publisher would sign.
   */
  async decide(id: string, decision: Decision): Promise<boolean> {
    const result = await withNamedErrors(() =>
      this.db
        .updateTable('edition')
        .set({
          state: decision.state,
          decidedBy: decision.by,
          decidedAt: decision.at,
          decisionComment: decision.comment,
        })
        .where('workspaceId', '=', this.workspaceId)
        .where('id', '=', id)
        .where('state', '=', 'waiting')
        .executeTakeFirst(),
    );
    return result.numUpdatedRows > 0n;
  }

  /** Marks the signed edition as superseded by a newer one. */
  async supersede(signedId: string, byId: string): Promise<void> {
    await withNamedErrors(() =>
      this.db
        .updateTable('edition')
        .set({ state: 'superseded', supersededBy: byId })
        .where('workspaceId', '=', this.workspaceId)
        .where('id', '=', signedId)
        .execute(),
    );
  }

  private editions() {
    return this.db
      .selectFrom('edition')
      .innerJoin('person as publisher', 'publisher.id', 'edition.publishedBy')
      .leftJoin('person as decider', 'decider.id', 'edition.decidedBy')
      .leftJoin('edition as successor', (join) =>
        join
          .onRef('successor.workspaceId', '=', 'edition.workspaceId')
          .onRef('successor.id', '=', 'edition.supersededBy'),
      )
      .select([
        'edition.id',
        'edition.number',
        'edition.fitId',
        'edition.sha256',
        'edition.confidentiality',
        'edition.state',
        'edition.publishedBy',
        'publisher.name as publishedByName',
        'edition.publishedAt',
        'decider.name as decidedByName',
        'edition.decidedAt',
        'edition.decisionComment',
        'successor.number as supersededByNumber',
      ])
      .where('edition.workspaceId', '=', this.workspaceId);
  }
}
