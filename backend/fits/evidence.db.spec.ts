import { randomUUID } from 'node:crypto';
import pg from 'pg';
import { eventually } from '../../db/testing/eventually';
import type { TestDatabase } from '../../db/testing/test-database';
import { type CovarianceSummary, EvidenceReply, FitReply, LineageReply } from '../contract';
import { signUp, type TestClient } from '../testing/test-client';
import { importPanel, referenceMapping, runFit, savePeers } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

type Ready = Extract<EvidenceReply, { state: 'ready' }>;

/** Companies × 20 years of made-up figures, from a linear congruential generator. */
function madeUpPanel(companies: number): string {
  let state = 7;
  const draw = (): number => (state = (state * 1_103_515_245 + 12_345) % 2 ** 31) / 2 ** 31;
  const lines = ['company,year,value,inv,capital'];
  for (let company = 0; company < companies; company++)
    for (let year = 2000; year < 2020; year++) {
      const [inv, capital] = [10 + 50 * draw(), 100 + 400 * draw()];
      const value = 2 * inv + 0.5 * capital + 100 * draw() + company;
      lines.push(`F${company},${year},${value},${inv},${capital}`);
    }
  return lines.join('\n');
}

describe('the evidence of a fit', () => {
  let database: TestDatabase;
  let server: TestServer;
  let admin: pg.Client;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
  });

  afterAll(async () => {
    await admin.end();
    await server.close();
    await database.drop();
  });

  async function read(client: TestClient, fitId: string): Promise<EvidenceReply> {
    const reply = await client.get(`/api/fits/${fitId}/evidence`);
    expect(reply.status).toBe(200);
    return EvidenceReply.parse(reply.body);
  }

  function readWhen(
    client: TestClient,
    fitId: string,
    isWanted: (reply: EvidenceReply) => boolean,
  ): Promise<EvidenceReply> {
    return eventually('evidence as wanted', async () => {
      const found = await read(client, fitId);
      return isWanted(found) ? found : undefined;
    });
  }

  async function fitEnds(client: TestClient, fitId: string, state: string): Promise<void> {
    const found = await eventually('the end of a fit', async () => {
      const { fit } = (await client.get(`/api/fits/${fitId}`)).body as FitReply;
      return ['queued', 'running'].includes(fit.state) ? undefined : fit.state;
    });
    expect(found).toBe(state);
  }

  const isReady = ({ state }: EvidenceReply): boolean => state === 'ready';
  const hasEnded = (reply: EvidenceReply): boolean =>
    reply.state === 'ready' && !['queued', 'running'].includes(reply.bootstrap?.state ?? '');

  async function fitted(
    name: string,
    panel?: string,
  ): Promise<{ client: TestClient; reply: FitReply }> {
    const client = await signUp(server, name);
    const version = await importPanel(client, panel, referenceMapping);
    const own = panel === undefined ? 'C06' : 'F0';
    const reply = await runFit(client, await savePeers(client, version, own));
    expect(reply.fit.state).toBe('done');
    return { client, reply };
  }

  const wildOf = (reply: EvidenceReply): CovarianceSummary | undefined =>
    (reply as Ready).evidence.covariances.find(({ code }) => code === 'wild');

  it('follows its result, without being asked for', async () => {
    const { client, reply } = await fitted('Evidence');
    const found = (await readWhen(client, reply.fit.id, isReady)) as Ready;
    expect(found.evidence.hash).toBe(reply.fit.hash ?? '');
    expect(found.evidence.covariances.length).toBe(11);
    expect(found.bootstrap).toBeNull();
    expect(wildOf(found)?.slopes).withContext('11 companies: every sign vector').not.toBeNull();
    const path = `/api/fits/${reply.fit.id}/bootstrap`;
    expect((await client.post(path, { seed: 1 })).status)
      .withContext('a bootstrap would add nothing')
      .toBe(409);
    expect((await client.delete(path)).status).toBe(409);
  });

  it('is computed by the next try where a server died while it computed it', async () => {
    const { client, reply } = await fitted('Interrupted');
    await readWhen(client, reply.fit.id, isReady);
    const { rows } = await admin.query<{ workspace_id: string }>(
      'delete from fit_evidence where fit_id = $1 returning workspace_id',
      [reply.fit.id],
    );
    expect((await read(client, reply.fit.id)).state).toBe('computing');
    const state = (await client.get(`/api/fits/${reply.fit.id}/evidence/state`)).body;
    expect(state).toEqual({ state: 'computing', bootstrap: null });
    const early = await client.post(`/api/fits/${reply.fit.id}/bootstrap`, {});
    expect(early.status).toBe(409);
    expect(early.body).toEqual(
      jasmine.objectContaining({
        detail:
          'The evidence of this fit is still being computed. Start the bootstrap when it is there.',
      }),
    );
    const ticketId = randomUUID();
    await admin.query(
      `insert into job_ticket (id, workspace_id, kind, subject_id) values ($1, $2, 'evidence', $3)`,
      [ticketId, rows[0].workspace_id, reply.fit.id],
    );
    await admin.query(`insert into pgboss.job (name, data) values ('evidence', $1)`, [
      { ticketId },
    ]);
    const found = (await readWhen(client, reply.fit.id, isReady)) as Ready;
    expect(found.evidence.hash).toBe(reply.fit.hash ?? '');
  });

  it('keeps no fit waiting', async () => {
    const client = await signUp(server, 'Held up');
    const group = await savePeers(client, await importPanel(client), 'C06');
    // What computes evidence looks first whether there is some: it waits here.
    await admin.query('begin');
    await admin.query('lock table fit_evidence in access exclusive mode');
    for (const slopes of ['cr2', 'cr1', 'hc3']) {
      const started = (await client.post('/api/fits', { peerGroupId: group, slopes }))
        .body as FitReply;
      await fitEnds(client, started.fit.id, 'done');
    }
    await admin.query('commit');
  });

  it('is not queued for a fit that was cancelled', async () => {
    const client = await signUp(server, 'Cancelled fit');
    const group = await savePeers(client, await importPanel(client), 'C06');
    await admin.query('begin');
    await admin.query('lock table panel_row in access exclusive mode');
    const started = (await client.post('/api/fits', { peerGroupId: group })).body as FitReply;
    expect((await client.delete(`/api/fits/${started.fit.id}`)).status).toBe(204);
    await admin.query('commit');
    await fitEnds(client, started.fit.id, 'cancelled');
    const { fit } = await runFit(client, group);
    expect((await readWhen(client, fit.id, isReady)).state).toBe('ready');
    const tickets = await admin.query(
      `select from job_ticket where kind = 'evidence' and subject_id = $1`,
      [started.fit.id],
    );
    expect(tickets.rowCount).toBe(0);
    expect((await read(client, started.fit.id)).state).toBe('unavailable');
  });

  it('is not there for a fit of an earlier engine, which is still read', async () => {
    const { client, reply } = await fitted('Earlier');
    const { rows } = await admin.query<{ id: string }>(
      `insert into fit (workspace_id, id, panel_version_id, peer_group_id, specification,
          specification_key, state, hash, result, created_by)
        select workspace_id, gen_random_uuid(), panel_version_id, peer_group_id, specification,
          'earlier', state, hash, (result - 'smearing') || '{"engine": "1.0.1"}', created_by
        from fit where id = $1 returning id`,
      [reply.fit.id],
    );
    const [{ id }] = rows;
    expect(await read(client, id)).toEqual({
      state: 'unavailable',
      reason: 'Made by engine 1.0.1, which wrote no evidence: fit again.',
    });
    const earlier = FitReply.parse((await client.get(`/api/fits/${id}`)).body);
    expect(earlier.result?.smearing).toBeNull();
    expect(earlier.fit.effects).toBe('company');
    expect((await client.post(`/api/fits/${id}/bootstrap`, {})).status).toBe(409);
  });

  it('is not there for a fit that failed', async () => {
    const client = await signUp(server, 'Failed');
    const lines = ['company,year,value,inv,capital'];
    for (const company of ['A', 'B'])
      for (let year = 2000; year < 2010; year++)
        lines.push(`${company},${year},${year % 3},${year % 7},${2 * (year % 7)}`);
    const version = await importPanel(client, lines.join('\n'));
    const { fit } = await runFit(client, await savePeers(client, version, 'A'));
    expect(fit.state).toBe('failed');
    expect((await read(client, fit.id)).state).toBe('unavailable');
  });

  it('takes up a bootstrap that is asked for, the same seed once', async () => {
    const { client, reply } = await fitted('Bootstrap', madeUpPanel(14));
    const path = `/api/fits/${reply.fit.id}/bootstrap`;
    expect(wildOf(await readWhen(client, reply.fit.id, isReady))?.slopes).toBeNull();
    expect((await client.post(path, { seed: -1 })).status).toBe(400);
    const started = await client.post(path, { seed: 5 });
    expect(started.status).toBe(202);
    expect(started.body).toEqual(jasmine.objectContaining({ seed: 5, failure: null }));
    const done = (await readWhen(client, reply.fit.id, hasEnded)) as Ready;
    expect(done.bootstrap).toEqual({ seed: 5, state: 'done', progress: null, failure: null });
    const row = wildOf(done);
    expect(row?.slopes?.length).toBe(2);
    expect(row?.slopes?.[0].pValue).toBeGreaterThan(0);
    expect(row?.isChosen).toBeFalse();
    expect([row?.seed, row?.draws]).toEqual([5, 9999]);

    const state = (await client.get(`/api/fits/${reply.fit.id}/evidence/state`)).body;
    expect(state).toEqual({ state: 'ready', bootstrap: done.bootstrap });

    const again = await client.post(path, { seed: 5 });
    expect(again.body).toEqual(jasmine.objectContaining({ seed: 5, state: 'done' }));
    expect((await client.post(path, { seed: 6 })).status).toBe(202);
    const other = (await readWhen(client, reply.fit.id, hasEnded)) as Ready;
    expect(other.bootstrap).toEqual(jasmine.objectContaining({ seed: 6, state: 'done' }));
    expect(wildOf(other)?.slopes).not.toEqual(row?.slopes);
    expect(wildOf(other)?.seed).toBe(6);
    const kept = await admin.query('select from fit_bootstrap where fit_id = $1', [reply.fit.id]);
    expect(kept.rowCount).toBe(2);
    await expectAsync(
      admin.query('update fit_bootstrap set failure = null where fit_id = $1', [reply.fit.id]),
    ).toBeRejectedWithError(/never changes/);
  });

  it('takes no bootstrap by another engine than its own', async () => {
    const { client, reply } = await fitted('Other engine');
    await readWhen(client, reply.fit.id, isReady);
    await admin.query(
      `update fit_evidence set evidence = evidence || '{"engine": "1.9.0"}' where fit_id = $1`,
      [reply.fit.id],
    );
    const refused = await client.post(`/api/fits/${reply.fit.id}/bootstrap`, {});
    expect(refused.status).toBe(409);
    expect((refused.body as { detail: string }).detail).toContain('made by engine 1.9.0');
  });

  it('lets a bootstrap be cancelled, and asked for again', async () => {
    const { client, reply } = await fitted('Cancelled', madeUpPanel(14));
    const path = `/api/fits/${reply.fit.id}/bootstrap`;
    await readWhen(client, reply.fit.id, isReady);
    // The job waits for its rows: what comes in between finds it under way.
    await admin.query('begin');
    await admin.query('lock table panel_row in access exclusive mode');
    expect((await client.post(path, {})).status).toBe(202);
    expect((await client.post(path, { seed: 2 })).status)
      .withContext('one at a time')
      .toBe(409);
    expect((await client.delete(path)).status).toBe(204);
    const cancelled = (await read(client, reply.fit.id)) as Ready;
    expect(cancelled.bootstrap).toEqual(jasmine.objectContaining({ seed: 1, state: 'cancelled' }));
    await admin.query('commit');
    expect(wildOf(cancelled)?.slopes).toBeNull();
    expect((await client.delete(path)).status).toBe(409);
    expect((await client.post(path, {})).status).toBe(202);
    const done = (await readWhen(client, reply.fit.id, hasEnded)) as Ready;
    expect(done.bootstrap).toEqual(jasmine.objectContaining({ seed: 1, state: 'done' }));
  });

  it('is computed for every choice of the specification, which the fit names', async () => {
    const client = await signUp(server, 'Choices');
    const peerGroupId = await savePeers(client, await importPanel(client), 'C06');
    const wrong = await client.post('/api/fits', { peerGroupId, slopes: 'cr2', seed: 3 });
    expect(wrong.status).toBe(400);
    const request = { peerGroupId, effects: 'company,year', form: 'log', lag: 1 };
    const started = await client.post('/api/fits', { ...request, slopes: 'wild' });
    expect(started.status).toBe(202);
    const { fit } = started.body as FitReply;
    expect(fit).toEqual(jasmine.objectContaining({ effects: 'company,year', form: 'log', lag: 1 }));
    const found = (await readWhen(client, fit.id, isReady)) as Ready;
    expect(wildOf(found)?.isChosen).toBeTrue();
    const done = FitReply.parse((await client.get(`/api/fits/${fit.id}`)).body);
    expect(done.result?.specification.seed).toBe(1);
    const lineage = await client.get(`/api/fits/${fit.id}/lineage/intercept.0`);
    const { cells } = LineageReply.parse(lineage.body);
    expect(cells.rows.map(({ year }) => year))
      .withContext('the year that the first lagged row comes from, too')
      .toEqual(Array.from({ length: 20 }, (_, index) => 1935 + index));
  });
});
