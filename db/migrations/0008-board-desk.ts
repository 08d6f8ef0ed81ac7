import { type Kysely, sql } from 'kysely';
import { protect } from './protect';

/** What surrounds an edition and is never part of what it froze: answers, warnings opened, comments, access. */
export async function boardDesk(db: Kysely<unknown>, appRole: string): Promise<void> {
  await sql`alter table edition add column answers uuid,
    add foreign key (workspace_id, answers) references edition (workspace_id, id)`.execute(db);

  await sql`create table edition_warning_opened (
    workspace_id uuid not null,
    edition_id uuid not null,
    warning_id text not null,
    person_id uuid not null references person,
    opened_at timestamptz not null default now(),
    primary key (workspace_id, edition_id, person_id, warning_id),
    foreign key (workspace_id, edition_id) references edition (workspace_id, id)
  )`.execute(db);
  await protect(db, 'edition_warning_opened', appRole, ['select', 'insert']);

  await sql`create table edition_comment (
    workspace_id uuid not null,
    id uuid not null,
    edition_id uuid not null,
    block text not null,
    body text not null check (body <> ''),
    written_by uuid not null references person,
    written_at timestamptz not null default now(),
    primary key (workspace_id, id),
    foreign key (workspace_id, edition_id) references edition (workspace_id, id)
  )`.execute(db);
  await protect(db, 'edition_comment', appRole, ['select', 'insert']);
  await sql`create index edition_comment_by_edition on edition_comment
    (workspace_id, edition_id, written_at)`.execute(db);

  await sql`create table edition_access (
    workspace_id uuid not null,
    id uuid not null,
    edition_id uuid not null,
    person_id uuid not null references person,
    kind text not null check (kind in ('viewed', 'exported')),
    format text,
    at timestamptz not null default now(),
    primary key (workspace_id, id),
    foreign key (workspace_id, edition_id) references edition (workspace_id, id),
    check ((kind = 'exported') = (format is not null))
  )`.execute(db);
  await protect(db, 'edition_access', appRole, ['select', 'insert']);
  await sql`create index edition_access_by_edition on edition_access
    (workspace_id, edition_id, at desc)`.execute(db);

  await sql`create index activity_by_subject on activity (workspace_id, subject_id, action)`.execute(
    db,
  );
}
