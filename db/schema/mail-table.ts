import type { Generated, JSONColumnType } from 'kysely';

export interface MailTable {
  workspaceId: string;
  id: string;
  eventKey: string;
  recipient: string;
  template: string;
  detail: JSONColumnType<object>;
  state: 'waiting' | 'sent' | 'refused';
  attempts: Generated<number>;
  lastError: string | null;
  createdAt: Generated<Date>;
  sentAt: Date | null;
}

/** One row for each mail that waits; gone once it was sent or refused. */
export interface MailDueTable {
  workspaceId: string;
  mailId: string;
  dueAt: Date;
  heldUntil: Date | null;
}
