/** `npm start`: everything a fresh machine needs, up to a running Kinvale. See DEVELOPERS.md. */
import { existsSync } from 'node:fs';
import { mkdir, readFile, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { buildWhenChanged } from './build-when-changed.mjs';
import { launch } from './child-process.mjs';
import { ensureRolesAndDatabase } from './database-roles.mjs';
import { requirePort } from './free-port.mjs';
import { localSecrets } from './local-secrets.mjs';
import { ensureNodePackages } from './node-packages.mjs';
import { ensurePostgres, openCluster } from './pg.mjs';
import { Interrupted, PlainFailure, inOneSentence } from './plain-failure.mjs';
import {
  lastWords,
  launchServer,
  launchSmtpStub,
  launchStripeStub,
  migrate,
  seedDemo,
} from './stack.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const home = join(root, '.kinvale');
const isProduction = process.env.NODE_ENV === 'production';

const began = Date.now();
const say = (text) =>
  console.log(`[${((Date.now() - began) / 1000).toFixed(1).padStart(5)} s] ${text}`);

const interruption = new AbortController();
const { signal } = interruption;
for (const name of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
  process.on(name, () => {
    if (!signal.aborted) say('Stopping');
    interruption.abort();
  });
}

/** What to undo at the end, last first. */
const undo = [];

try {
  await (isProduction ? startProduction() : startLocal());
} catch (error) {
  if (!(error instanceof Interrupted)) {
    console.error(`\n${inOneSentence(error)}`);
    process.exitCode = 1;
  }
} finally {
  for (const step of undo.reverse()) {
    await step().catch((error) => {
      console.error(inOneSentence(error));
      process.exitCode = 1;
    });
  }
}
process.exit();

async function startLocal() {
  await mkdir(home, { recursive: true, mode: 0o711 }); // others pass through to the cluster, and read nothing
  await holdFolder();
  const port = await requirePort('127.0.0.1', process.env.PORT || '4300');
  await ensureNodePackages(root, { say, signal });
  const secrets = await localSecrets(home);
  const databaseUrls = await database(secrets);
  await buildWhenChanged(root, { say, signal });
  throwIfInterrupted();

  const stub = await launchStripeStub(root, {
    stateFile: join(home, 'stripe.json'),
    env: process.env,
  });
  undo.push(stub.stop);
  const mail = await launchSmtpStub(root, { env: process.env });
  undo.push(mail.stop);
  const url = `http://127.0.0.1:${port}`;
  const env = {
    ...process.env,
    ...databaseUrls,
    KINVALE_MODE: 'local',
    HOST: '127.0.0.1',
    PORT: String(port),
    PUBLIC_URL: url,
    SESSION_SECRET: process.env.SESSION_SECRET ?? secrets.sessionSecret,
    STRIPE_API_URL: stub.url,
    STRIPE_SECRET_KEY: 'sk_test_local_stub_only',
    SMTP_URL: mail.url,
    MAIL_FROM: 'kinvale@kinvale.example',
  };
  say('Bringing the database to its version');
  await migrate(root, env, signal);
  say('Starting the server');
  const log = join(home, 'server.log');
  const server = await launchServer(root, { url, log, env, signal });
  undo.push(server.stop);
  say('Filling the demo workspace, if it is new');
  const accounts = await seedDemo(root, env, signal);
  say(`Kinvale is ready: ${url}\n`);
  for (const { role, email, password } of accounts) {
    console.log(`  ${role.padEnd(14)} ${email.padEnd(34)} ${password}`);
  }
  console.log(`\nMail that it sends goes no further than ${mail.page}`);
  console.log('Ctrl-C stops it; the data stay.');
  await untilOneEnds([
    { name: 'The server', exited: server.exited, log },
    { name: 'The payment stub', exited: stub.exited },
    { name: 'The mail stub', exited: mail.exited },
  ]);
}

/** Production brings its own database, payment service and secrets; the server names what is missing. */
async function startProduction() {
  await ensureNodePackages(root, { say, signal });
  await buildWhenChanged(root, { say, signal });
  if (process.env.DATABASE_URL && process.env.MIGRATION_DATABASE_URL) {
    say('Bringing the database to its version');
    await migrate(root, process.env, signal);
  }
  throwIfInterrupted();
  const server = launch(process.execPath, ['--enable-source-maps', 'dist/backend/main.js'], {
    cwd: root,
    env: process.env,
  });
  undo.push(server.stop);
  await untilOneEnds([{ name: 'The server', exited: server.exited }]);
}

/** The URLs given by the environment, or those of the private cluster. */
async function database(secrets) {
  const { DATABASE_URL, MIGRATION_DATABASE_URL } = process.env;
  if (DATABASE_URL && MIGRATION_DATABASE_URL) return { DATABASE_URL, MIGRATION_DATABASE_URL };
  if (DATABASE_URL || MIGRATION_DATABASE_URL) {
    throw new PlainFailure(
      'DATABASE_URL (the application role) and MIGRATION_DATABASE_URL (the owner) belong together: set both, or neither for a private database.',
    );
  }
  await ensurePostgres(say);
  throwIfInterrupted();
  say('Starting the database');
  const cluster = await openCluster(join(home, 'postgres'), { say });
  undo.push(cluster.stop);
  const roles = {
    owner: { name: 'kinvale_owner', password: secrets.ownerPassword },
    app: { name: 'kinvale_app', password: secrets.appPassword },
  };
  await ensureRolesAndDatabase(cluster.adminUrl, { database: 'kinvale', ...roles });
  const url = ({ name, password }) => cluster.url(name, password, 'kinvale');
  return { DATABASE_URL: url(roles.app), MIGRATION_DATABASE_URL: url(roles.owner) };
}

/** Two starts in one folder would share a cluster, and the first to stop would take it from the other. */
async function holdFolder() {
  const file = join(home, 'start.pid');
  const holder = existsSync(file) ? Number(await readFile(file, 'utf8')) : undefined;
  if (holder !== undefined && holder !== process.pid && (await isStart(holder))) {
    throw new PlainFailure(
      `Kinvale already runs from this folder (process ${holder}): stop it first.`,
    );
  }
  await writeFile(file, String(process.pid));
  undo.push(() => rm(file, { force: true }));
}

async function isStart(pid) {
  const command = await readFile(`/proc/${pid}/cmdline`, 'utf8').catch((error) => {
    if (['ENOENT', 'ESRCH'].includes(error.code)) return '';
    throw error;
  });
  return command.includes('tools/start.mjs');
}

/** @throws {PlainFailure} when one of the processes ends though nobody asked to stop. */
async function untilOneEnds(processes) {
  const stopped = new Promise((resolve) => {
    if (signal.aborted) resolve(undefined);
    signal.addEventListener('abort', () => resolve(undefined), { once: true });
  });
  const ended = processes.map(async (it) => ({ ...it, ...(await it.exited) }));
  const first = await Promise.race([stopped, ...ended]);
  if (first === undefined || signal.aborted) return;
  const words = first.log === undefined ? '' : `: ${await lastWords(first.log)}`;
  throw new PlainFailure(`${first.name} ended by itself with ${first.status}${words}.`);
}

function throwIfInterrupted() {
  if (signal.aborted) throw new Interrupted('start');
}
