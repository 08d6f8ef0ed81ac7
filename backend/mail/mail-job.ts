import type { JobTicketRow } from '../../db/repositories/jobs-repository';
import type { MailOutcome } from '../../db/repositories/mail-repository';
import type { Repositories } from '../../db/repositories/repositories';
import { writeLetter } from './letters';
import { longestSendMs, type Reception, type SmtpSender } from './smtp-sender';

/** The mail server could not take a mail now; the queue tries again. */
export class MailDelayed extends Error {
  override readonly name = 'MailDelayed';
}

export interface MailJobDependencies {
  readonly repositories: Repositories;
  readonly sender: Pick<SmtpSender, 'send'>;
  readonly publicOrigin: string;
  /** Is told of a mail that the server refused for good, by id and in the server's words. */
  readonly onRefused: (mailId: string, words: string) => void;
}

/** Longer than a message may take: after it whoever held the mail is gone. */
const holdSeconds = longestSendMs / 1000 + 30;
/** Of one job, by the queue. */
const triesPerJob = 5;
const longestPauseMinutes = 60;

/**
 * Sends one mail of the outbox. Where the server dies after the mail was taken and before that is written, it is sent
 * again under the same Message-ID.
 */
export class MailJob {
  constructor(private readonly uses: MailJobDependencies) {}

  /** @throws {MailDelayed} */
  async run({ workspaceId, subjectId: mailId }: JobTicketRow): Promise<void> {
    const { repositories, sender, publicOrigin } = this.uses;
    const taken = await repositories.inWorkspace(workspaceId, async (tx) => ({
      mail: await tx.mail.take(mailId, holdSeconds),
      workspace: await tx.members.workspace(),
    }));
    if (taken.mail === undefined || taken.workspace === undefined) return;
    const { recipient, template, detail, attempts } = taken.mail;
    const place = { workspaceName: taken.workspace.name, publicOrigin };
    const reception = await sender.send(mailId, recipient, writeLetter(template, detail, place));
    await repositories.inWorkspace(workspaceId, (tx) =>
      tx.mail.settle(mailId, outcomeOf(reception, attempts)),
    );
    if (reception.kind === 'refused') this.uses.onRefused(mailId, reception.words);
    if (reception.kind === 'delayed')
      throw new MailDelayed(`mail ${mailId} waits: ${reception.words}`);
  }
}

function outcomeOf(reception: Reception, attempts: number): MailOutcome {
  switch (reception.kind) {
    case 'taken':
      return { kind: 'sent' };
    case 'refused':
      return reception;
    case 'delayed':
      return { ...reception, dueInSeconds: pauseMinutes(attempts) * 60 };
  }
}

/**
 * How long the round waits once the queue's own tries, seconds apart, have failed: 1, 4, 9, 16 … minutes, an hour at
 * most.
 */
export function pauseMinutes(attempts: number): number {
  const jobs = Math.max(1, Math.floor(attempts / triesPerJob));
  return Math.min(longestPauseMinutes, jobs ** 2);
}
