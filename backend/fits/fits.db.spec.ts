import pg from 'pg';
import { eventually } from '../../db/testing/eventually';
import type { TestDatabase } from '../../db/testing/test-database';
import type { FitReply, FitsReply } from '../contract';
import { signUp, type TestClient } from '../testing/test-client';
import { idOf, importPanel, referenceMapping, runFit, savePeers } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

/** Companies × 25 years of made-up figures, from a linear congruential generator. */
function largePanel(companies: number): string {
  let state = 1;
  const draw = (): number => {
    state = (state * 1_103_515_245 + 12_345) % 2_147_483_648;
    return state / 2_147_483_648;
  };
  const lines = ['company,year,value,inv,capital'];
  for (let company = 0; company < companies; company++)
    for (let year = 2000; year < 2025; year++) {
      const inv = 10 + 50 * draw();
      const capital = 100 + 400 * draw();
      const value = 2 * inv + 0.5 * capital + 100 * draw() + (company % 97);
      lines.push(`F${company},${year},${value.toFixed(3)},${inv.toFixed(3)},${capital.toFixed(3)}`);
    }
  return lines.join('\n');
}

describe('fits', () => {
  let database: TestDatabase;
  let server: TestServer;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  async function start(analyst: TestClient, peerGroupId: string): Promise<FitReply> {
    const reply = await analyst.post('/api/fits', { peerGroupId });
    expect(reply.status).toBe(202);
    return reply.body as FitReply;
  }

  it('say what the engine refuses, with what is concerned', async () => {
    const analyst = await signUp(server, 'Collinear');
    const lines = ['company,year,value,inv,capital'];
    for (const company of ['A', 'B', 'C'])
      for (let year = 2000; year < 2010; year++) {
        const inv = (year % 7) + company.charCodeAt(0);
        lines.push(`${company},${year},${(inv * year) % 13},${inv},${2 * inv}`);
      }
    const panel = await importPanel(analyst, lines.join('\n'));
    const reply = await runFit(analyst, await savePeers(analyst, panel, 'A'));
    expect(reply.fit.state).toBe('failed');
    expect(reply.failure?.code).toBe('collinear-regressors');
    expect(reply.failure?.subjects).toEqual(['inv', 'capital']);
    const again = await start(analyst, reply.peerGroup.id);
    expect(again.fit.id).withContext('a failed fit may be tried anew').not.toBe(reply.fit.id);
  });

  it('that are asked for twenty times at once are one fit', async () => {
    const analyst = await signUp(server, 'Twenty');
    const panel = await importPanel(analyst);
    const group = await savePeers(analyst, panel, 'C05');
    const all = await Promise.all(Array.from({ length: 20 }, () => start(analyst, group)));
    expect(new Set(all.map(({ fit }) => fit.id)).size).toBe(1);
    const done = await runFit(analyst, group);
    expect(done.result?.standing?.rankSet).toEqual([2, 3]);
    const listed = (await analyst.get('/api/fits')).body as FitsReply;
    expect(listed.fits.length).toBe(1);
  });

  /** Fits like this one that are queued, and that no worker takes up. */
  async function queueMore(admin: pg.Client, fitId: string, count: number): Promise<void> {
    await admin.query(
      `insert into fit (workspace_id, id, panel_version_id, peer_group_id, specification,
          specification_key, state, created_by)
        select workspace_id, gen_random_uuid(), panel_version_id, peer_group_id, specification,
          'waiting ' || number, 'queued', created_by
        from fit, generate_series(1, $2) as number where id = $1`,
      [fitId, count],
    );
  }

  it('are no more than twenty at a time in a workspace', async () => {
    const analyst = await signUp(server, 'Many');
    const group = await savePeers(analyst, await importPanel(analyst), 'C06');
    const { fit } = await runFit(analyst, group);
    const admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    try {
      await queueMore(admin, fit.id, 20);
      const refused = await analyst.post('/api/fits', { peerGroupId: group, slopes: 'cr1' });
      expect(refused.status).toBe(429);
      expect(refused.body).toEqual(
        jasmine.objectContaining({
          detail:
            '20 fits of this workspace are queued or running. Wait for one to end, or cancel one.',
        }),
      );
      expect((await start(analyst, group)).fit.id)
        .withContext('one that exists is answered all the same')
        .toBe(fit.id);
      const other = await signUp(server, 'Few');
      const otherGroup = await savePeers(other, await importPanel(other), 'C06');
      expect((await runFit(other, otherGroup)).fit.state).toBe('done');
    } finally {
      await admin.end();
    }
  });

  it('are no more than twenty where two are asked for at once', async () => {
    const analyst = await signUp(server, 'At once');
    const group = await savePeers(analyst, await importPanel(analyst), 'C06');
    const { fit } = await runFit(analyst, group);
    const admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    try {
      await queueMore(admin, fit.id, 19);
      // Both may count what there is; neither can write until both have got as far as they can.
      await admin.query('begin');
      await admin.query('lock table fit in share mode');
      const both = ['cr1', 'hc3'].map((slopes) =>
        analyst.post('/api/fits', { peerGroupId: group, slopes }),
      );
      await eventually('two that wait', async () => {
        const waiting = await admin.query(
          `select from pg_stat_activity where datname = current_database()
            and application_name = 'kinvale-web' and wait_event_type = 'Lock'`,
        );
        return waiting.rowCount === 2;
      });
      await admin.query('commit');
      const replies = await Promise.all(both);
      expect(replies.map(({ status }) => status).sort()).toEqual([202, 429]);
    } finally {
      await admin.end();
    }
  });

  it('started on one server process are worked, read and cancelled on another', async () => {
    const second = await startTestServer(database);
    try {
      const analyst = await signUp(server, 'Two servers');
      const panel = await importPanel(analyst);
      const { fit } = await runFit(analyst, await savePeers(analyst, panel, 'C01'));
      const elsewhere = await second.composition.services.fits.find(
        await workspaceOf(analyst),
        fit.id,
      );
      expect(elsewhere.fit.state).toBe('done');
      expect(elsewhere.fit.hash).toBe(fit.hash);
    } finally {
      await second.close();
    }
  });

  it('never change once they are done, not even by the application role', async () => {
    const analyst = await signUp(server, 'Frozen');
    const panel = await importPanel(analyst);
    const { fit } = await runFit(analyst, await savePeers(analyst, panel, 'C02'));
    expect((await analyst.delete(`/api/fits/${fit.id}`)).status).toBe(409);
    const app = new pg.Client({ connectionString: database.appUrl });
    await app.connect();
    try {
      const workspaceId = await workspaceOf(analyst);
      await app.query(`select set_config('app.workspace', $1, false)`, [workspaceId]);
      await expectAsync(
        app.query('update fit set hash = $1 where id = $2', ['x', fit.id]),
      ).toBeRejectedWithError(/never changes/);
    } finally {
      await app.end();
    }
  });

  it('take their workspace from the ticket: a job that names no ticket of its queue fails', async () => {
    const admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    try {
      const before = server.log.length;
      await admin.query(
        `insert into pgboss.job (name, data, retry_limit) values ('fit', '{"ticketId":"11111111-2222-4333-8444-555555555555","workspaceId":"x"}', 0)`,
      );
      const state = await eventually('the end of the job', async () => {
        const { rows } = await admin.query<{ state: string }>(
          `select state from pgboss.job where data ->> 'workspaceId' = 'x'`,
        );
        return ['created', 'active'].includes(rows[0].state) ? undefined : rows[0].state;
      });
      expect(state).toBe('failed');
      expect(server.log.slice(before).join('')).not.toContain('unexpected error');
    } finally {
      await admin.end();
    }
  });

  it('are cancelled while their rows are read', async () => {
    const analyst = await signUp(server, 'Reading');
    const group = await savePeers(analyst, await importPanel(analyst), 'C04');
    const admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    try {
      await admin.query('begin');
      await admin.query('lock table panel_row in access exclusive mode');
      const { fit } = await start(analyst, group);
      const stateOf = async (): Promise<string> =>
        ((await analyst.get(`/api/fits/${fit.id}`)).body as FitReply).fit.state;
      await eventually('a running fit', async () => (await stateOf()) === 'running');
      expect((await analyst.delete(`/api/fits/${fit.id}`)).status).toBe(204);
      await admin.query('commit');
      expect(await stateOf()).toBe('cancelled');
    } finally {
      await admin.end();
    }
  });

  it('of 200,000 rows run while light routes are answered, and can be cancelled', async () => {
    const analyst = await signUp(server, 'Large');
    const panel = await importPanel(analyst, largePanel(8000), referenceMapping);
    const group = await savePeers(analyst, panel, 'F0');
    const { fit } = await start(analyst, group);
    const waits: number[] = [];
    let sawRunning = false;
    let last: FitReply | undefined;
    for (;;) {
      const asked = performance.now();
      const session = await analyst.get('/api/session');
      waits.push(performance.now() - asked);
      expect(session.status).toBe(200);
      last = (await analyst.get(`/api/fits/${fit.id}`)).body as FitReply;
      if (last.fit.state === 'running') sawRunning = true;
      if (last.fit.state !== 'queued' && last.fit.state !== 'running') break;
    }
    expect(last.fit.state).toBe('done');
    expect(sawRunning).toBeTrue();
    expect(last.result?.sample.observations).toBe(200_000);
    expect(waits.length).withContext('answers while the fit ran').toBeGreaterThan(3);

    const other = await analyst.post('/api/fits', { peerGroupId: group, slopes: 'cr1' });
    const second = (other.body as FitReply).fit.id;
    expect((await analyst.delete(`/api/fits/${second}`)).status).toBe(204);
    const cancelled = (await analyst.get(`/api/fits/${second}`)).body as FitReply;
    expect(cancelled.fit.state).toBe('cancelled');
  });
});

async function workspaceOf(client: TestClient): Promise<string> {
  const { body } = await client.get('/api/session');
  return idOf(
    { status: 200, text: '', body: (body as { session: { workspace: object } }).session.workspace },
    200,
  );
}
