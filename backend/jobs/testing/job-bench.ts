import { randomUUID } from 'node:crypto';
import type pg from 'pg';
import { createDatabase, createPool } from '../../../db/connect';
import { Repositories } from '../../../db/repositories/repositories';
import type { TestDatabase } from '../../../db/testing/test-database';
import { createMigratedDatabase } from '../../testing/test-server';
import type { QueueName } from '../install-queue';
import { JobQueue } from '../job-queue';

/** Silent is what was silent for half a day: a slow machine makes nothing so, only a spec that moves the database's times. */
export const benchHeartbeat = { everySeconds: 0.1, silentSeconds: 12 * 3600 };

/** A queue on a database of its own, and what a spec does to its jobs behind its back. */
export class JobBench {
  /** What the queue and its connections reported. */
  readonly errors: Error[] = [];
  readonly workspaceId = randomUUID();
  readonly queue: JobQueue;
  readonly repositories: Repositories;

  private constructor(
    readonly database: TestDatabase,
    readonly pool: pg.Pool,
  ) {
    this.repositories = new Repositories(createDatabase(pool));
    this.queue = new JobQueue({
      repositories: this.repositories,
      executeSql: (text, values) => pool.query(text, values),
      onError: (error) => this.errors.push(error),
      heartbeat: benchHeartbeat,
    });
  }

  static async open(): Promise<JobBench> {
    const database = await createMigratedDatabase();
    const report = (error: Error): void => {
      bench.errors.push(error);
    };
    const pool = createPool({
      connectionString: database.appUrl,
      max: 4,
      applicationName: 'spec',
      statementTimeoutMs: 60_000,
      connectionTimeoutMs: 60_000,
      onConnectionError: report,
      onWarning: (message) => {
        report(new Error(message));
      },
    });
    const bench = new JobBench(database, pool);
    await bench.queue.start();
    await bench.repositories.inWorkspace(bench.workspaceId, (tx) =>
      tx.members.insertWorkspace('W'),
    );
    return bench;
  }

  async close(): Promise<void> {
    await this.queue.stop();
    await this.pool.end();
    await this.database.drop();
  }

  async enqueue(kind: QueueName, subject: string): Promise<void> {
    await this.repositories.inWorkspace(this.workspaceId, (tx) =>
      this.queue.enqueue(tx, kind, subject),
    );
  }

  /** As a server leaves jobs behind that dies while it works them, a day ago. */
  async leaveBehind(
    kind: QueueName,
    subjects: readonly string[],
    { retryCount = 4, isSpokenOf = true } = {},
  ): Promise<void> {
    await this.repositories.inWorkspace(this.workspaceId, async (tx) => {
      for (const subject of subjects) await this.queue.enqueue(tx, kind, subject);
      await tx.executeSql(
        `update pgboss.job set state = 'active', started_on = now() - interval '1 day',
          retry_count = $1 where name = $2 and singleton_key = any($3)`,
        [retryCount, kind, subjects],
      );
      if (isSpokenOf)
        await tx.executeSql(
          `update job_ticket set heartbeat_at = now() - interval '1 day', job_id =
            (select job.id from pgboss.job where job.data ->> 'ticketId' = job_ticket.id::text)
            where subject_id = any($1)`,
          [subjects],
        );
    });
  }

  /** Where a ticket is spoken of, a day passes since. */
  async letADayPass(subject: string): Promise<boolean> {
    const passed = await this.pool.query(
      `update job_ticket set heartbeat_at = now() - interval '1 day'
        where subject_id = $1 and heartbeat_at is not null`,
      [subject],
    );
    return passed.rowCount === 1;
  }
}
