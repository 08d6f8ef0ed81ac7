import { type Kysely, sql } from 'kysely';
import { protect } from './protect';

/** What made a panel version, why its cells changed, flags found to be right, and imports committed in the background. */
export async function panelDesk(db: Kysely<unknown>, appRole: string): Promise<void> {
  await sql`alter table panel_version
    add column origin text not null default 'import'
      check (origin in ('import', 'correction', 'restore')),
    add column recipe jsonb`.execute(db);
  await sql`alter table panel_row add column currency text`.execute(db);

  await sql`create table panel_company (
    workspace_id uuid not null,
    panel_version_id uuid not null,
    company text not null,
    attributes jsonb not null,
    primary key (workspace_id, panel_version_id, company),
    foreign key (workspace_id, panel_version_id) references panel_version (workspace_id, id)
  )`.execute(db);
  await protect(db, 'panel_company', appRole, ['select', 'insert']);

  await sql`create table panel_correction (
    workspace_id uuid not null,
    panel_version_id uuid not null,
    company text not null,
    year integer not null,
    column_index integer not null check (column_index >= 0),
    reason text not null,
    source text not null,
    primary key (workspace_id, panel_version_id, company, year, column_index),
    foreign key (workspace_id, panel_version_id) references panel_version (workspace_id, id)
  )`.execute(db);
  await protect(db, 'panel_correction', appRole, ['select', 'insert']);

  await sql`create table flag_dismissal (
    workspace_id uuid not null,
    id uuid not null,
    panel_id uuid not null,
    company text not null,
    year integer not null,
    column_index integer not null check (column_index >= 0),
    code text not null,
    value double precision,
    reason text not null,
    created_by uuid not null references person,
    created_at timestamptz not null default now(),
    primary key (workspace_id, id),
    unique (workspace_id, panel_id, company, year, column_index, code),
    foreign key (workspace_id, panel_id) references panel (workspace_id, id)
  )`.execute(db);
  await protect(db, 'flag_dismissal', appRole, ['select', 'insert', 'delete']);

  // A commit has an id of its own: a cancelled one that still runs somewhere can change nothing of the next.
  await sql`alter table import_draft
    add column note text,
    add column progress jsonb,
    add column failure text,
    add column commit_id uuid,
    add column committed_by uuid references person,
    drop constraint import_draft_state_check,
    add constraint import_draft_state_check
      check (state in ('mapped', 'checked', 'committing', 'failed', 'committed')),
    add constraint import_draft_commit_check
      check (state <> 'committing' or (commit_id is not null and committed_by is not null)),
    add constraint import_draft_failure_check check ((state = 'failed') = (failure is not null)),
    add constraint import_draft_version_check
      check ((state = 'committed') = (panel_version_id is not null))`.execute(db);
  await sql`create unique index import_draft_commit on import_draft (workspace_id, commit_id)`.execute(
    db,
  );
}
