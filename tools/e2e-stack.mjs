/**
 * The built Kinvale for the browser journeys: a database of its own, HTTPS with a certificate made now, production
 * settings, the demo workspace filled on request. Prints one JSON line when it is ready; ends with its stdin.
 */
import { randomBytes } from 'node:crypto';
import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { generate } from 'selfsigned';
import { ensureRolesAndDatabase } from './database-roles.mjs';
import { freePort } from './free-port.mjs';
import { openTemporaryCluster } from './pg.mjs';
import { Interrupted, inOneSentence } from './plain-failure.mjs';
import {
  lastWords,
  launchServer,
  launchSmtpStub,
  launchStripeStub,
  migrate,
  seedDemo,
} from './stack.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const interruption = new AbortController();
const { signal } = interruption;
const asked = new Promise((resolve) => {
  const stop = () => {
    interruption.abort();
    resolve(undefined);
  };
  process.stdin.on('end', stop).on('close', stop).resume();
  for (const name of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(name, stop);
});

const undo = [];
try {
  await serve();
} catch (error) {
  if (!(error instanceof Interrupted)) {
    console.error(inOneSentence(error));
    process.exitCode = 1;
  }
} finally {
  for (const step of undo.reverse()) await step();
}
process.exit();

async function serve() {
  const folder = await mkdtemp(join(tmpdir(), 'kinvale-journeys-'));
  undo.push(() => rm(folder, { recursive: true, force: true }));
  const cluster = await openTemporaryCluster();
  undo.push(() => cluster.stop());
  const owner = { name: 'kinvale_owner', password: randomBytes(16).toString('hex') };
  const app = { name: 'kinvale_app', password: randomBytes(16).toString('hex') };
  await ensureRolesAndDatabase(cluster.adminUrl, { database: 'kinvale', owner, app });
  const stub = await launchStripeStub(root, {
    stateFile: join(folder, 'stripe.json'),
    env: process.env,
  });
  undo.push(stub.stop);
  const mail = await launchSmtpStub(root, { env: process.env });
  undo.push(mail.stop);

  const port = await freePort();
  const url = `https://127.0.0.1:${port}`;
  const env = {
    ...process.env,
    NODE_ENV: 'production',
    HOST: '127.0.0.1',
    PORT: String(port),
    PUBLIC_URL: url,
    ...(await certificate(folder)),
    SESSION_SECRET: randomBytes(32).toString('base64url'),
    DATABASE_URL: cluster.url(app.name, app.password, 'kinvale'),
    MIGRATION_DATABASE_URL: cluster.url(owner.name, owner.password, 'kinvale'),
    STRIPE_API_URL: stub.url,
    STRIPE_SECRET_KEY: 'sk_test_journeys_stub_only',
    SMTP_URL: mail.url,
    MAIL_FROM: 'kinvale@kinvale.example',
  };
  await migrate(root, env, signal);
  await mkdir(join(root, '.kinvale'), { recursive: true, mode: 0o711 });
  const log = join(root, '.kinvale', 'journeys-server.log'); // stays for whoever looks into a failed journey
  const server = await launchServer(root, { url, log, env, signal });
  undo.push(server.stop);
  const accounts = await seedDemo(root, { ...env, KINVALE_SEED_DEMO: '1' }, signal);
  const adminUrl = new URL(cluster.adminUrl);
  adminUrl.pathname = '/kinvale';
  console.log(
    JSON.stringify({
      url,
      stubUrl: stub.url,
      mailUrl: mail.page,
      adminUrl: adminUrl.href,
      accounts,
    }),
  );

  const ended = await Promise.race([asked, server.exited, stub.exited, mail.exited]);
  if (ended === undefined || signal.aborted) return;
  console.error(`Server or a stub ended with ${ended.status}: ${await lastWords(log)}`);
  process.exitCode = 1;
}

async function certificate(folder) {
  const names = [
    { type: 7, ip: '127.0.0.1' },
    { type: 2, value: 'localhost' },
  ];
  const made = await generate([{ name: 'commonName', value: '127.0.0.1' }], {
    keySize: 2048,
    algorithm: 'sha256',
    extensions: [{ name: 'subjectAltName', altNames: names }],
  });
  const [cert, key] = [join(folder, 'cert.pem'), join(folder, 'key.pem')];
  await writeFile(cert, made.cert);
  await writeFile(key, made.private, { mode: 0o600 });
  return { HTTPS_CERT: cert, HTTPS_KEY: key };
}
