import { JobQueue } from '../../jobs/job-queue';
import { benchHeartbeat, type JobBench } from '../../jobs/testing/job-bench';
import { MailJob } from '../mail-job';
import { MailRound } from '../mail-round';
import { SmtpSender } from '../smtp-sender';

export const silenceMs = 500;

/** A server process's worth of mail: a queue, a sender, a round that a spec runs itself. */
export class MailServer {
  /** What the mail server refused for good, in its words, by mail. */
  readonly refusals = new Map<string, string>();
  readonly errors: Error[] = [];
  readonly round: MailRound;
  readonly #queue: JobQueue;
  readonly #sender: SmtpSender;

  private constructor({ repositories, pool, queue }: JobBench, url: string) {
    const onError = (error: Error): void => {
      this.errors.push(error);
    };
    this.#queue = new JobQueue({
      repositories,
      executeSql: (text, values) => pool.query(text, values),
      onError,
      heartbeat: benchHeartbeat,
    });
    this.#sender = new SmtpSender({ url, from: 'kinvale@velmara.example', silenceMs });
    this.round = new MailRound(repositories, queue, onError);
  }

  /** Starts working the bench's mail. */
  static async start(bench: JobBench, url: string): Promise<MailServer> {
    const server = new MailServer(bench, url);
    await server.#queue.start();
    const job = new MailJob({
      repositories: bench.repositories,
      sender: server.#sender,
      publicOrigin: 'https://kinvale.example',
      onRefused: (mailId, words) => server.refusals.set(mailId, words),
    });
    await server.#queue.work('mail', (ticket) => job.run(ticket));
    return server;
  }

  /** As at the end of a server's patience: the mail under way is cut off. */
  async stop(): Promise<void> {
    this.#sender.close();
    await this.#queue.stop();
  }
}
