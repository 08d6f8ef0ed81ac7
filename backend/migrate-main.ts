import { migrate } from '../db/migrate';
import { installQueue, queueSchema } from './jobs/install-queue';

/** Migrates the database of MIGRATION_DATABASE_URL for the role that DATABASE_URL signs in with. */
async function main(): Promise<void> {
  const ownerUrl = process.env['MIGRATION_DATABASE_URL'];
  const appUrl = process.env['DATABASE_URL'];
  if (ownerUrl === undefined || appUrl === undefined)
    throw new Error('MIGRATION_DATABASE_URL and DATABASE_URL are needed to migrate');
  const done = await migrate({
    ownerUrl,
    appRole: decodeURIComponent(new URL(appUrl).username),
    packaged: { schema: queueSchema, install: installQueue },
  });
  process.stdout.write(
    done.length === 0 ? 'database is up to date\n' : `migrated: ${done.join(', ')}\n`,
  );
}

main().catch((error: unknown) => {
  const cause = error instanceof Error && error.cause instanceof Error ? error.cause : error;
  process.stderr.write(`${cause instanceof Error ? cause.message : String(cause)}\n`);
  process.exitCode = 1;
});
