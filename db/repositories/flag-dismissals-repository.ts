import type { Kysely } from 'kysely';
import { withNamedErrors } from '../errors';
import type { Database } from '../schema/database';

export interface FlagDismissalRow {
  readonly id: string;
  readonly company: string;
  readonly year: number;
  /** Header of the column; null where the whole row is meant. */
  readonly columnName: string | null;
  readonly code: string;
  /** The cell's value when it was looked at. */
  readonly value: number | null;
  readonly reason: string;
  readonly createdAt: Date;
  readonly createdByName: string;
}

/** Flags that somebody looked at and found to be right as they are. */
export class FlagDismissalsRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  /** @throws {UniqueViolation} when the same flag of the cell, with the same value, is dismissed already. */
  async insert(
    dismissal: Omit<FlagDismissalRow, 'createdAt' | 'createdByName'> & {
      readonly panelId: string;
      readonly createdBy: string;
    },
  ): Promise<void> {
    await withNamedErrors(() =>
      this.db
        .insertInto('flagDismissal')
        .values({ ...dismissal, workspaceId: this.workspaceId })
        .execute(),
    );
  }

  /** Of a panel, the newest first. */
  ofPanel(panelId: string): Promise<FlagDismissalRow[]> {
    return this.#ofPanel(panelId)
      .orderBy('flagDismissal.createdAt', 'desc')
      .orderBy('flagDismissal.id')
      .execute();
  }

  find(panelId: string, id: string): Promise<FlagDismissalRow | undefined> {
    return this.#ofPanel(panelId).where('flagDismissal.id', '=', id).executeTakeFirst();
  }

  /** @returns false when the panel has no such dismissal. */
  async remove(panelId: string, id: string): Promise<boolean> {
    const result = await this.db
      .deleteFrom('flagDismissal')
      .where('workspaceId', '=', this.workspaceId)
      .where('panelId', '=', panelId)
      .where('id', '=', id)
      .executeTakeFirst();
    return result.numDeletedRows > 0n;
  }

  #ofPanel(panelId: string) {
    return this.db
      .selectFrom('flagDismissal')
      .innerJoin('person', 'person.id', 'flagDismissal.createdBy')
      .select([
        'flagDismissal.id',
        'flagDismissal.company',
        'flagDismissal.year',
        'flagDismissal.columnName',
        'flagDismissal.code',
        'flagDismissal.value',
        'flagDismissal.reason',
        'flagDismissal.createdAt',
        'person.name as createdByName',
      ])
      .where('flagDismissal.workspaceId', '=', this.workspaceId)
      .where('flagDismissal.panelId', '=', panelId);
  }
}
