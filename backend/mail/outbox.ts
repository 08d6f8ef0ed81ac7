import { randomUUID } from 'node:crypto';
import type { WorkspaceRepositories } from '../../db/repositories/repositories';
import type { LetterDetail, LetterName } from './letters';

/** The queue of jobs, as far as mail needs it. */
export interface MailQueue {
  enqueue(tx: WorkspaceRepositories, kind: 'mail', mailId: string): Promise<void>;
}

export interface Posted<Name extends LetterName> {
  /** What happened, with whose id: the same event makes one mail to each recipient, ever. */
  readonly eventKey: string;
  readonly letter: Name;
  readonly detail: LetterDetail<Name>;
  /** Addresses, each a mail of its own: nobody sees who else got one. */
  readonly recipients: readonly string[];
}

/** How long a job has to send its mail before the round looks for it. */
const firstDueSeconds = 60;

/** Takes mail in within the caller's transaction: with it committed the mail will be sent, without it there is none. */
export class Outbox {
  constructor(private readonly queue: MailQueue) {}

  async post<Name extends LetterName>(
    tx: WorkspaceRepositories,
    { eventKey, letter, detail, recipients }: Posted<Name>,
  ): Promise<void> {
    for (const recipient of recipients) {
      const id = randomUUID();
      const mail = { id, eventKey, recipient, template: letter, detail };
      if (await tx.mail.insert(mail, firstDueSeconds)) await this.queue.enqueue(tx, 'mail', id);
    }
  }
}
