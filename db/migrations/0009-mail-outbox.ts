import { type Kysely, sql } from 'kysely';
import { grant, protect } from './protect';

/** Mail that was decided on within a transaction and is sent after it, at least until a server took it. */
export async function mailOutbox(db: Kysely<unknown>, appRole: string): Promise<void> {
  await sql`create table mail (
    workspace_id uuid not null,
    id uuid not null,
    /** The same event never makes a second mail to the same person. */
    event_key text not null,
    recipient text not null,
    template text not null,
    detail jsonb not null,
    state text not null check (state in ('waiting', 'sent', 'refused')),
    attempts integer not null default 0,
    /** What the mail server said, or how it could not be reached. */
    last_error text,
    created_at timestamptz not null default now(),
    sent_at timestamptz,
    primary key (workspace_id, id),
    unique (workspace_id, event_key, recipient),
    foreign key (workspace_id) references workspace,
    check ((state = 'sent') = (sent_at is not null)),
    check (state <> 'refused' or last_error is not null)
  )`.execute(db);
  await protect(db, 'mail', appRole, ['select', 'insert']);
  await sql`grant update (state, attempts, last_error, sent_at) on mail to ${sql.id(appRole)}`.execute(
    db,
  );
  await mailDue(db, appRole);
}

/**
 * Which mails wait, in which workspace, and no word of them: the round that looks for forgotten ones knows no workspace.
 * Like the tickets of jobs, it stands outside the walls.
 */
async function mailDue(db: Kysely<unknown>, appRole: string): Promise<void> {
  await sql`create table mail_due (
    workspace_id uuid not null,
    mail_id uuid not null,
    /** From when on the round queues it again. */
    due_at timestamptz not null,
    /** Until when one server alone may send it. */
    held_until timestamptz,
    primary key (workspace_id, mail_id),
    foreign key (workspace_id, mail_id) references mail
  )`.execute(db);
  await grant(db, 'mail_due', appRole, ['select', 'insert', 'update', 'delete']);
  await sql`create index mail_due_at on mail_due (due_at)`.execute(db);
}
