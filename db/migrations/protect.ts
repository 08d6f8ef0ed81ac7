import { type Kysely, sql } from 'kysely';

export type Grant = 'select' | 'insert' | 'update' | 'delete';

/**
 * Walls a table of workspace data off: row level security enabled and forced; one restrictive policy holds every row to
 * the workspace set for the transaction, one permissive policy lets the application role through. With no workspace
 * set, no row is seen and none can be written.
 */
export async function protect(
  db: Kysely<unknown>,
  table: string,
  appRole: string,
  grants: readonly Grant[],
): Promise<void> {
  const name = sql.table(table);
  await sql`alter table ${name} enable row level security`.execute(db);
  await sql`alter table ${name} force row level security`.execute(db);
  await sql`create policy workspace_wall on ${name} as restrictive for all
    using (workspace_id = current_workspace())
    with check (workspace_id = current_workspace())`.execute(db);
  await sql`create policy application on ${name} as permissive for all to ${sql.id(appRole)}
    using (true) with check (true)`.execute(db);
  await grant(db, table, appRole, grants);
}

/** Gives the application role rights on a table; `grants` is a list of ours, never of a user's. */
export async function grant(
  db: Kysely<unknown>,
  table: string,
  appRole: string,
  grants: readonly Grant[],
): Promise<void> {
  for (const right of grants) {
    const on = sql`on ${sql.table(table)} to ${sql.id(appRole)}`;
    if (right === 'select') await sql`grant select ${on}`.execute(db);
    if (right === 'insert') await sql`grant insert ${on}`.execute(db);
    if (right === 'update') await sql`grant update ${on}`.execute(db);
    if (right === 'delete') await sql`grant delete ${on}`.execute(db);
  }
}
