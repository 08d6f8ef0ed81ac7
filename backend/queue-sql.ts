import { isDatabaseUnavailable } from '../db/errors';

interface Queryable {
  query(text: string, values: unknown[]): Promise<{ rows: unknown[] }>;
}

const patienceMs = 20_000;
const pauseMs = 250;

/**
 * SQL for the queue package, which does not wait for what it writes at a job's end: a statement that meets a database
 * being restarted is tried again for a while instead of being lost.
 */
export function queueSql(pool: Queryable) {
  return async (text: string, values: unknown[]): Promise<{ rows: unknown[] }> => {
    const until = Date.now() + patienceMs;
    for (;;) {
      try {
        return await pool.query(text, values);
      } catch (error) {
        if (!isDatabaseUnavailable(error) || Date.now() > until) throw error;
        await new Promise((resolve) => setTimeout(resolve, pauseMs));
      }
    }
  };
}
