import { type Kysely, sql } from 'kysely';
import { protect } from './protect';

/** What made a panel version, why its cells changed, flags found to be right, and imports committed in the background. */
export async function panelDesk(db: Kysely<unknown>, appRole: string): Promise<void> {
  await sql`alter table panel_version
    add column origin text not null default 'import'
      check (origin in ('import', 'correction', 'restore')),
    add column recipe jsonb,
    add column restored_id uuid,
    add constraint panel_version_restored_check
      check ((origin = 'restore') = (restored_id is not null)),
    add foreign key (workspace_id, restored_id) references panel_version (workspace_id, id)`.execute(
    db,
  );
  // The moment itself: a transaction that waited for another began before the version that came first.
  await sql`alter table panel_version
    alter column created_at set default clock_timestamp()`.execute(db);
  await sql`alter table panel_row add column currency text`.execute(db);

  // A row's version is looked up once a statement: once a row, that was half of the time that 200,000 rows took. Versions
  // are never deleted, and the look-up sees those of the row's own workspace alone.
  await sql`alter table panel_row
    drop constraint panel_row_workspace_id_panel_version_id_fkey`.execute(db);
  await sql`create function require_version_of_panel_rows() returns trigger
    language plpgsql as $$
    begin
      if exists (
        select from (select distinct workspace_id, panel_version_id from arrived) as named
        where not exists (
          select from panel_version as version
          where version.workspace_id = named.workspace_id and version.id = named.panel_version_id
        )
      ) then
        raise exception 'a panel row names no version of its workspace'
          using errcode = 'foreign_key_violation', constraint = 'panel_row_version';
      end if;
      return null;
    end $$`.execute(db);
  await sql`create trigger panel_row_version after insert on panel_row
    referencing new table as arrived
    for each statement execute function require_version_of_panel_rows()`.execute(db);

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
    column_name text,
    code text not null,
    value double precision,
    reason text not null,
    created_by uuid not null references person,
    created_at timestamptz not null default now(),
    primary key (workspace_id, id),
    unique nulls not distinct (workspace_id, panel_id, company, year, column_name, code, value),
    foreign key (workspace_id, panel_id) references panel (workspace_id, id)
  )`.execute(db);
  await protect(db, 'flag_dismissal', appRole, ['select', 'insert', 'delete']);

  await forgetChecks(db);
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
      check (state <> 'committing' or (commit_id is not null and committed_by is not null and note is not null)),
    add constraint import_draft_failure_check check ((state = 'failed') = (failure is not null)),
    add constraint import_draft_version_check
      check ((state = 'committed') = (panel_version_id is not null))`.execute(db);
  await sql`create unique index import_draft_commit on import_draft (workspace_id, commit_id)`.execute(
    db,
  );
}

/**
 * Imports from before know neither sheets nor ways of reading, and their checks lack what a check now says: their files
 * are read as they were, and checked again. The owner steps over the wall for this one statement.
 */
async function forgetChecks(db: Kysely<unknown>): Promise<void> {
  const reading = {
    sheet: null,
    headerRow: 1,
    layout: { kind: 'long' },
    decimalSign: 'as-found',
  };
  const added = JSON.stringify({ sheets: [], topLines: [], reading });
  await sql`alter table import_draft no force row level security`.execute(db);
  await sql`update import_draft set findings = null, preview = preview || ${added}::jsonb,
    state = case state when 'checked' then 'mapped' else state end`.execute(db);
  await sql`alter table import_draft force row level security`.execute(db);
}
