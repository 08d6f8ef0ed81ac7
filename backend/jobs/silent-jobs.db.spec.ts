import { randomUUID } from 'node:crypto';
import pg from 'pg';
import { eventually } from '../../db/testing/eventually';
import { JobBench } from './testing/job-bench';

describe('a job that fell silent', () => {
  let bench: JobBench;

  /** What is done with each subject, and what when its last try failed. */
  const handlers = new Map<string, () => Promise<void>>();
  const givenUp = new Map<string, () => Promise<void>>();

  beforeAll(async () => {
    bench = await JobBench.open();
    await bench.queue.work(
      'evidence',
      ({ subjectId }) => handlers.get(subjectId)?.() ?? Promise.resolve(),
      ({ subjectId }) => givenUp.get(subjectId)?.() ?? Promise.resolve(),
    );
  });

  beforeEach(() => {
    bench.errors.length = 0;
  });

  afterAll(() => bench.close());

  const takenBack = (): number =>
    bench.errors.filter(({ message }) => message.endsWith('fell silent and is taken back')).length;

  async function jobOf(subject: string) {
    const { rows } = await bench.pool.query<{ state: string; retry_count: number }>(
      'select state, retry_count from pgboss.job where singleton_key = $1',
      [subject],
    );
    return rows[0];
  }

  /** A job that has begun and ends when it is let. */
  function heldJob(subject: string) {
    let tries = 0;
    let end: () => void = () => undefined;
    const ended = new Promise<void>((resolve) => (end = resolve));
    const begun = new Promise<void>((resolve) => {
      handlers.set(subject, () => {
        tries++;
        resolve();
        return ended;
      });
    });
    return { begun, end, tries: () => tries };
  }

  async function expectDoneAtOnce(subject: string, held: ReturnType<typeof heldJob>) {
    expect(await jobOf(subject)).toEqual(jasmine.objectContaining({ state: 'active' }));
    held.end();
    await eventually('a completed job', async () => (await jobOf(subject)).state === 'completed');
    expect(held.tries()).toBe(1);
  }

  /** Leaves a job behind after its last try, and waits until it is given up: one look at the silent ones. */
  async function untilNextLook(): Promise<void> {
    const witness = randomUUID();
    const told = new Promise<void>((resolve) => {
      givenUp.set(witness, () => {
        resolve();
        return Promise.resolve();
      });
    });
    await bench.leaveBehind('evidence', [witness]);
    await told;
  }

  it('is left alone by the server that works it, however long nobody heard of it', async () => {
    const subject = randomUUID();
    const admin = new pg.Client({ connectionString: bench.database.adminUrl });
    await admin.connect();
    try {
      await admin.query(`
        create function unheard() returns trigger language plpgsql as $$ begin
          new.heartbeat_at := now() - interval '1 day'; return new; end $$;
        create trigger unheard before update on job_ticket for each row
          when (new.subject_id = '${subject}' and new.heartbeat_at is not null)
          execute function unheard()`);
      const held = heldJob(subject);
      await bench.enqueue('evidence', subject);
      await held.begun;
      await untilNextLook();
      await untilNextLook();
      expect(takenBack()).withContext('the two left behind').toBe(2);
      await expectDoneAtOnce(subject, held);
    } finally {
      await admin.query('drop function unheard cascade');
      await admin.end();
    }
  });

  it('is left alone by a server that took it up since it looked', async () => {
    const pair = [randomUUID(), randomUUID()];
    const held = new Map(pair.map((subject) => [subject, heldJob(subject)]));
    let goOn: () => void = () => undefined;
    const blocked = new Promise<void>((resolve) => (goOn = resolve));
    const first = new Promise<string>((resolve) => {
      for (const subject of pair)
        givenUp.set(subject, () => {
          resolve(subject);
          return blocked;
        });
    });
    await bench.leaveBehind('evidence', pair);
    const other = pair[1 - pair.indexOf(await first)];
    // As when another server took it back meanwhile.
    await bench.pool.query(
      `update pgboss.job set state = 'retry', retry_count = 1, start_after = now()
        where singleton_key = $1`,
      [other],
    );
    const otherJob = held.get(other) ?? heldJob(other);
    await otherJob.begun;
    goOn();
    await untilNextLook();
    expect(takenBack()).withContext('the first of the pair, and the one left behind').toBe(2);
    await expectDoneAtOnce(other, otherJob);
  });

  it('keeps no other from being taken back where it cannot be, and is taken back later', async () => {
    const [stubborn, other] = [randomUUID(), randomUUID()];
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
    await bench.leaveBehind('evidence', [stubborn, other]);
    expect(await told[1]).toBe(other);
    await eventually('a report', () =>
      bench.errors.some(({ message }) => message.endsWith('could not be taken back')),
    );
    expect(await bench.letADayPass(stubborn)).toBeTrue();
    expect(await told[0]).toBe(stubborn);
    expect(asked).toBe(2);
  });

  it('is tried again where its server died before it could speak of it', async () => {
    const subject = randomUUID();
    const tried = new Promise<void>((resolve) => {
      handlers.set(subject, () => {
        resolve();
        return Promise.resolve();
      });
    });
    await bench.leaveBehind('evidence', [subject], { retryCount: 0, isSpokenOf: false });
    await eventually('a first word of it', () => bench.letADayPass(subject));
    await expectAsync(tried).toBeResolved();
  });
});
