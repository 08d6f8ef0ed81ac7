/** The built server on a database of its own, for programs that measure imports or end the server in their midst. */
import { randomBytes } from 'node:crypto';
import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import { run } from '../child-process.mjs';
import { ensureRolesAndDatabase } from '../database-roles.mjs';
import { freePort } from '../free-port.mjs';
import { openTemporaryCluster } from '../pg.mjs';
import { launchServer, migrate } from '../stack.mjs';

/**
 * Builds the server, makes a database and starts the server on it over plain http.
 *
 * @returns `url` of the server; `adminUrl` of the database; `kill` ends the server at once and `start` starts it again
 *   on the same address; `stop` ends everything and removes the database.
 */
export async function openImportServer(root) {
  await run(process.execPath, [join('tools', 'build-backend.mjs')], { cwd: root });
  const cluster = await openTemporaryCluster();
  const [owner, app] = ['owner', 'app'].map((name) => ({
    name: `kinvale_${name}`,
    password: randomBytes(16).toString('hex'),
  }));
  const database = 'kinvale';
  await ensureRolesAndDatabase(cluster.adminUrl, { database, owner, app });
  const port = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const env = {
    ...process.env,
    KINVALE_MODE: 'local',
    NODE_ENV: 'development',
    HOST: '127.0.0.1',
    PORT: String(port),
    PUBLIC_URL: url,
    SESSION_SECRET: randomBytes(32).toString('base64url'),
    DATABASE_URL: cluster.url(app.name, app.password, database),
    MIGRATION_DATABASE_URL: cluster.url(owner.name, owner.password, database),
    STRIPE_API_URL: 'http://127.0.0.1:9', // nobody answers: no bill is part of an import
    STRIPE_SECRET_KEY: 'sk_test_imports_only',
    KINVALE_MAIL: 'off',
  };
  await migrate(root, env);
  await mkdir(join(root, '.kinvale'), { recursive: true, mode: 0o711 });
  const log = join(root, '.kinvale', 'import-server.log');
  const start = () => launchServer(root, { url, log, env });
  let server = await start();
  const adminUrl = new URL(cluster.adminUrl);
  adminUrl.pathname = `/${database}`;
  return {
    url,
    adminUrl: adminUrl.href,
    start: async () => {
      server = await start();
    },
    kill: async () => {
      server.child.kill('SIGKILL');
      await server.exited;
    },
    stop: async () => {
      await server.stop();
      await cluster.stop();
    },
  };
}
