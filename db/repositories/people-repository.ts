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
}

/** How tries are slowed down: free ones first, then a wait that doubles up to the longest. */
export interface ThrottleRule {
  readonly freeTries: number;
  readonly longestWaitSeconds: number;
  /** A count older than this starts anew. */
  readonly forgetAfterSeconds: number;
}

/** Tries that have not succeeded, by key (an account or an address), so that every server process counts the same. */
export class SignInThrottleRepository {
  constructor(private readonly db: Kysely<Database>) {}

  /**
   * Counts a try unless it comes too soon; one statement, so that tries at the same time cannot pass together.
   *
   * @returns 0 when it may be made, otherwise the seconds to wait.
   */
  async countTry(key: string, now: Date, rule: ThrottleRule): Promise<number> {
    const wait = sql`least(${rule.longestWaitSeconds}::float8,
      power(2, least(sign_in_throttle.failures - ${rule.freeTries}, 20)))`;
    const counted = await sql`
      insert into sign_in_throttle (key, failures, last_failure_at) values (${key}, 1, ${now})
      on conflict (key) do update set
        failures = case
          when sign_in_throttle.last_failure_at < ${now}::timestamptz - make_interval(secs => ${rule.forgetAfterSeconds})
          then 1 else sign_in_throttle.failures + 1 end,
        last_failure_at = ${now}
      where sign_in_throttle.failures < ${rule.freeTries}
        or sign_in_throttle.last_failure_at + make_interval(secs => ${wait}) <= ${now}::timestamptz
      returning 1`.execute(this.db);
    if (counted.rows.length > 0) return 0;
    const left = await sql<{ seconds: number }>`
      select extract(epoch from last_failure_at + make_interval(secs => ${wait}) - ${now}::timestamptz)::float8
        as seconds from sign_in_throttle where key = ${key}`.execute(this.db);
    return Math.max(1, Math.ceil(left.rows[0]?.seconds ?? 1));
  }

  /** Takes one try back: it succeeded. */
  async forgive(key: string): Promise<void> {
    await sql`update sign_in_throttle set failures = greatest(0, failures - 1) where key = ${key}`.execute(
      this.db,
    );
  }

  async clear(key: string): Promise<void> {
    await this.db.deleteFrom('signInThrottle').where('key', '=', key).execute();
  }

  /** Drops counts that nobody added to since; they would start anew anyhow. */
  async prune(before: Date): Promise<void> {
    await this.db.deleteFrom('signInThrottle').where('lastFailureAt', '<', before).execute();
  }
}
