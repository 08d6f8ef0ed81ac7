import { type Kysely, sql } from 'kysely';
import type { Database } from '../schema/database';

export interface NewMail {
  readonly id: string;
  /** What happened: the same event makes one mail to a recipient, however often it is told. */
  readonly eventKey: string;
  readonly recipient: string;
  readonly template: string;
  readonly detail: object;
}

export interface MailRow {
  readonly id: string;
  readonly recipient: string;
  readonly template: string;
  readonly detail: object;
  /** Tries so far, the one under way included. */
  readonly attempts: number;
}

/** How a try to send ended. */
export type MailOutcome =
  | { readonly kind: 'sent' }
  | { readonly kind: 'refused'; readonly words: string }
  | { readonly kind: 'delayed'; readonly words: string; readonly dueInSeconds: number };

/** A workspace's outgoing mail, kept after it was sent. */
export class MailRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  /**
   * Keeps a mail that waits to be sent.
   *
   * @param dueInSeconds  how long its job has before the round looks for it.
   * @returns false where this event made a mail to this recipient before.
   */
  async insert(mail: NewMail, dueInSeconds: number): Promise<boolean> {
    const { workspaceId } = this;
    const inserted = await this.db
      .insertInto('mail')
      .values({ ...mail, workspaceId, detail: JSON.stringify(mail.detail), state: 'waiting' })
      .onConflict((conflict) =>
        conflict.columns(['workspaceId', 'eventKey', 'recipient']).doNothing(),
      )
      .returning('id')
      .executeTakeFirst();
    if (inserted === undefined) return false;
    await this.db
      .insertInto('mailDue')
      .values({ workspaceId, mailId: mail.id, dueAt: inSeconds(dueInSeconds) })
      .execute();
    return true;
  }

  /**
   * Takes a waiting mail to send it; nobody else gets it for a while, so that two servers do not send it twice.
   *
   * @returns undefined where it does not wait, or somebody else has it.
   */
  async take(id: string, holdSeconds: number): Promise<MailRow | undefined> {
    const held = await this.db
      .updateTable('mailDue')
      .set({ heldUntil: inSeconds(holdSeconds) })
      .where('workspaceId', '=', this.workspaceId)
      .where('mailId', '=', id)
      .where(isFree)
      .executeTakeFirst();
    if (held.numUpdatedRows === 0n) return undefined;
    return this.db
      .updateTable('mail')
      .set((eb) => ({ attempts: eb('attempts', '+', 1) }))
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .returning(['id', 'recipient', 'template', 'detail', 'attempts'])
      .executeTakeFirst();
  }

  /** Writes how the try ended; a mail that was delayed is free for the next one. */
  async settle(id: string, outcome: MailOutcome): Promise<void> {
    await this.db
      .updateTable('mail')
      .set(
        outcome.kind === 'sent'
          ? { state: 'sent', sentAt: sql<Date>`now()`, lastError: null }
          : {
              state: outcome.kind === 'refused' ? 'refused' : 'waiting',
              lastError: outcome.words,
            },
      )
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .execute();
    if (outcome.kind === 'delayed')
      await this.db
        .updateTable('mailDue')
        .set({ heldUntil: null, dueAt: inSeconds(outcome.dueInSeconds) })
        .where('workspaceId', '=', this.workspaceId)
        .where('mailId', '=', id)
        .execute();
    else
      await this.db
        .deleteFrom('mailDue')
        .where('workspaceId', '=', this.workspaceId)
        .where('mailId', '=', id)
        .execute();
  }
}

/** Waiting mails of all workspaces by id alone; what is in them is reached within their workspace. */
export class MailDueRepository {
  constructor(private readonly db: Kysely<Database>) {}

  /**
   * Mails that nobody has sent in time; each is given to one caller, who queues it.
   *
   * @param againSeconds  when it is given out again if it still waits then.
   */
  takeDue(
    limit: number,
    againSeconds: number,
  ): Promise<{ readonly workspaceId: string; readonly mailId: string }[]> {
    return this.db
      .with('due', (query) =>
        query
          .selectFrom('mailDue')
          .select(['workspaceId', 'mailId'])
          .where('dueAt', '<=', sql<Date>`now()`)
          .where(isFree)
          .orderBy('dueAt')
          .limit(limit)
          .forUpdate()
          .skipLocked(),
      )
      .updateTable('mailDue')
      .from('due')
      .set({ dueAt: inSeconds(againSeconds) })
      .whereRef('mailDue.workspaceId', '=', 'due.workspaceId')
      .whereRef('mailDue.mailId', '=', 'due.mailId')
      .returning(['mailDue.workspaceId', 'mailDue.mailId'])
      .execute();
  }
}

/** By the database's clock, since servers' may differ. */
function inSeconds(seconds: number) {
  return sql<Date>`now() + make_interval(secs => ${seconds})`;
}

const isFree = sql<boolean>`(held_until is null or held_until < now())`;
