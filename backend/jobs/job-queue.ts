import { randomUUID } from 'node:crypto';
import PgBoss from 'pg-boss';
import type { JobTicketRow, SilentTicketRow } from '../../db/repositories/jobs-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { queueSchema, type QueueName } from './install-queue';

export interface JobQueueOptions {
  readonly repositories: Repositories;
  /** Runs the queue package's own SQL, outside any transaction of ours. */
  readonly executeSql: (text: string, values: unknown[]) => Promise<{ rows: unknown[] }>;
  readonly onError: (error: Error) => void;
  /** How often a worker looks for work that another process queued. */
  readonly pollSeconds?: number;
  /** How often a server says that it still works a job, and how long until a silent one counts as dead. */
  readonly heartbeat?: { readonly everySeconds: number; readonly silentSeconds: number };
}

/** The same job for the same subject is queued once in this time, however often it is asked for. */
const onceInSeconds = 30;
const stopWaitMs = 3000;
/** Longest that a job may take; death is noticed much sooner, by its silence. */
const longestSeconds = 1800;
const usualHeartbeat = { everySeconds: 5, silentSeconds: 20 };

type TicketHandler = (ticket: JobTicketRow) => Promise<void>;

/** Jobs in PostgreSQL: what is queued survives a crash, and any server process may work it. */
export class JobQueue {
  readonly #boss: PgBoss;
  readonly #workers: { readonly kind: QueueName; readonly id: string }[] = [];
  /** Statements of the queue package and handlers of ours that have not ended. */
  #busy = 0;
  /** The queues that are worked here, and what to do when the last try of a job ended without a word. */
  readonly #giveUp = new Map<string, TicketHandler | undefined>();
  /** What is worked here, by ticket, with the promise of its end, which never rejects. */
  readonly #worked = new Map<string, { readonly jobId: string; readonly ended: Promise<void> }>();
  #rounds: NodeJS.Timeout | undefined;

  constructor(private readonly options: JobQueueOptions) {
    this.#boss = new PgBoss({
      db: { executeSql: (text, values) => this.#whileBusy(options.executeSql(text, values)) },
      schema: queueSchema,
      migrate: false,
      schedule: false,
    });
    this.#boss.on('error', options.onError);
  }

  async start(): Promise<void> {
    await this.#boss.start();
    const { everySeconds } = this.#heartbeat;
    this.#rounds = setInterval(() => void this.#takeBackSilent(), everySeconds * 1000);
  }

  get #heartbeat(): NonNullable<JobQueueOptions['heartbeat']> {
    return this.options.heartbeat ?? usualHeartbeat;
  }

  /**
   * Stops taking jobs, waits a while for those under way, then has the caller end them: a job that is cut off is tried
   * again, here or on another server.
   */
  async stop(endJobs: () => Promise<void> = () => Promise.resolve()): Promise<void> {
    clearInterval(this.#rounds);
    await this.#boss.stop({ graceful: true, wait: true, timeout: stopWaitMs, close: false });
    await this.#quiet(stopWaitMs);
    await endJobs();
    await this.#quiet(stopWaitMs);
  }

  /** A job fetched in the moment of stopping still runs: the package does not wait for it. */
  async #quiet(timeoutMs: number): Promise<void> {
    const until = Date.now() + timeoutMs;
    for (let quietLooks = 0; quietLooks < 3 && Date.now() < until;) {
      await new Promise((resolve) => setTimeout(resolve, 20));
      quietLooks = this.#busy === 0 ? quietLooks + 1 : 0;
    }
  }

  async #whileBusy<T>(work: Promise<T>): Promise<T> {
    this.#busy++;
    try {
      return await work;
    } finally {
      this.#busy--;
    }
  }

  /** Queues a job within the caller's transaction: with it committed the job exists, without it there is none. */
  async enqueue(tx: WorkspaceRepositories, kind: QueueName, subjectId: string): Promise<void> {
    const id = randomUUID();
    await tx.jobTickets.insert({ id, workspaceId: tx.workspaceId, kind, subjectId });
    const queued = await this.#boss.send(
      kind,
      { ticketId: id },
      {
        db: tx,
        retryLimit: 4,
        retryDelay: 1,
        retryBackoff: true,
        expireInSeconds: longestSeconds,
        singletonKey: subjectId,
        singletonSeconds: onceInSeconds,
      },
    );
    if (queued === null) await tx.jobTickets.remove(id);
  }

  /** Wakes this process's worker at once instead of at its next look. */
  wake(kind: QueueName): void {
    for (const worker of this.#workers)
      if (worker.kind === kind) this.#boss.notifyWorker(worker.id);
  }

  /**
   * Works a queue. The workspace comes from the ticket's row, never from the queued payload.
   *
   * @param handler  is told the ticket; a rejection queues the job again, up to its limit.
   * @param giveUp  is told the ticket when the last try failed, so that nobody waits for ever.
   */
  async work(kind: QueueName, handler: TicketHandler, giveUp?: TicketHandler): Promise<void> {
    this.#giveUp.set(kind, giveUp);
    const worker = await this.#boss.work<{ ticketId: unknown }>(
      kind,
      {
        pollingIntervalSeconds: this.options.pollSeconds ?? 0.5,
        batchSize: 1,
        includeMetadata: true,
      },
      async (jobs) => {
        for (const job of jobs) {
          const isLast = job.retryCount >= job.retryLimit;
          await this.#whileBusy(
            this.#try(kind, job, { handler, giveUp: isLast ? giveUp : undefined }),
          );
        }
      },
    );
    this.#workers.push({ kind, id: worker });
  }

  async #try(
    kind: QueueName,
    job: { readonly id: string; readonly data: { ticketId: unknown } | null },
    { handler, giveUp }: { readonly handler: TicketHandler; readonly giveUp?: TicketHandler },
  ): Promise<void> {
    let ticket: JobTicketRow | undefined;
    try {
      ticket = await this.#ticket(kind, job.data);
      await this.#alone(ticket.id, job.id, this.#whileBeating.bind(this, ticket, job.id, handler));
    } catch (error) {
      this.options.onError(new Error(`a job of queue ${kind} failed`, { cause: error }));
      if (ticket !== undefined) await giveUp?.(ticket);
      throw error;
    }
  }

  /** Works a ticket once at a time here: where another server took it back too early, the next try waits. */
  async #alone(ticketId: string, jobId: string, work: () => Promise<void>): Promise<void> {
    for (let other; (other = this.#worked.get(ticketId)) !== undefined;) await other.ended;
    const working = work();
    const ended = working.catch(() => undefined);
    this.#worked.set(ticketId, { jobId, ended });
    try {
      await working;
    } finally {
      this.#worked.delete(ticketId);
    }
  }

  /** Works a job and says all the while that this server lives. */
  async #whileBeating(ticket: JobTicketRow, jobId: string, handler: TicketHandler): Promise<void> {
    const { jobTickets } = this.options.repositories;
    await jobTickets.beat(ticket.id, jobId);
    const beats = setInterval(() => {
      jobTickets.beat(ticket.id, jobId).catch((error: unknown) => {
        this.options.onError(new Error('a job’s heartbeat was not written', { cause: error }));
      });
    }, this.#heartbeat.everySeconds * 1000);
    try {
      await handler(ticket);
    } finally {
      clearInterval(beats);
      await jobTickets.rest(ticket.id);
    }
  }

  /**
   * Jobs of servers that died are tried again at once; after the last try whoever waits is told. What is worked here is
   * not among them, even where this server could not say so for a while.
   */
  async #takeBackSilent(): Promise<void> {
    const { jobTickets } = this.options.repositories;
    const kinds = [...this.#giveUp.keys()];
    const { silentSeconds } = this.#heartbeat;
    try {
      const own = [...this.#worked];
      await Promise.all(own.map(([ticketId, { jobId }]) => jobTickets.beat(ticketId, jobId)));
      await jobTickets.beatForUnspoken(queueSchema, kinds, silentSeconds);
      const except = [...this.#worked.keys()];
      for (const ticket of await jobTickets.takeSilent(kinds, silentSeconds, except))
        await this.#takeBack(ticket);
    } catch (error) {
      this.options.onError(new Error('silent jobs could not be taken back', { cause: error }));
    }
  }

  /** A ticket that cannot be taken back now falls silent again, and is taken back later. */
  async #takeBack(ticket: SilentTicketRow): Promise<void> {
    const { kind, jobId } = ticket;
    // Taken up here since the silent ones were listed.
    if (this.#worked.has(ticket.id)) return;
    try {
      if ((await this.#boss.getJobById(kind, jobId))?.state === 'active') {
        this.options.onError(new Error(`a job of queue ${kind} fell silent and is taken back`));
        await this.#boss.fail(kind, jobId, { message: 'the server that worked it fell silent' });
      }
      if ((await this.#boss.getJobById(kind, jobId))?.state === 'failed') {
        await this.#worked.get(ticket.id)?.ended;
        await this.#giveUp.get(kind)?.(ticket);
      }
      await this.options.repositories.jobTickets.rest(ticket.id);
    } catch (error) {
      this.options.onError(
        new Error(`a silent job of queue ${kind} could not be taken back`, { cause: error }),
      );
    }
  }

  async #ticket(kind: QueueName, payload: { ticketId: unknown } | null): Promise<JobTicketRow> {
    const ticketId = payload?.ticketId;
    const ticket =
      typeof ticketId === 'string'
        ? await this.options.repositories.jobTickets.find(ticketId)
        : undefined;
    if (ticket?.kind !== kind) throw new Error(`a job of queue ${kind} names no ticket of it`);
    return ticket;
  }
}
