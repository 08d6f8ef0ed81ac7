/**
 * `npm test`: installs what is missing, then runs every suite, or those named (`npm test -- unit db`). Goes on after
 * a failure; the last line is `N passed, N failed`.
 */
import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { ensureNodePackages } from './node-packages.mjs';
import { ensurePostgres, openTemporaryCluster } from './pg.mjs';
import { Interrupted, inOneSentence } from './plain-failure.mjs';
import { runSuites } from './run-suites.mjs';
import { chosenSuites, suites } from './suites.mjs';
import { installPackages } from './system-packages.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const say = (text) => console.log(text);
const interruption = new AbortController();
const { signal } = interruption;
for (const name of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(name, () => interruption.abort());

let cluster;
try {
  const chosen = choose(process.argv.slice(2));
  const needed = new Set(chosen.flatMap(({ needs = [] }) => needs));
  await ensureNodePackages(root, { say, signal });
  if (needed.has('postgres')) await ensurePostgres(say);
  if (needed.has('chromium') && !existsSync('/usr/bin/chromium')) {
    await installPackages(['chromium'], 'Chromium', say);
  }
  const { passed, failed } = await runSuites(root, chosen, { envOf, signal });
  process.exitCode = failed === 0 ? 0 : 1;
  await cluster?.stop();
  cluster = undefined;
  console.log(`\n${passed} passed, ${failed} failed`);
} catch (error) {
  if (!(error instanceof Interrupted)) console.error(inOneSentence(error));
  process.exitCode = 1;
} finally {
  await cluster?.stop();
}
process.exit();

function choose(names) {
  const unknown = names.filter((name) => !suites.some((suite) => suite.name === name));
  if (unknown.length > 0) {
    console.error(
      `No suite ${unknown.join(', ')}; there are ${suites.map(({ name }) => name).join(', ')}.`,
    );
    process.exit(2);
  }
  return names.length === 0 ? chosenSuites() : chosenSuites(names);
}

/** Specs see nothing of the developer's own settings, and those of the database a cluster that may be broken. */
async function envOf({ name }) {
  const { DATABASE_URL, MIGRATION_DATABASE_URL, NODE_ENV, KINVALE_MODE, ...env } = process.env;
  void [DATABASE_URL, MIGRATION_DATABASE_URL, NODE_ENV, KINVALE_MODE];
  const plain = { ...env, NO_COLOR: '1', NG_CLI_ANALYTICS: 'false', CI: '1' };
  if (name !== 'db') return plain;
  cluster ??= await openTemporaryCluster();
  return { ...plain, KINVALE_TEST_CLUSTER: cluster.adminUrl };
}
