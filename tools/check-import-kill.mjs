/**
 * Ends the server at once (SIGKILL) at a random moment of each of 20 imports and shows that every one of them leaves
 * all of its rows or none, and is one panel version in the end: `npm run check-import-kill`.
 */
import { fileURLToPath } from 'node:url';
import { setTimeout as wait } from 'node:timers/promises';
import pg from 'pg';
import { ImportClient } from './bench/import-client.ts';
import { inventedPanelCsv, inventedPanelMapping } from '../backend/testing/invented-panel.ts';
import { openImportServer } from './bench/import-server.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const imports = 20;
const rows = 40_000;
/** The last moment at which the server is killed: about as long as a commit of these rows takes. */
const longestMs = 1500;
/** Longest that the database may take to notice that a server is gone: a statement's own limit and more. */
const longestNoticeMs = 150_000;

const server = await openImportServer(root);
const admin = new pg.Client({ connectionString: server.adminUrl });
try {
  await admin.connect();
  const csv = inventedPanelCsv(rows);
  const begun = [];
  for (let number = 1; number <= imports; number++) {
    const client = new ImportClient(server.url); // a workspace each: one may not have many under way
    await client.signUp();
    const id = await client.upload(csv);
    await client.check(id, inventedPanelMapping('Panel'));
    await client.commit(id);
    const afterMs = Math.round(Math.random() * longestMs);
    await wait(afterMs);
    await server.kill();
    await databaseNoticed();
    begun.push({ client, id });
    console.log(`import ${number}, killed after ${afterMs} ms: ${await stateOf(id)}`);
    await server.start();
  }
  for (const { client, id } of begun) await client.committed(id);
  for (const { id } of begun) await expectOneVersion(id);
  console.log(`All ${imports} imports are one panel version each, with ${rows} rows.`);
} finally {
  await admin.end();
  await server.stop();
}

/**
 * A session whose client is gone ends with its statement.
 *
 * @throws {Error} naming what a session still does when it does not.
 */
async function databaseNoticed() {
  for (const until = Date.now() + longestNoticeMs; ;) {
    const { rows: sessions } = await admin.query(`select application_name, state, query
      from pg_stat_activity where datname = current_database() and pid <> pg_backend_pid()`);
    if (sessions.length === 0) return;
    if (Date.now() > until) {
      const [{ application_name: name, state, query }] = sessions;
      throw new Error(
        `${sessions.length} sessions of the killed server are still there after ${longestNoticeMs / 1000} s; ${name} is ${state}: ${query.slice(0, 200)}`,
      );
    }
    await wait(20);
  }
}

/** @throws {Error} when the import left a part of its rows. */
async function stateOf(id) {
  const { state, versions, written } = await lookAt(id);
  const isWhole = versions === 1 && written === rows && state === 'committed';
  const isNothing = versions === 0 && written === 0 && state === 'committing';
  if (!isWhole && !isNothing)
    throw new Error(`${state} with ${versions} versions and ${written} rows of ${rows}`);
  return isWhole ? 'all rows are there' : 'no row is there';
}

/** @throws {Error} when the import was not made a version, or more than once. */
async function expectOneVersion(id) {
  const { state, versions, written } = await lookAt(id);
  if (state !== 'committed' || versions !== 1 || written !== rows)
    throw new Error(`${state} with ${versions} versions and ${written} rows of ${rows}`);
}

async function lookAt(id) {
  const { rows: found } = await admin.query(
    `select state,
      (select count(*)::integer from panel_version as version
        where version.workspace_id = draft.workspace_id) as versions,
      (select count(*)::integer from panel_row as line
        where line.workspace_id = draft.workspace_id) as written
    from import_draft as draft where id = $1`,
    [id],
  );
  return found[0];
}
