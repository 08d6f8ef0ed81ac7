/**
 * Measures how long a commit takes, from the request to `committed`, against a bare COPY of the same CSV file into a
 * table without keys: `npm run bench:import`. Medians of interleaved rounds on one database; the ratio is what counts.
 */
import { Buffer } from 'node:buffer';
import { performance } from 'node:perf_hooks';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { fileURLToPath } from 'node:url';
import pg from 'pg';
import { from as copyFrom } from 'pg-copy-streams';
import { ImportClient } from './bench/import-client.ts';
import { inventedPanelCsv, inventedPanelMapping } from '../backend/testing/invented-panel.ts';
import { openImportServer } from './bench/import-server.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const sizes = [100_000, 200_000];
const rounds = 5;
const aim = 10;

const server = await openImportServer(root);
const admin = new pg.Client({ connectionString: server.adminUrl });
try {
  await admin.connect();
  console.log(
    ['rows', 'upload ms', 'check ms', 'commit ms', 'bare COPY ms', 'commit / COPY']
      .map((head) => head.padStart(14))
      .join(''),
  );
  for (const rows of sizes) console.log((await measure(rows)).map(cell).join(''));
  console.log(`Aims: a commit at most ${aim} bare COPYs; 100,000 rows well below 10 s.`);
} finally {
  await admin.end();
  await server.stop();
}

async function measure(rows) {
  const csv = inventedPanelCsv(rows);
  const client = new ImportClient(server.url);
  await client.signUp();
  const times = { upload: [], check: [], commit: [], copy: [] };
  for (let round = -1; round < rounds; round++) {
    const found = await timeImport(client, csv, `Panel ${rows} ${round}`);
    const copy = await timed(() => bareCopy(csv));
    if (round < 0) continue; // the first one warms up
    for (const [name, time] of Object.entries({ ...found, copy })) times[name].push(time);
  }
  const [upload, check, commit, copy] = Object.values(times).map(median);
  return [rows, upload, check, commit, copy, commit / copy];
}

async function timeImport(client, csv, panelName) {
  let id;
  const upload = await timed(async () => {
    id = await client.upload(csv);
  });
  const check = await timed(() => client.check(id, inventedPanelMapping(panelName)));
  const commit = await timed(async () => {
    await client.commit(id);
    await client.committed(id);
  });
  return { upload, check, commit };
}

async function bareCopy(csv) {
  await admin.query(`drop table if exists bare_copy`);
  await admin.query(`create table bare_copy (company text, year integer,
    market_value double precision, capex double precision, book_equity double precision)`);
  const copying = copyFrom('copy bare_copy from stdin (format csv, header true)');
  await pipeline(Readable.from([Buffer.from(csv)]), admin.query(copying));
}

async function timed(work) {
  const start = performance.now();
  await work();
  return performance.now() - start;
}

function median(values) {
  return values.toSorted((one, other) => one - other)[Math.floor(values.length / 2)];
}

function cell(value) {
  return (value >= 100 ? value.toFixed(0) : value.toPrecision(3)).padStart(14);
}
