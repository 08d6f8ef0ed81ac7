import { type Kysely, sql } from 'kysely';
import { protect } from './protect';

/** Imported files, panel versions with their rows, peer group versions with their reasons. */
export async function panelsAndPeers(db: Kysely<unknown>, appRole: string): Promise<void> {
  await sql`create table stored_file (
    workspace_id uuid not null references workspace,
    id uuid not null,
    name text not null,
    byte_size integer not null,
    sha256 text not null,
    content bytea not null,
    created_by uuid not null references person,
    created_at timestamptz not null default now(),
    primary key (workspace_id, id)
  )`.execute(db);
  // Uploads are compressed already or small: no second compression while they are stored.
  await sql`alter table stored_file alter column content set storage external`.execute(db);
  await protect(db, 'stored_file', appRole, ['select', 'insert', 'delete']);

  await sql`create table panel (
    workspace_id uuid not null references workspace,
    id uuid not null,
    name text not null,
    created_at timestamptz not null default now(),
    primary key (workspace_id, id)
  )`.execute(db);
  await protect(db, 'panel', appRole, ['select', 'insert']);

  await sql`create table panel_version (
    workspace_id uuid not null,
    id uuid not null,
    panel_id uuid not null,
    number integer not null,
    parent_id uuid,
    file_id uuid not null,
    currency text not null,
    unit text not null check (unit in ('units', 'thousands', 'millions', 'billions')),
    company_header text not null,
    year_header text not null,
    columns jsonb not null,
    note text not null,
    companies integer not null,
    row_count integer not null,
    first_year integer not null,
    last_year integer not null,
    created_by uuid not null references person,
    created_at timestamptz not null default now(),
    primary key (workspace_id, id),
    unique (workspace_id, panel_id, number),
    foreign key (workspace_id, panel_id) references panel (workspace_id, id),
    foreign key (workspace_id, parent_id) references panel_version (workspace_id, id),
    foreign key (workspace_id, file_id) references stored_file (workspace_id, id)
  )`.execute(db);
  await protect(db, 'panel_version', appRole, ['select', 'insert']);

  await sql`create table panel_row (
    workspace_id uuid not null,
    panel_version_id uuid not null,
    company text not null,
    year integer not null,
    file_row integer not null,
    cells double precision[] not null,
    primary key (workspace_id, panel_version_id, company, year),
    foreign key (workspace_id, panel_version_id) references panel_version (workspace_id, id)
  )`.execute(db);
  await protect(db, 'panel_row', appRole, ['select', 'insert']);

  await sql`create table import_draft (
    workspace_id uuid not null,
    id uuid not null,
    file_id uuid not null,
    state text not null check (state in ('mapped', 'checked', 'committed')),
    preview jsonb not null,
    mapping jsonb not null,
    findings jsonb,
    panel_version_id uuid,
    created_by uuid not null references person,
    created_at timestamptz not null default now(),
    primary key (workspace_id, id),
    foreign key (workspace_id, file_id) references stored_file (workspace_id, id),
    foreign key (workspace_id, panel_version_id) references panel_version (workspace_id, id)
  )`.execute(db);
  await protect(db, 'import_draft', appRole, ['select', 'insert', 'update', 'delete']);

  await sql`create table peer_group_version (
    workspace_id uuid not null,
    id uuid not null,
    number integer not null,
    parent_id uuid,
    panel_version_id uuid not null,
    own_company text not null,
    note text not null,
    peer_count integer not null,
    created_by uuid not null references person,
    created_at timestamptz not null default now(),
    primary key (workspace_id, id),
    unique (workspace_id, number),
    foreign key (workspace_id, panel_version_id) references panel_version (workspace_id, id),
    foreign key (workspace_id, parent_id) references peer_group_version (workspace_id, id)
  )`.execute(db);
  await protect(db, 'peer_group_version', appRole, ['select', 'insert']);

  await sql`create table peer_choice (
    workspace_id uuid not null,
    peer_group_version_id uuid not null,
    company text not null,
    is_included boolean not null,
    reason text not null,
    primary key (workspace_id, peer_group_version_id, company),
    foreign key (workspace_id, peer_group_version_id)
      references peer_group_version (workspace_id, id)
  )`.execute(db);
  await protect(db, 'peer_choice', appRole, ['select', 'insert']);
}
