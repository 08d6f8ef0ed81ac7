import { type Kysely, sql } from 'kysely';
import { protect } from './protect';

/** Peer groups tried out before they are saved, and what was fitted for them. */
export async function peerTrials(db: Kysely<unknown>, appRole: string): Promise<void> {
  await sql`create table peer_trial (
    workspace_id uuid not null,
    id uuid not null,
    panel_version_id uuid not null,
    request jsonb not null,
    request_key text not null,
    state text not null check (state in ('queued', 'running', 'done', 'failed', 'cancelled')),
    outcomes jsonb not null default '[]',
    failure text,
    created_by uuid not null references person,
    created_at timestamptz not null default now(),
    finished_at timestamptz,
    primary key (workspace_id, id),
    foreign key (workspace_id, panel_version_id) references panel_version (workspace_id, id),
    check ((state = 'failed') = (failure is not null))
  )`.execute(db);
  await protect(db, 'peer_trial', appRole, ['select', 'insert', 'update']);
  // The same request again is the same trial.
  await sql`create unique index peer_trial_once on peer_trial (workspace_id, request_key)
    where state in ('queued', 'running', 'done')`.execute(db);
  await sql`create function refuse_change_of_finished_trial() returns trigger
    language plpgsql as $$
    begin
      if old.state in ('done', 'failed', 'cancelled') then
        raise exception 'a finished trial never changes' using errcode = 'check_violation',
          constraint = 'peer_trial_immutable';
      end if;
      return new;
    end $$`.execute(db);
  await sql`create trigger peer_trial_immutable before update on peer_trial
    for each row execute function refuse_change_of_finished_trial()`.execute(db);

  await sql`create table trial_fit (
    workspace_id uuid not null,
    hash text not null,
    outcome jsonb not null,
    created_at timestamptz not null default now(),
    primary key (workspace_id, hash),
    foreign key (workspace_id) references workspace (workspace_id)
  )`.execute(db);
  await protect(db, 'trial_fit', appRole, ['select', 'insert']);
}
