import { type Kysely, sql } from 'kysely';
import { protect } from './protect';

/** What speaks for and against a fit, its bootstraps, and which jobs are being worked. */
export async function evidenceAndBootstraps(db: Kysely<unknown>, appRole: string): Promise<void> {
  await sql`create table fit_evidence (
    workspace_id uuid not null,
    fit_id uuid not null,
    evidence jsonb,
    failure text,
    created_at timestamptz not null default now(),
    primary key (workspace_id, fit_id),
    foreign key (workspace_id, fit_id) references fit (workspace_id, id),
    check ((evidence is null) <> (failure is null))
  )`.execute(db);
  await protect(db, 'fit_evidence', appRole, ['select', 'insert']);

  await sql`create table fit_bootstrap (
    workspace_id uuid not null,
    id uuid not null,
    fit_id uuid not null,
    seed bigint not null check (seed >= 0),
    state text not null check (state in ('queued', 'running', 'done', 'failed', 'cancelled')),
    progress jsonb,
    result jsonb,
    failure text,
    created_by uuid not null references person,
    created_at timestamptz not null default now(),
    finished_at timestamptz,
    primary key (workspace_id, id),
    foreign key (workspace_id, fit_id) references fit (workspace_id, id),
    check ((state = 'done') = (result is not null)),
    check ((state = 'failed') = (failure is not null))
  )`.execute(db);
  await protect(db, 'fit_bootstrap', appRole, ['select', 'insert', 'update']);
  // One at a time a fit; the same seed again is the same bootstrap.
  await sql`create unique index fit_bootstrap_under_way on fit_bootstrap (workspace_id, fit_id)
    where state in ('queued', 'running')`.execute(db);
  await sql`create unique index fit_bootstrap_once on fit_bootstrap (workspace_id, fit_id, seed)
    where state in ('queued', 'running', 'done')`.execute(db);
  await sql`create index fit_bootstrap_newest on fit_bootstrap
    (workspace_id, fit_id, created_at desc)`.execute(db);
  await sql`create function refuse_change_of_finished_bootstrap() returns trigger
    language plpgsql as $$
    begin
      if old.state in ('done', 'failed', 'cancelled') then
        raise exception 'a finished bootstrap never changes' using errcode = 'check_violation',
          constraint = 'fit_bootstrap_immutable';
      end if;
      return new;
    end $$`.execute(db);
  await sql`create trigger fit_bootstrap_immutable before update on fit_bootstrap
    for each row execute function refuse_change_of_finished_bootstrap()`.execute(db);

  // While a server works a job it says so every few seconds; one that fell silent has died, and others take the job.
  await sql`alter table job_ticket add column job_id uuid, add column heartbeat_at timestamptz`.execute(
    db,
  );
  await sql`grant update (job_id, heartbeat_at) on job_ticket to ${sql.id(appRole)}`.execute(db);
  await sql`create index job_ticket_worked on job_ticket (heartbeat_at)
    where heartbeat_at is not null`.execute(db);
}
