import { type Kysely, sql } from 'kysely';
import { grant, protect } from './protect';

/** Fits, scenarios with versions and drafts, editions, and the tickets that jobs carry. */
export async function fitsScenariosEditions(db: Kysely<unknown>, appRole: string): Promise<void> {
  await fits(db, appRole);
  await scenarios(db, appRole);
  await editions(db, appRole);
}

async function fits(db: Kysely<unknown>, appRole: string): Promise<void> {
  await sql`create table fit (
    workspace_id uuid not null,
    id uuid not null,
    panel_version_id uuid not null,
    peer_group_id uuid not null,
    specification jsonb not null,
    specification_key text not null,
    state text not null check (state in ('queued', 'running', 'done', 'failed', 'cancelled')),
    progress jsonb,
    hash text,
    result jsonb,
    failure jsonb,
    created_by uuid not null references person,
    created_at timestamptz not null default now(),
    finished_at timestamptz,
    primary key (workspace_id, id),
    foreign key (workspace_id, panel_version_id) references panel_version (workspace_id, id),
    foreign key (workspace_id, peer_group_id) references peer_group_version (workspace_id, id),
    check ((state = 'done') = (result is not null and hash is not null)),
    check ((state = 'failed') = (failure is not null))
  )`.execute(db);
  await protect(db, 'fit', appRole, ['select', 'insert', 'update']);
  // The same peer group with the same specification by the same engine is the same fit.
  await sql`create unique index fit_once on fit (workspace_id, peer_group_id, specification_key)
    where state in ('queued', 'running', 'done')`.execute(db);
  await sql`create index fit_newest on fit (workspace_id, created_at desc)`.execute(db);
  await sql`create function refuse_change_of_finished_fit() returns trigger language plpgsql as $$
    begin
      if old.state in ('done', 'failed', 'cancelled') then
        raise exception 'a finished fit never changes' using errcode = 'check_violation',
          constraint = 'fit_immutable';
      end if;
      return new;
    end $$`.execute(db);
  await sql`create trigger fit_immutable before update on fit
    for each row execute function refuse_change_of_finished_fit()`.execute(db);

  // The queue's payload names a ticket; the workspace comes from the ticket's row, never from the payload.
  await sql`create table job_ticket (
    id uuid primary key,
    workspace_id uuid not null references workspace,
    kind text not null,
    subject_id uuid not null,
    created_at timestamptz not null default now()
  )`.execute(db);
  await grant(db, 'job_ticket', appRole, ['select', 'insert', 'delete']);
}

async function scenarios(db: Kysely<unknown>, appRole: string): Promise<void> {
  await sql`create table scenario (
    workspace_id uuid not null,
    id uuid not null,
    fit_id uuid not null,
    version integer not null,
    created_by uuid not null references person,
    created_at timestamptz not null default now(),
    deleted_at timestamptz,
    primary key (workspace_id, id),
    foreign key (workspace_id, fit_id) references fit (workspace_id, id)
  )`.execute(db);
  await protect(db, 'scenario', appRole, ['select', 'insert', 'update']);

  await sql`create table scenario_version (
    workspace_id uuid not null,
    scenario_id uuid not null,
    version integer not null,
    name text not null,
    note text not null,
    plan jsonb not null,
    years jsonb not null,
    created_by uuid not null references person,
    created_at timestamptz not null default now(),
    primary key (workspace_id, scenario_id, version),
    foreign key (workspace_id, scenario_id) references scenario (workspace_id, id)
  )`.execute(db);
  await protect(db, 'scenario_version', appRole, ['select', 'insert']);

  await sql`create table scenario_draft (
    workspace_id uuid not null,
    fit_id uuid not null,
    person_id uuid not null references person,
    scenario_id uuid,
    name text not null,
    note text not null,
    plan jsonb not null,
    updated_at timestamptz not null default now(),
    unique nulls not distinct (workspace_id, fit_id, person_id, scenario_id),
    foreign key (workspace_id, fit_id) references fit (workspace_id, id),
    foreign key (workspace_id, scenario_id) references scenario (workspace_id, id)
  )`.execute(db);
  await protect(db, 'scenario_draft', appRole, ['select', 'insert', 'update', 'delete']);
}

async function editions(db: Kysely<unknown>, appRole: string): Promise<void> {
  await sql`create table edition (
    workspace_id uuid not null,
    id uuid not null,
    number integer not null,
    fit_id uuid not null,
    content text not null,
    sha256 text not null,
    confidentiality text not null check (confidentiality in ('confidential', 'inside-information')),
    state text not null check (state in ('waiting', 'signed', 'returned', 'superseded')),
    published_by uuid not null references person,
    published_at timestamptz not null default now(),
    decided_by uuid references person,
    decided_at timestamptz,
    decision_comment text,
    superseded_by uuid,
    primary key (workspace_id, id),
    unique (workspace_id, number),
    foreign key (workspace_id, fit_id) references fit (workspace_id, id),
    foreign key (workspace_id, superseded_by) references edition (workspace_id, id),
    constraint edition_decided check (
      (state = 'waiting') = (decided_by is null) and (state = 'waiting') = (decided_at is null)),
    constraint edition_superseded check ((state = 'superseded') = (superseded_by is not null)),
    constraint edition_four_eyes check (
      state not in ('signed', 'superseded') or decided_by <> published_by)
  )`.execute(db);
  await protect(db, 'edition', appRole, ['select', 'insert']);
  await sql`grant update (state, decided_by, decided_at, decision_comment, superseded_by)
    on edition to ${sql.id(appRole)}`.execute(db);
  await sql`create unique index edition_signed_once on edition (workspace_id)
    where state = 'signed'`.execute(db);
  await sql`create function refuse_illegal_edition_change() returns trigger language plpgsql as $$
    begin
      if (old.state, new.state) not in
          (('waiting', 'signed'), ('waiting', 'returned'), ('signed', 'superseded'))
        or (new.number, new.content, new.sha256, new.published_by, new.published_at, new.fit_id)
          is distinct from
          (old.number, old.content, old.sha256, old.published_by, old.published_at, old.fit_id)
        or (old.state = 'signed' and (new.decided_by, new.decided_at, new.decision_comment)
          is distinct from (old.decided_by, old.decided_at, old.decision_comment))
      then
        raise exception 'an edition never goes from % to %, and its content never changes',
          old.state, new.state using errcode = 'check_violation', constraint = 'edition_frozen';
      end if;
      return new;
    end $$`.execute(db);
  await sql`create trigger edition_frozen before update on edition
    for each row execute function refuse_illegal_edition_change()`.execute(db);
}
