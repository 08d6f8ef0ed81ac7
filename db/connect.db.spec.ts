import pg from 'pg';
import { sql } from 'kysely';
import { createDatabase, createPool } from './connect';
import { isDatabaseUnavailable } from './errors';
import { eventually } from './testing/eventually';
import { Repositories } from './repositories/repositories';
import { createTestDatabase, type TestDatabase } from './testing/test-database';

describe('a connection pool', () => {
  let database: TestDatabase;
  let pool: pg.Pool;
  const lost: Error[] = [];
  const warnings: string[] = [];

  function openPool(limits: { statementTimeoutMs: number; connectionTimeoutMs: number }): pg.Pool {
    return createPool({
      ...limits,
      connectionString: database.appUrl,
      max: 1,
      applicationName: 'spec',
      onConnectionError: (error) => lost.push(error),
      onWarning: (message) => warnings.push(message),
    });
  }

  beforeEach(async () => {
    lost.length = 0;
    warnings.length = 0;
    database = await createTestDatabase();
    pool = openPool({ statementTimeoutMs: 60_000, connectionTimeoutMs: 60_000 });
  });

  afterEach(async () => {
    await pool.end();
    await database.drop();
  });

  async function terminateOthers(): Promise<void> {
    const admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    await admin.query(`select pg_terminate_backend(pid) from pg_stat_activity
      where datname = current_database() and application_name = 'spec'`);
    await admin.end();
  }

  it('outlives the end of a connection within an open transaction: the next query works', async () => {
    const db = createDatabase(pool);
    const broken = db.transaction().execute(async (trx) => {
      await sql`select 1`.execute(trx);
      await terminateOthers();
      await eventually('a lost connection', () => lost.length > 0);
      await sql`select 1`.execute(trx);
    });
    const error: unknown = await broken.catch((caught: unknown) => caught);
    expect(isDatabaseUnavailable(error)).withContext(String(error)).toBeTrue();
    expect(lost.length).toBeGreaterThan(0);
    expect((await sql<{ one: number }>`select 1 as one`.execute(db)).rows).toEqual([{ one: 1 }]);
  });

  it('cuts a statement that runs too long', async () => {
    const quick = openPool({ statementTimeoutMs: 400, connectionTimeoutMs: 60_000 });
    const slow = quick.query('select pg_sleep(600)');
    const error: unknown = await slow.catch((caught: unknown) => caught);
    expect((error as pg.DatabaseError).code).toBe('57014');
    await quick.end();
  });

  it('cuts a wait for a connection', async () => {
    const impatient = openPool({ statementTimeoutMs: 60_000, connectionTimeoutMs: 2000 });
    const taken = await impatient.connect();
    await expectAsync(impatient.query('select 1')).toBeRejectedWithError(/timeout exceeded/);
    taken.release();
    await impatient.end();
  });

  it('tells of a setting that was made outside a transaction and does nothing', async () => {
    await pool.query(`set local app.workspace = 'x'`);
    expect(warnings).toEqual(['SET LOCAL can only be used in transaction blocks']);
  });

  it('forgets the workspace of a transaction with its end', async () => {
    const repositories = new Repositories(createDatabase(pool));
    const id = '11111111-2222-4333-8444-555555555555';
    await repositories.inWorkspace(id, (tx) => tx.members.insertWorkspace('W'));
    const within = await repositories.inWorkspace(id, (tx) => tx.members.workspace());
    expect(within?.name).toBe('W');
    expect((await pool.query('select * from workspace')).rows).toEqual([]);
  });

  it('refuses a role that could step over row level security, or that owns tables', async () => {
    for (const [url, words] of [
      [database.adminUrl, /superuser/],
      [database.ownerUrl, /owns tables/],
    ] as const) {
      const other = new pg.Pool({ connectionString: url, max: 1 });
      await expectAsync(
        new Repositories(createDatabase(other)).assertUnprivilegedRole(),
      ).toBeRejectedWithError(words);
      await other.end();
    }
    await expectAsync(
      new Repositories(createDatabase(pool)).assertUnprivilegedRole(),
    ).toBeResolved();
  });
});
