import { statfs } from 'node:fs/promises';
import express, { type Router } from 'express';

export interface HealthOptions {
  /** True when the database answers and has the schema of this build. */
  readonly isSchemaCurrent: () => Promise<boolean>;
  readonly isStopping: () => boolean;
  /** A folder on the volume whose free space counts. */
  readonly folder: string;
}

const databaseAnswersWithinMs = 500;
const leastFreeShare = 0.02;

/** `/livez`: the process runs. `/readyz`: it can serve; otherwise 503 with reason codes and no detail. */
export function health(options: HealthOptions): Router {
  const router = express.Router();
  router.get('/livez', (_req, res) => {
    res.setHeader('Cache-Control', 'no-store').json({ live: true });
  });
  router.get('/readyz', async (_req, res) => {
    const reasons = await notReady(options);
    res
      .status(reasons.length === 0 ? 200 : 503)
      .setHeader('Cache-Control', 'no-store')
      .json({ ready: reasons.length === 0, reasons });
  });
  return router;
}

async function notReady(options: HealthOptions): Promise<readonly string[]> {
  const reasons: string[] = [];
  if (options.isStopping()) reasons.push('stopping');
  const schema = await withinTime(options.isSchemaCurrent());
  if (schema === 'unavailable') reasons.push('database');
  else if (!schema) reasons.push('migrations');
  const disk = await statfs(options.folder);
  if (disk.bavail / disk.blocks < leastFreeShare) reasons.push('disk');
  return reasons;
}

async function withinTime(answer: Promise<boolean>): Promise<boolean | 'unavailable'> {
  let timer: NodeJS.Timeout | undefined;
  const timeout = new Promise<'unavailable'>((resolve) => {
    timer = setTimeout(() => {
      resolve('unavailable');
    }, databaseAnswersWithinMs);
  });
  try {
    // Whatever the database's error is, the answer is the same reason code.
    return await Promise.race([answer.catch(() => 'unavailable' as const), timeout]);
  } finally {
    clearTimeout(timer);
  }
}
