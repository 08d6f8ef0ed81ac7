import { CamelCasePlugin, Kysely, PostgresDialect } from 'kysely';
import pg from 'pg';
import type { Database } from './schema/database';

export interface PoolOptions {
  readonly connectionString: string;
  readonly max: number;
  readonly applicationName: string;
  /** Longest a statement may run. */
  readonly statementTimeoutMs: number;
  /** Longest wait for a free connection before the caller is told that the service is busy. */
  readonly connectionTimeoutMs?: number;
  /** Told of errors on idle and checked-out connections, as a database restart makes them. */
  readonly onConnectionError: (error: Error) => void;
  /** Told of the server's warnings, as of a setting made for a transaction that is not there. */
  readonly onWarning: (message: string) => void;
}

const types = new pg.TypeOverrides();
types.setTypeParser(pg.types.builtins.INT8, parseSafeInteger);

function parseSafeInteger(text: string): number {
  const value = Number(text);
  if (!Number.isSafeInteger(value)) throw new Error(`expected a safe integer; found ${text}`);
  return value;
}

/**
 * A pool with limits on statements, locks and idle transactions. Both listeners are needed: without the one on each
 * connection, a database restart during an open transaction ends the process.
 */
export function createPool(options: PoolOptions): pg.Pool {
  const pool = new pg.Pool({
    connectionString: options.connectionString,
    max: options.max,
    application_name: options.applicationName,
    connectionTimeoutMillis: options.connectionTimeoutMs ?? 2000,
    statement_timeout: options.statementTimeoutMs,
    lock_timeout: 5000,
    idle_in_transaction_session_timeout: 10_000,
    types,
  });
  pool.on('error', options.onConnectionError);
  pool.on('connect', (client) => {
    client.on('error', options.onConnectionError);
    client.on('notice', ({ severity, message }) => {
      if (severity === 'WARNING') options.onWarning(message ?? '');
    });
  });
  return pool;
}

/** Column names become camelCase; keys inside JSON stay as they are, since they may be users' column names. */
export function createDatabase(pool: pg.Pool): Kysely<Database> {
  return new Kysely<Database>({
    dialect: new PostgresDialect({ pool }),
    plugins: [new CamelCasePlugin({ maintainNestedObjectKeys: true })],
  });
}
