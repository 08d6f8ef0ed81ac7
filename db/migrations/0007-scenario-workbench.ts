import { type Kysely, sql } from 'kysely';

/** How a plan is looked at, by what rules it was made and how far it may miss; where a copy came from. */
export async function scenarioWorkbench(db: Kysely<unknown>): Promise<void> {
  // Null in versions stored before: the usual outlook of their fit, every amount typed.
  await sql`alter table scenario_version
    add column outlook jsonb, add column rules jsonb, add column uncertainty jsonb`.execute(db);
  await sql`alter table scenario_draft
    add column outlook jsonb, add column rules jsonb, add column uncertainty jsonb`.execute(db);
  await sql`alter table scenario add column copied_from_id uuid, add column copied_from_version integer,
    add foreign key (workspace_id, copied_from_id, copied_from_version)
      references scenario_version (workspace_id, scenario_id, version),
    add check ((copied_from_id is null) = (copied_from_version is null))`.execute(db);
}
