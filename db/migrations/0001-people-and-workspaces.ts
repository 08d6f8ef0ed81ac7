import { type Kysely, sql } from 'kysely';
import { grant, protect } from './protect';

/** People, sessions, workspaces, members and invitations; the workspace of a transaction. */
export async function peopleAndWorkspaces(db: Kysely<unknown>, appRole: string): Promise<void> {
  await sql`create function current_workspace() returns uuid language sql stable
    return nullif(current_setting('app.workspace', true), '')::uuid`.execute(db);
  await sql`create function current_person() returns uuid language sql stable
    return nullif(current_setting('app.person', true), '')::uuid`.execute(db);

  await sql`create table person (
    id uuid primary key,
    email text not null unique check (email = lower(email)),
    name text not null,
    password_hash text not null,
    preferences jsonb not null,
    created_at timestamptz not null default now()
  )`.execute(db);
  await grant(db, 'person', appRole, ['select', 'insert', 'update']);

  await sql`create table session (
    sid text primary key,
    sess json not null,
    expire timestamptz not null
  )`.execute(db);
  await sql`create index session_expire on session (expire)`.execute(db);
  await grant(db, 'session', appRole, ['select', 'insert', 'update', 'delete']);

  await sql`create table sign_in_throttle (
    key text primary key,
    failures integer not null,
    last_failure_at timestamptz not null
  )`.execute(db);
  await grant(db, 'sign_in_throttle', appRole, ['select', 'insert', 'update', 'delete']);

  await sql`create table workspace (
    workspace_id uuid primary key,
    name text not null,
    created_at timestamptz not null default now()
  )`.execute(db);
  await protect(db, 'workspace', appRole, ['select', 'insert', 'update']);

  await sql`create table membership (
    workspace_id uuid not null references workspace,
    person_id uuid not null references person,
    roles text[] not null check (
      cardinality(roles) > 0 and roles <@ array['analyst', 'cfo', 'reader', 'billing_admin']),
    joined_at timestamptz not null default now(),
    primary key (workspace_id, person_id)
  )`.execute(db);
  await sql`create index membership_person on membership (person_id)`.execute(db);
  await sql`alter table membership enable row level security`.execute(db);
  await sql`alter table membership force row level security`.execute(db);
  // A person finds the workspaces they belong to before any workspace is set: rows of their own may be read, not written.
  await sql`create policy workspace_wall on membership as restrictive for select
    using (workspace_id = current_workspace() or person_id = current_person())`.execute(db);
  await sql`create policy workspace_wall_insert on membership as restrictive for insert
    with check (workspace_id = current_workspace())`.execute(db);
  await sql`create policy workspace_wall_update on membership as restrictive for update
    using (workspace_id = current_workspace())
    with check (workspace_id = current_workspace())`.execute(db);
  await sql`create policy workspace_wall_delete on membership as restrictive for delete
    using (workspace_id = current_workspace())`.execute(db);
  await sql`create policy application on membership as permissive for all to ${sql.id(appRole)}
    using (true) with check (true)`.execute(db);
  await grant(db, 'membership', appRole, ['select', 'insert', 'update', 'delete']);

  await sql`create table invitation (
    workspace_id uuid not null references workspace,
    id uuid not null,
    token_hash bytea not null,
    email text not null check (email = lower(email)),
    roles text[] not null check (
      cardinality(roles) > 0 and roles <@ array['analyst', 'cfo', 'reader', 'billing_admin']),
    created_by uuid not null references person,
    created_at timestamptz not null default now(),
    expires_at timestamptz not null,
    accepted_at timestamptz,
    withdrawn_at timestamptz,
    primary key (workspace_id, id),
    unique (workspace_id, token_hash)
  )`.execute(db);
  await protect(db, 'invitation', appRole, ['select', 'insert', 'update']);
  await sql`create unique index invitation_open on invitation (workspace_id, email)
    where accepted_at is null and withdrawn_at is null`.execute(db);

  await sql`create table activity (
    workspace_id uuid not null references workspace,
    id uuid not null,
    at timestamptz not null default now(),
    person_id uuid references person,
    action text not null,
    subject_id text,
    detail jsonb not null,
    primary key (workspace_id, id)
  )`.execute(db);
  await sql`create index activity_at on activity (workspace_id, at)`.execute(db);
  await protect(db, 'activity', appRole, ['select', 'insert']);

  await sql`create table billing_account (
    workspace_id uuid primary key references workspace,
    customer_id text not null,
    subscription_id text not null,
    created_at timestamptz not null default now()
  )`.execute(db);
  await protect(db, 'billing_account', appRole, ['select', 'insert', 'update']);
}
