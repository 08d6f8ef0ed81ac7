import { randomUUID } from 'node:crypto';
import type pg from 'pg';
import PgBoss from 'pg-boss';
import { createDatabase, createPool } from '../../db/connect';
import { Repositories } from '../../db/repositories/repositories';
import type { TestDatabase } from '../../db/testing/test-database';
import { createMigratedDatabase } from '../testing/test-server';
import { JobQueue } from './job-queue';

describe('the job queue', () => {
  let database: TestDatabase;
  let pool: pg.Pool;
  let queue: JobQueue;
  let repositories: Repositories;
  const workspaceId = randomUUID();
  const errors: Error[] = [];

  beforeAll(async () => {
    database = await createMigratedDatabase();
    pool = createPool({
      connectionString: database.appUrl,
      max: 4,
      applicationName: 'spec',
      statementTimeoutMs: 5000,
      onConnectionError: (error) => errors.push(error),
      onWarning: (message) => errors.push(new Error(message)),
    });
    repositories = new Repositories(createDatabase(pool));
    queue = new JobQueue({
      repositories,
      executeSql: (text, values) => pool.query(text, values),
      onError: (error) => errors.push(error),
    });
    await queue.start();
    await repositories.inWorkspace(workspaceId, (tx) => tx.members.insertWorkspace('W'));
  });

  afterAll(async () => {
    await queue.stop();
    await pool.end();
    await database.drop();
  });

  it('holds no job whose transaction was rolled back', async () => {
    const subject = randomUUID();
    await expectAsync(
      repositories.inWorkspace(workspaceId, async (tx) => {
        await queue.enqueue(tx, 'open-billing-account', subject);
        throw new Error('rolled back');
      }),
    ).toBeRejectedWithError('rolled back');
    const jobs = await pool.query('select from pgboss.job where name = $1', [
      'open-billing-account',
    ]);
    expect(jobs.rowCount).toBe(0);
  });

  it('is kept in order under the application role: what ended is archived, what is old is dropped', async () => {
    const boss = new PgBoss({
      db: { executeSql: (text: string, values: unknown[]) => pool.query(text, values) },
      migrate: false,
      supervise: false,
      schedule: false,
    });
    await boss.start();
    await expectAsync(boss.maintain()).toBeResolved();
    await boss.stop({ graceful: false });
  });

  it('tries a failing job again, says each failure, and gives up after the last try', async () => {
    const subject = randomUUID();
    let tries = 0;
    const givenUp = new Promise<string>((resolve) => {
      void queue.work(
        'fit',
        () => {
          tries++;
          return Promise.reject(new Error('no luck'));
        },
        (ticket) => {
          resolve(ticket.subjectId);
          return Promise.resolve();
        },
      );
    });
    await repositories.inWorkspace(workspaceId, (tx) => queue.enqueue(tx, 'fit', subject));
    const hurry = setInterval(() => {
      void pool.query(`update pgboss.job set start_after = now() where state = 'retry'`);
    }, 100);
    expect(await givenUp).toBe(subject);
    clearInterval(hurry);
    expect(tries).toBe(5);
    const said = errors.filter((error) => error.message === 'a job of queue fit failed');
    expect(said.length).toBe(5);
    expect((said[0].cause as Error).message).toBe('no luck');
  });
});
