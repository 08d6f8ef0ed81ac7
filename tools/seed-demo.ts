import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import { pino } from 'pino';
import { compose } from '../backend/compose';
import { DemoSeeder } from './demo-seeder';
import { demoPeople } from './demo-panel';

/** Everybody's password in the demo workspace: on a developer's machine, and in the journeys that ask for it. */
const password = 'a demo passphrase';

/**
 * Fills the demo workspace through the product's own services, once: what is there already is left as it is.
 * Prints the accounts as JSON.
 */
async function main(): Promise<void> {
  const { DATABASE_URL, STRIPE_API_URL, STRIPE_SECRET_KEY, NODE_ENV, KINVALE_SEED_DEMO } =
    process.env;
  if (NODE_ENV === 'production' && KINVALE_SEED_DEMO !== '1')
    throw new Error('demo accounts are not made in production');
  if (DATABASE_URL === undefined) throw new Error('DATABASE_URL is not set');
  const here = dirname(fileURLToPath(import.meta.url));
  const composition = compose({
    databaseUrl: DATABASE_URL,
    stripe: { secretKey: STRIPE_SECRET_KEY ?? 'sk_test_local', apiUrl: STRIPE_API_URL },
    mail: undefined, // waits for the server that is filled
    publicOrigin: '',
    fitThreads: 1,
    now: () => new Date(),
    logger: pino({ level: 'warn' }, pino.destination(2)),
    backendFolder: `${here}/../backend`,
  });
  await composition.start();
  try {
    await new DemoSeeder(composition.services, password).seed();
  } finally {
    await composition.stop();
  }
  const accounts = demoPeople.map(({ role, name, email }) => ({ role, name, email, password }));
  process.stdout.write(`${JSON.stringify(accounts)}\n`);
}

main().catch((error: unknown) => {
  process.stderr.write(
    `${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
  );
  process.exit(1);
});
