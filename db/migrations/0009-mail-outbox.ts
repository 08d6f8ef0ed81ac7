import { type Kysely, sql } from 'kysely';
import { protect } from './protect';

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
  await sql`create index mail_waiting on mail (workspace_id, created_at) where state = 'waiting'`.execute(
    db,
  );
}
