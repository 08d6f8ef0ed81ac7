import PgBoss from 'pg-boss';

/** The schema that the queue package keeps itself. */
export const queueSchema = 'pgboss';

/** Queues that the application works; made at migration, since making one changes the schema. */
export const queueNames = [
  'fit',
  'evidence',
  'bootstrap',
  'peer-trial',
  'import',
  'open-billing-account',
  'mail',
] as const;
export type QueueName = (typeof queueNames)[number];

interface OwnerSql {
  executeSql(text: string, values: unknown[]): Promise<{ rows: unknown[] }>;
}

/** Installs the queue's schema and its queues as the owner; a second run changes nothing. */
export async function installQueue(owner: OwnerSql): Promise<void> {
  const boss = new PgBoss({ db: owner, schema: queueSchema, supervise: false, schedule: false });
  const failures: Error[] = [];
  boss.on('error', (error) => failures.push(error));
  await boss.start();
  for (const name of queueNames) await boss.createQueue(name, { name, retryLimit: 2 });
  await boss.stop({ graceful: false });
  if (failures[0] !== undefined)
    throw new Error('the queue could not be installed', { cause: failures[0] });
}
