import pg from 'pg';

/** A row with this key is there already. */
export class UniqueViolation extends Error {
  override readonly name = 'UniqueViolation';
  constructor(
    readonly constraint: string,
    cause: unknown,
  ) {
    super(`a row with this key exists already (${constraint})`, { cause });
  }
}

/** A rule written in the database refuses the row. */
export class CheckViolation extends Error {
  override readonly name = 'CheckViolation';
  constructor(
    readonly constraint: string,
    cause: unknown,
  ) {
    super(`the database refuses the row (${constraint})`, { cause });
  }
}

/** PostgreSQL's codes that mean: not now, try again. */
const unavailable = new Set([
  '57P01',
  '57P02',
  '57P03',
  '08000',
  '08003',
  '08006',
  '53300',
  '57014',
  '55P03',
  '40P01',
]);

/** Whether an error says that the database cannot be reached or is too busy. */
export function isDatabaseUnavailable(error: unknown): boolean {
  if (error instanceof pg.DatabaseError) return unavailable.has(error.code ?? '');
  if (!(error instanceof Error)) return false;
  const code = 'code' in error ? error.code : undefined;
  if (code === 'ECONNREFUSED' || code === 'ECONNRESET' || code === 'EPIPE') return true;
  return (
    error.message.startsWith('timeout exceeded when trying to connect') ||
    error.message.startsWith('Client has encountered a connection error') ||
    error.message.startsWith('Connection terminated')
  );
}

/** Whether the volume of the database is full. */
export function isDatabaseFull(error: unknown): boolean {
  return error instanceof pg.DatabaseError && error.code === '53100';
}

/** Whether a row refers to one that is not, or is no longer, there. */
export function isMissingReference(error: unknown): boolean {
  return error instanceof pg.DatabaseError && error.code === '23503';
}

/** Whether a text holds what PostgreSQL cannot store: a NUL, or half of a surrogate pair. */
export function isUnstorableText(error: unknown): boolean {
  return (
    error instanceof pg.DatabaseError && ['22021', '22P05', '22P02'].includes(error.code ?? '')
  );
}

/** Runs a query and gives PostgreSQL's constraint errors our names. */
export async function withNamedErrors<T>(query: () => Promise<T>): Promise<T> {
  try {
    return await query();
  } catch (error) {
    if (error instanceof pg.DatabaseError) {
      if (error.code === '23505') throw new UniqueViolation(error.constraint ?? '', error);
      if (error.code === '23514') throw new CheckViolation(error.constraint ?? '', error);
    }
    throw error;
  }
}
