import { randomUUID } from 'node:crypto';
import PgBoss from 'pg-boss';
import { eventually } from '../../db/testing/eventually';
import { benchHeartbeat, JobBench } from './testing/job-bench';

describe('the job queue', () => {
  let bench: JobBench;

  beforeAll(async () => {
    bench = await JobBench.open();
  });

  afterAll(() => bench.close());

  it('holds no job whose transaction was rolled back', async () => {
    const subject = randomUUID();
    await expectAsync(
      bench.repositories.inWorkspace(bench.workspaceId, async (tx) => {
        await bench.queue.enqueue(tx, 'open-billing-account', subject);
        throw new Error('rolled back');
      }),
    ).toBeRejectedWithError('rolled back');
    const jobs = await bench.pool.query('select from pgboss.job where singleton_key = $1', [
      subject,
    ]);
    expect(jobs.rowCount).toBe(0);
  });

  it('is kept in order under the application role: what ended is archived, what is old is dropped', async () => {
    const boss = new PgBoss({
      db: { executeSql: (text: string, values: unknown[]) => bench.pool.query(text, values) },
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
      void bench.queue.work(
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
    await bench.enqueue('fit', subject);
    const hurry = setInterval(() => {
      void bench.pool.query(`update pgboss.job set start_after = now() where state = 'retry'`);
    }, 100);
    expect(await givenUp).toBe(subject);
    clearInterval(hurry);
    expect(tries).toBe(5);
    const said = bench.errors.filter((error) => error.message === 'a job of queue fit failed');
    expect(said.length).toBe(5);
    expect((said[0].cause as Error).message).toBe('no luck');
  });

  it('takes a job back whose server fell silent, and gives it up after the last try', async () => {
    const [worked, givenUp] = [randomUUID(), randomUUID()];
    await bench.leaveBehind('bootstrap', [worked], { retryCount: 0 });
    await bench.leaveBehind('bootstrap', [givenUp]);
    const tried: string[] = [];
    const told = new Promise<string>((resolve) => {
      void bench.queue.work(
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
    await eventually('a second try', () => tried.length > 0);
    expect(tried).toEqual([worked]);
    const isAtRest = await eventually('tickets at rest', async () => {
      const spokenOf = await bench.pool.query(
        `select from job_ticket where heartbeat_at is not null and kind = 'bootstrap'`,
      );
      return spokenOf.rowCount === 0;
    });
    expect(isAtRest).toBeTrue();
  });

  it('leaves a job alone whose server says that it works it', async () => {
    const subject = randomUUID();
    const unworked = 'open-billing-account';
    await bench.leaveBehind(unworked, [subject]);
    const { rows } = await bench.pool.query<{ id: string; job_id: string }>(
      'select id, job_id from job_ticket where subject_id = $1',
      [subject],
    );
    const { jobTickets } = bench.repositories;
    await jobTickets.beat(rows[0].id, rows[0].job_id);
    expect(await jobTickets.takeSilent([unworked], benchHeartbeat.silentSeconds)).toEqual([]);
    expect(await bench.letADayPass(subject)).toBeTrue();
    const taken = await jobTickets.takeSilent([unworked], benchHeartbeat.silentSeconds);
    expect(taken.map(({ subjectId }) => subjectId)).toEqual([subject]);
  });
});
