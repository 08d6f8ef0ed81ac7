import { Kysely, Migrator, PostgresDialect, sql } from 'kysely';
import pg from 'pg';
import { Migrations } from './migrations/migrations';

/** What an installer of further schema gets: the owner's SQL, and the role to grant rights to. */
export interface OwnerSql {
  executeSql(text: string, values: unknown[]): Promise<{ rows: unknown[] }>;
}

export interface MigrateOptions {
  /** Connection of the role that owns the schema. */
  readonly ownerUrl: string;
  /** Name of the application's role, which must exist and owns nothing. */
  readonly appRole: string;
  /** Installs a schema that a package keeps itself, under the name given; it may use it and not change it. */
  readonly packaged?: {
    readonly schema: string;
    readonly install: (owner: OwnerSql) => Promise<void>;
  };
}

/**
 * Brings the schema to the newest version; safe when two run at once.
 *
 * @returns the names of the migrations that were run.
 */
export async function migrate(options: MigrateOptions): Promise<readonly string[]> {
  const pool = new pg.Pool({
    connectionString: options.ownerUrl,
    max: 3,
    connectionTimeoutMillis: 5000,
  });
  pool.on('error', (error) => {
    process.stderr.write(`connection lost while migrating: ${error.message}\n`);
  });
  const db = new Kysely<unknown>({ dialect: new PostgresDialect({ pool }) });
  // Held over all of it: the migrator's own lock does not cover the rights that are granted after it.
  const lock = await pool.connect();
  try {
    await lock.query('select pg_advisory_lock(743201)');
    const migrator = new Migrator({ db, provider: new Migrations(options.appRole) });
    const { error, results } = await migrator.migrateToLatest();
    if (error !== undefined) throw new Error('the migration failed', { cause: error });
    await sql`revoke create on schema public from public`.execute(db);
    await sql`grant usage on schema public to ${sql.id(options.appRole)}`.execute(db);
    await sql`grant select on kysely_migration to ${sql.id(options.appRole)}`.execute(db);
    if (options.packaged !== undefined) {
      await options.packaged.install({
        executeSql: (text, values) => pool.query(text, values),
      });
      await grantUse(db, options.packaged.schema, options.appRole);
    }
    return (results ?? []).map((result) => result.migrationName);
  } finally {
    lock.release(true);
    await db.destroy();
  }
}

async function grantUse(db: Kysely<unknown>, schemaName: string, appRole: string): Promise<void> {
  const schema = sql.id(schemaName);
  const role = sql.id(appRole);
  await sql`grant usage on schema ${schema} to ${role}`.execute(db);
  await sql`grant select, insert, update, delete on all tables in schema ${schema} to ${role}`.execute(
    db,
  );
  await sql`grant execute on all functions in schema ${schema} to ${role}`.execute(db);
}
