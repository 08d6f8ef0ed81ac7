import { type Kysely, sql } from 'kysely';
import { withNamedErrors } from '../errors';
import type { Database } from '../schema/database';

export interface PersonRow {
  readonly id: string;
  readonly email: string;
  readonly name: string;
  readonly passwordHash: string;
  readonly preferences: object;
}

/** People, over all workspaces: a person signs in before any workspace is known. */
export class PeopleRepository {
  constructor(private readonly db: Kysely<Database>) {}

  findByEmail(email: string): Promise<PersonRow | undefined> {
    return this.db
      .selectFrom('person')
      .select(['id', 'email', 'name', 'passwordHash', 'preferences'])
      .where('email', '=', email)
      .executeTakeFirst();
  }

  find(id: string): Promise<PersonRow | undefined> {
    return this.db
      .selectFrom('person')
      .select(['id', 'email', 'name', 'passwordHash', 'preferences'])
      .where('id', '=', id)
      .executeTakeFirst();
  }

  /** @throws {UniqueViolation} when the address has an account. */
  async insert(person: PersonRow): Promise<void> {
    await withNamedErrors(() =>
      this.db
        .insertInto('person')
        .values({ ...person, preferences: JSON.stringify(person.preferences) })
        .execute(),
    );
  }

  async changePreferences(id: string, preferences: object): Promise<void> {
    await this.db
      .updateTable('person')
      .set({ preferences: JSON.stringify(preferences) })
      .where('id', '=', id)
      .execute();
  }

  async changePasswordHash(id: string, passwordHash: string): Promise<void> {
    await this.db.updateTable('person').set({ passwordHash }).where('id', '=', id).execute();
  }
}

/** Failed sign-ins by key (an account or an address), so that every server process counts the same. */
export class SignInThrottleRepository {
  constructor(private readonly db: Kysely<Database>) {}

  async failures(key: string): Promise<{ failures: number; lastFailureAt: Date } | undefined> {
    return this.db
      .selectFrom('signInThrottle')
      .select(['failures', 'lastFailureAt'])
      .where('key', '=', key)
      .executeTakeFirst();
  }

  /** Counts a failure; a count older than `forgetAfterMs` starts anew. */
  async addFailure(key: string, now: Date, forgetAfterMs: number): Promise<void> {
    const forgetBefore = new Date(now.getTime() - forgetAfterMs);
    await this.db
      .insertInto('signInThrottle')
      .values({ key, failures: 1, lastFailureAt: now })
      .onConflict((conflict) =>
        conflict.column('key').doUpdateSet({
          failures: sql<number>`case when sign_in_throttle.last_failure_at < ${forgetBefore}
            then 1 else sign_in_throttle.failures + 1 end`,
          lastFailureAt: now,
        }),
      )
      .execute();
  }

  async clear(key: string): Promise<void> {
    await this.db.deleteFrom('signInThrottle').where('key', '=', key).execute();
  }
}
