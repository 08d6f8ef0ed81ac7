import type { Repositories } from '../../db/repositories/repositories';
import type { MailQueue } from './outbox';

const everyMs = 60_000;
const mailsPerRound = 200;
/** A mail that was queued again and still waits is queued once more after this time. */
const againSeconds = 300;

/** Queues mail again whose job was lost or gave up: at start, and once a minute. */
export class MailRound {
  #timer: NodeJS.Timeout | undefined;
  #underWay: Promise<void> = Promise.resolve();

  constructor(
    private readonly repositories: Repositories,
    private readonly queue: MailQueue,
    private readonly onError: (error: Error) => void,
  ) {}

  start(): void {
    this.#go();
    this.#timer = setInterval(() => {
      this.#go();
    }, everyMs);
  }

  /** Waits for the round under way. */
  async stop(): Promise<void> {
    clearInterval(this.#timer);
    await this.#underWay;
  }

  /** Queues what is due, oldest first. */
  async run(): Promise<void> {
    for (const { workspaceId, mailId } of await this.repositories.mailDue.takeDue(
      mailsPerRound,
      againSeconds,
    ))
      await this.repositories.inWorkspace(workspaceId, (tx) =>
        this.queue.enqueue(tx, 'mail', mailId),
      );
  }

  #go(): void {
    this.#underWay = this.run().catch((error: unknown) => {
      this.onError(new Error('waiting mail could not be looked through', { cause: error }));
    });
  }
}
