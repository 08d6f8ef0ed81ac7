/**
 * Holds stored editions to the hashes recorded when they were published and signed: `npm run verify-edition` for all,
 * `npm run verify-edition -- 3` for those with this number. Exits 1 where one was changed, and names it. Looks into the
 * database of `npm start`, or into VERIFY_DATABASE_URL: the address of a role that reads all workspaces.
 */
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { verifyEditions } from './editions/verify-editions';
import { openCluster } from './pg.mjs';
import { PlainFailure } from './plain-failure.mjs';

const home = fileURLToPath(new URL('../.kinvale', import.meta.url));
const [asked] = process.argv.slice(2);
let cluster;
try {
  if (asked !== undefined && !/^\d+$/.test(asked))
    throw new PlainFailure(`expected the number of an edition; found ${asked}`);
  const editions = await verifyEditions(
    await databaseUrl(),
    asked === undefined ? undefined : Number(asked),
  );
  for (const { workspace, number, state, sha256, fault } of editions)
    console.log(
      `${fault === null ? 'unchanged' : 'CHANGED  '}  ${workspace}, edition ${number}, ${state}, ${sha256}${fault === null ? '' : `\n           ${fault}`}`,
    );
  const changed = editions.filter(({ fault }) => fault !== null).length;
  console.log(`${editions.length} looked at, ${changed} changed`);
  if (editions.length === 0) throw new PlainFailure('There is no such edition.');
  process.exitCode = changed === 0 ? 0 : 1;
} catch (error) {
  if (!(error instanceof PlainFailure)) throw error;
  console.error(error.message);
  process.exitCode = 2;
} finally {
  if (cluster !== undefined && !cluster.wasRunning) await cluster.stop();
}

async function databaseUrl() {
  const given = process.env.VERIFY_DATABASE_URL;
  if (given) return given;
  const folder = join(home, 'postgres');
  if (!existsSync(home))
    throw new PlainFailure(
      'There is no local database yet: run npm start once, or set VERIFY_DATABASE_URL.',
    );
  cluster = await openCluster(folder, { say: (text) => console.error(text) });
  const admin = new URL(cluster.adminUrl);
  admin.pathname = '/kinvale';
  return admin.href;
}
