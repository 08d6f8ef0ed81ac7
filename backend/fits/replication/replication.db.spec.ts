import { parse } from 'csv-parse/sync';
import pg from 'pg';
import type { Response } from 'supertest';
import yauzl from 'yauzl';
import { eventually } from '../../../db/testing/eventually';
import type { TestDatabase } from '../../../db/testing/test-database';
import { cautions, Evidence, type FitReply } from '../../contract';
import { ReplicationLineage, ReplicationResults } from '../../contract/replication';
import { join, signUp, type TestClient } from '../../testing/test-client';
import { importPanel, referencePanel, runFit, savePeers } from '../../testing/test-model';
import {
  createMigratedDatabase,
  startTestServer,
  type TestServer,
} from '../../testing/test-server';

/** The files of a zip by name, in its order. */
function unzip(bytes: Buffer): Promise<Map<string, string>> {
  return new Promise((resolve, reject) => {
    yauzl.fromBuffer(bytes, { lazyEntries: true }, (fault, zip) => {
      if (fault !== null) {
        reject(fault);
        return;
      }
      const files = new Map<string, string>();
      zip.on('error', reject);
      zip.on('end', () => {
        resolve(files);
      });
      zip.on('entry', (entry: yauzl.Entry) => {
        zip.openReadStream(entry, (error, stream) => {
          if (error !== null) {
            reject(error);
            return;
          }
          const parts: Buffer[] = [];
          stream.on('data', (part: Buffer) => parts.push(part));
          stream.on('end', () => {
            files.set(entry.fileName, Buffer.concat(parts).toString('utf8'));
            zip.readEntry();
          });
        });
      });
      zip.readEntry();
    });
  });
}

function download(client: TestClient, fitId: string): Promise<Response> {
  return Promise.resolve(
    client.agent
      .get(`/api/fits/${fitId}/replication`)
      .buffer(true)
      .parse((res, done) => {
        const parts: Buffer[] = [];
        res.on('data', (part: Buffer) => parts.push(part));
        res.on('end', () => {
          done(null, Buffer.concat(parts));
        });
      }),
  );
}

describe('the replication pack', () => {
  let database: TestDatabase;
  let server: TestServer;
  let admin: pg.Client;
  let analyst: TestClient;
  let reply: FitReply;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    analyst = await signUp(server, 'Replicated');
    const panel = `${referencePanel().replaceAll('C03', '=C03').trim()}\nS,1940,2,1,4\nS,1941,2,,4\n`;
    const version = await importPanel(analyst, panel);
    reply = await runFit(analyst, await savePeers(analyst, version, 'C06'));
    await eventually('evidence', async () => {
      const { body } = await analyst.get(`/api/fits/${reply.fit.id}/evidence`);
      return (body as { state: string }).state === 'ready';
    });
  });

  afterAll(async () => {
    await admin.end();
    await server.close();
    await database.drop();
  });

  it('is a zip of what it takes to compute the fit again', async () => {
    const response = await download(analyst, reply.fit.id);
    expect(response.status).toBe(200);
    expect(response.type).toBe('application/zip');
    expect(response.headers['content-disposition']).toBe(
      `attachment; filename=kinvale-fit-${(reply.fit.hash ?? '').slice(0, 8)}.zip`,
    );
    const files = await unzip(response.body as Buffer);
    expect([...files.keys()]).toEqual([
      'README.txt',
      'CAUTIONS.txt',
      'rows.csv',
      'results.json',
      'schema.json',
      'evidence.json',
      'lineage.json',
      'replication.R',
    ]);
    const text = (name: string): string => files.get(name) ?? '';
    for (const name of [...files.keys()].slice(1)) expect(text('README.txt')).toContain(name);
    for (const caution of cautions) expect(text('CAUTIONS.txt')).toContain(caution);
    expect(text('replication.R').length).toBeGreaterThan(1000);

    const results = ReplicationResults.parse(JSON.parse(text('results.json')));
    expect<unknown>(results.result).toEqual(reply.result);
    expect(results.specification).toEqual(
      jasmine.objectContaining({
        slopes: 'cr2',
        outcome: 'value',
        regressors: ['inv', 'capital'],
        ownCompany: 'C06',
      }),
    );
    expect(Evidence.parse(JSON.parse(text('evidence.json'))).hash).toBe(results.result.hash);
    const lineage = ReplicationLineage.parse(JSON.parse(text('lineage.json')));
    expect(lineage.fit.hash).toBe(results.result.hash);
    expect(lineage.importedFile.sha256).toMatch(/^[0-9a-f]{64}$/u);
    expect(lineage.peerGroupVersion.companies.length).toBe(11);
    expect(lineage.peerGroupVersion.companies[0].reason).toBe('In the reference set.');

    const [header, ...rows] = parse(text('rows.csv'));
    expect(header).toEqual(['company', 'year', 'value', 'inv', 'capital', 'file row', 'used']);
    expect(rows.length).toBe(221);
    expect(rows.filter(([company]) => company === "'=C03").length).toBe(20);
    expect(rows.filter((row) => row[6] === 'no').map(([company]) => company)).toEqual(['S']);
  });

  it('describes its results by a schema that names every member', async () => {
    const files = await unzip((await download(analyst, reply.fit.id)).body as Buffer);
    const schema = JSON.parse(files.get('schema.json') ?? '') as {
      $schema: string;
      required: string[];
      properties: { result: { properties: object } };
      $defs: { evidence: { properties: object } };
    };
    const results = JSON.parse(files.get('results.json') ?? '') as { result: object };
    const evidence = JSON.parse(files.get('evidence.json') ?? '') as object;
    expect(schema.$schema).toBe('https://json-schema.org/draft/2020-12/schema');
    expect(schema.required).toEqual(Object.keys(results));
    expect(Object.keys(schema.properties.result.properties)).toEqual(
      jasmine.arrayContaining(Object.keys(results.result)),
    );
    expect(Object.keys(schema.$defs.evidence.properties)).toEqual(
      jasmine.arrayContaining(Object.keys(evidence)),
    );
  });

  it('has the same bytes each time, and the record says who took it', async () => {
    const [first, second] = [
      await download(analyst, reply.fit.id),
      await download(analyst, reply.fit.id),
    ];
    expect((first.body as Buffer).equals(second.body as Buffer)).toBeTrue();
    const cfo = await join(server, analyst, ['cfo']);
    expect((await download(cfo, reply.fit.id)).status).toBe(200);
    const taken = await admin.query<{ name: string; hash: string }>(
      `select person.name, detail ->> 'hash' as hash from activity
        join person on person.id = activity.person_id
        where action = 'fit-exported' and subject_id = $1 order by at desc limit 1`,
      [reply.fit.id],
    );
    expect(taken.rows).toEqual([{ name: 'cfo', hash: reply.fit.hash ?? '' }]);
  });

  it('is refused for a fit without a result', async () => {
    const { rows } = await admin.query<{ id: string }>(
      `insert into fit (workspace_id, id, panel_version_id, peer_group_id, specification,
          specification_key, state, created_by)
        select workspace_id, gen_random_uuid(), panel_version_id, peer_group_id, specification,
          'cancelled', 'cancelled', created_by
        from fit where id = $1 returning id`,
      [reply.fit.id],
    );
    expect((await analyst.get(`/api/fits/${rows[0].id}/replication`)).status).toBe(409);
  });

  it('waits for the evidence, and says why where there is none', async () => {
    const { rows } = await admin.query<{ id: string }>(
      `insert into fit (workspace_id, id, panel_version_id, peer_group_id, specification,
          specification_key, state, hash, result, created_by)
        select workspace_id, gen_random_uuid(), panel_version_id, peer_group_id, specification,
          'waits', state, hash, result, created_by
        from fit where id = $1 returning id`,
      [reply.fit.id],
    );
    const [{ id }] = rows;
    const refused = await analyst.get(`/api/fits/${id}/replication`);
    expect(refused.status).toBe(409);
    expect(refused.body).toEqual(
      jasmine.objectContaining({
        detail:
          'The evidence of this fit is still being computed: export the pack when it is there.',
      }),
    );
    await admin.query(
      `insert into fit_evidence (workspace_id, fit_id, failure)
        select workspace_id, id, 'It does not fit into memory.' from fit where id = $1`,
      [id],
    );
    const files = await unzip((await download(analyst, id)).body as Buffer);
    expect([...files.keys()]).not.toContain('evidence.json');
    expect(files.get('README.txt')).toContain(
      'evidence.json is not in this pack. It does not fit into memory.',
    );
  });

  it('is not recorded as taken where only its head was asked for', async () => {
    const taken = async (): Promise<number> =>
      (await admin.query(`select from activity where action = 'fit-exported'`)).rowCount ?? 0;
    const before = await taken();
    const head = await analyst.agent.head(`/api/fits/${reply.fit.id}/replication`);
    expect(head.status).toBe(200);
    expect(head.type).toBe('application/zip');
    expect(await taken()).toBe(before);
  });

  it('ends quietly where its reader goes away', async () => {
    const before = server.log.length;
    const said = (): string => server.log.slice(before).join('');
    // The pack waits for its rows while the reader leaves.
    await admin.query('begin');
    await admin.query('lock table panel_row in access exclusive mode');
    const request = analyst.agent.get(`/api/fits/${reply.fit.id}/replication`);
    request.end(() => undefined);
    await eventually('a pack that waits', async () => {
      const waiting = await admin.query(
        `select from pg_locks where not granted and relation = 'panel_row'::regclass`,
      );
      return waiting.rowCount !== 0;
    });
    request.abort();
    await admin.query('commit');
    const isSaid = await eventually('a word of it', () =>
      said().includes('a download was broken off'),
    );
    expect(isSaid).toBeTrue();
    expect(said()).not.toContain('unexpected error');
  });
});
