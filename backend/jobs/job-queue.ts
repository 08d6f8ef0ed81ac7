import { randomUUID } from 'node:crypto';
import PgBoss from 'pg-boss';
import type { JobTicketRow } from '../../db/repositories/jobs-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { queueSchema, type QueueName } from './install-queue';

export interface JobQueueOptions {
  readonly repositories: Repositories;
  /** Runs the queue package's own SQL, outside any transaction of ours. */
  readonly executeSql: (text: string, values: unknown[]) => Promise<{ rows: unknown[] }>;
  readonly onError: (error: Error) => void;
  /** How often a worker looks for work that another process queued. */
  readonly pollSeconds?: number;
}

/** The same job for the same subject is queued once in this time, however often it is asked for. */
const onceInSeconds = 30;
const stopWaitMs = 3000;

/** Jobs in PostgreSQL: what is queued survives a crash, and any server process may work it. */
export class JobQueue {
  readonly #boss: PgBoss;
  readonly #workers: { readonly kind: QueueName; readonly id: string }[] = [];
  /** Statements of the queue package and handlers of ours that have not ended. */
  #busy = 0;

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
  }

  /**
   * Stops taking jobs, waits a while for those under way, then has the caller end them: a job that is cut off is tried
   * again, here or on another server.
   */
  async stop(endJobs: () => Promise<void> = () => Promise.resolve()): Promise<void> {
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
        expireInSeconds: 300,
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
  async work(
    kind: QueueName,
    handler: (ticket: JobTicketRow) => Promise<void>,
    giveUp?: (ticket: JobTicketRow) => Promise<void>,
  ): Promise<void> {
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
          await this.#whileBusy(this.#try(kind, job.data, handler, isLast ? giveUp : undefined));
        }
      },
    );
    this.#workers.push({ kind, id: worker });
  }

  async #try(
    kind: QueueName,
    payload: { ticketId: unknown } | null,
    handler: (ticket: JobTicketRow) => Promise<void>,
    giveUp: ((ticket: JobTicketRow) => Promise<void>) | undefined,
  ): Promise<void> {
    let ticket: JobTicketRow | undefined;
    try {
      ticket = await this.#ticket(kind, payload);
      await handler(ticket);
    } catch (error) {
      this.options.onError(new Error(`a job of queue ${kind} failed`, { cause: error }));
      if (ticket !== undefined) await giveUp?.(ticket);
      throw error;
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
