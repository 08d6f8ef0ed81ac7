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
      heartbeat: { everySeconds: 0.1, silentSeconds: 5 },
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

  /** As a server leaves a job behind that dies while it works it. */
  async function leaveBehind(
    subject: string,
    retryCount: number,
    kind: 'bootstrap' | 'evidence' = 'bootstrap',
  ): Promise<void> {
    await repositories.inWorkspace(workspaceId, (tx) => queue.enqueue(tx, kind, subject));
    const { rows } = await pool.query<{ id: string }>(
      `update pgboss.job set state = 'active', started_on = now() - interval '1 minute',
        retry_count = $1
        where name = $3 and data ->> 'ticketId' =
          (select id::text from job_ticket where subject_id = $2) returning id`,
      [retryCount, subject, kind],
    );
    await pool.query(
      `update job_ticket set job_id = $1, heartbeat_at = now() - interval '6 seconds'
        where subject_id = $2`,
      [rows[0].id, subject],
    );
  }

  it('takes a job back whose server fell silent, and gives it up after the last try', async () => {
    const [worked, givenUp] = [randomUUID(), randomUUID()];
    await leaveBehind(worked, 0);
    await leaveBehind(givenUp, 4);
    const tried: string[] = [];
    const told = new Promise<string>((resolve) => {
      void queue.work(
        'bootstrap',
        ({ subjectId }) => {
          tried.push(subjectId);
          return Promise.resolve();
        },
        ({ subjectId }) => {
          resolve(subjectId);
          return Promise.resolve();
        },
      );
    });
    expect(await told).toBe(givenUp);
    for (let look = 0; look < 100 && tried.length === 0; look++)
      await new Promise((resolve) => setTimeout(resolve, 100));
    expect(tried).toEqual([worked]);
    let spoken: number | null = null;
    for (let look = 0; look < 50 && spoken !== 0; look++) {
      await new Promise((resolve) => setTimeout(resolve, 100));
      const found = await pool.query(
        `select from job_ticket where heartbeat_at is not null and kind = 'bootstrap'`,
      );
      spoken = found.rowCount;
    }
    expect(spoken).withContext('tickets that are spoken of').toBe(0);
  });

  it('leaves a job alone whose server says that it works it', async () => {
    const subject = randomUUID();
    await leaveBehind(subject, 0);
    const { rows } = await pool.query<{ id: string; job_id: string }>(
      'select id, job_id from job_ticket where subject_id = $1',
      [subject],
    );
    await repositories.jobTickets.beat(rows[0].id, rows[0].job_id);
    expect(await repositories.jobTickets.takeSilent(['bootstrap'], 5)).toEqual([]);
    await repositories.jobTickets.rest(rows[0].id);
  });

  describe('of a server that looks more often than it speaks', () => {
    /** What is done with each subject, and what when its last try failed. */
    const handlers = new Map<string, () => Promise<void>>();
    const givenUp = new Map<string, () => Promise<void>>();
    let quick: JobQueue;

    beforeAll(async () => {
      quick = new JobQueue({
        repositories,
        executeSql: (text, values) => pool.query(text, values),
        onError: (error) => errors.push(error),
        heartbeat: { everySeconds: 0.2, silentSeconds: 0.05 },
      });
      await quick.start();
    });

    afterAll(() => quick.stop());

    async function worked(): Promise<void> {
      await quick.work(
        'evidence',
        ({ subjectId }) => handlers.get(subjectId)?.() ?? Promise.resolve(),
        ({ subjectId }) => givenUp.get(subjectId)?.() ?? Promise.resolve(),
      );
    }

    it('takes back no job that it works itself', async () => {
      const subject = randomUUID();
      const before = errors.length;
      let tries = 0;
      const ended = new Promise<void>((resolve) => {
        handlers.set(subject, async () => {
          tries++;
          await new Promise((end) => setTimeout(end, 2500));
          resolve();
        });
      });
      await worked();
      await repositories.inWorkspace(workspaceId, (tx) => quick.enqueue(tx, 'evidence', subject));
      await ended;
      await new Promise((resolve) => setTimeout(resolve, 500));
      expect(tries).toBe(1);
      const { rows } = await pool.query<{ state: string }>(
        `select state from pgboss.job where data ->> 'ticketId' =
          (select id::text from job_ticket where subject_id = $1)`,
        [subject],
      );
      expect(rows).toEqual([{ state: 'completed' }]);
      expect(errors.slice(before).map(({ message }) => message)).toEqual([]);
    });

    it('takes the others back where one cannot be, and that one later', async () => {
      const [stubborn, other] = [randomUUID(), randomUUID()];
      await leaveBehind(stubborn, 4, 'evidence');
      await leaveBehind(other, 4, 'evidence');
      let asked = 0;
      const told = [stubborn, other].map(
        (subject) =>
          new Promise<string>((resolve) => {
            givenUp.set(subject, () => {
              if (subject === stubborn && asked++ === 0)
                return Promise.reject(new Error('the database is away'));
              resolve(subject);
              return Promise.resolve();
            });
          }),
      );
      await worked();
      expect(await Promise.all(told)).toEqual([stubborn, other]);
      expect(asked).toBe(2);
    });

    it('tries a job again whose server died before it could speak of it', async () => {
      const subject = randomUUID();
      await leaveBehind(subject, 0, 'evidence');
      await pool.query(
        'update job_ticket set job_id = null, heartbeat_at = null where subject_id = $1',
        [subject],
      );
      const tried = new Promise<void>((resolve) => {
        handlers.set(subject, () => {
          resolve();
          return Promise.resolve();
        });
      });
      await worked();
      await expectAsync(tried).toBeResolved();
    });
  });
});
