import pg from 'pg';
import type { TestDatabase } from '../../db/testing/test-database';
import type { EditionReply, EditionsReply, FitReply } from '../contract';
import { join, signUp, type TestClient, testPassword } from '../testing/test-client';
import { importPanel, openWarnings, runFit, savePeers } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

describe('editions', () => {
  let database: TestDatabase;
  let server: TestServer;
  let analyst: TestClient;
  let cfo: TestClient;
  let reader: TestClient;
  let fitId: string;
  let peerGroupId: string;
  let panelVersionId: string;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    analyst = await signUp(server);
    cfo = await join(server, analyst, ['cfo', 'analyst']);
    reader = await join(server, analyst, ['reader']);
    panelVersionId = await importPanel(analyst);
    peerGroupId = await savePeers(analyst, panelVersionId, 'C06');
    fitId = (await runFit(analyst, peerGroupId)).fit.id;
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  async function publish(by: TestClient): Promise<EditionReply> {
    const reply = await by.post('/api/editions', {
      fitId,
      scenarios: [],
      confidentiality: 'confidential',
      comment: '',
    });
    expect(reply.status).toBe(201);
    return reply.body as EditionReply;
  }

  const sign = async (by: TestClient, id: string) => {
    await openWarnings(by, id);
    return by.post(`/api/editions/${id}/sign`, { password: testPassword });
  };
  const sendBack = (by: TestClient, id: string, comment = 'Explain C05.') =>
    by.post(`/api/editions/${id}/return`, { comment });

  it('that are signed supersede the one signed before, and all stay readable unchanged', async () => {
    const first = await publish(analyst);
    expect((await sign(cfo, first.edition.id)).status).toBe(200);
    const second = await publish(analyst);
    expect((await sign(cfo, second.edition.id)).status).toBe(200);
    const { editions } = (await reader.get('/api/editions')).body as EditionsReply;
    const states = editions.map(({ number, state, supersededBy }) => [number, state, supersededBy]);
    expect(states).toContain([second.edition.number, 'signed', null]);
    expect(states).toContain([first.edition.number, 'superseded', second.edition.number]);
    const kept = (await reader.get(`/api/editions/${first.edition.id}`)).body as EditionReply;
    expect(kept.content).toEqual(first.content);
    expect(kept.edition.sha256).toBe(first.edition.sha256);
  });

  it('wait and return unseen by readers, and keep the comment they were returned with', async () => {
    const { edition } = await publish(analyst);
    const path = `/api/editions/${edition.id}`;
    expect((await reader.get(path)).status).toBe(404);
    expect((await reader.get(`${path}/lineage/standing`)).status).toBe(404);
    expect((await sendBack(cfo, edition.id, '  ')).status).toBe(400);
    expect((await sendBack(cfo, edition.id)).status).toBe(200);
    const returned = (await analyst.get(path)).body as EditionReply;
    expect(returned.edition.state).toBe('returned');
    expect(returned.edition.decision?.comment).toBe('Explain C05.');
    expect((await sign(cfo, edition.id)).status).toBe(409);
    expect((await sendBack(cfo, edition.id)).status).toBe(409);
    expect((await reader.get(path)).status).toBe(404);
  });

  it('that a later signed one overtook can be returned, not signed', async () => {
    const early = await publish(analyst);
    const late = await publish(analyst);
    expect((await sign(cfo, late.edition.id)).status).toBe(200);
    const path = `/api/editions/${early.edition.id}`;
    const seen = (await cfo.get(path)).body as EditionReply;
    expect([seen.maySign, seen.mayReturn]).toEqual([false, true]);
    expect((await sign(cfo, early.edition.id)).status).toBe(409);
    expect((await sendBack(cfo, early.edition.id)).status).toBe(200);
  });

  it('freeze no other version of a scenario than the publisher saw', async () => {
    const { result } = (await analyst.get(`/api/fits/${fitId}`)).body as FitReply;
    const last = result?.prediction?.last;
    const plan = [{ year: (last?.year ?? 0) + 1, values: last?.regressors }];
    const text = { name: 'Held', note: '', plan };
    const saved = await analyst.post('/api/scenarios', { fitId, ...text });
    const { id } = saved.body as { id: string };
    await analyst.put(`/api/scenarios/${id}`, { ...text, name: 'Held again', version: 1 });
    const request = { fitId, confidentiality: 'confidential', comment: '' };
    const stale = await analyst.post('/api/editions', {
      ...request,
      scenarios: [{ id, version: 1 }],
    });
    expect(stale.status).toBe(409);
    expect((stale.body as { type: string }).type).toContain('stale-version');
    const seen = await analyst.post('/api/editions', {
      ...request,
      scenarios: [{ id, version: 2 }],
    });
    expect(seen.status).toBe(201);
  });

  it('cannot be signed or returned by whoever published them, whatever their roles', async () => {
    const { edition, maySign, whyNot } = await publish(cfo);
    expect(maySign).toBeFalse();
    expect(whyNot).toContain('another person');
    const own = await sign(cfo, edition.id);
    expect(own.status).toBe(403);
    expect((own.body as { type: string }).type).toContain('four-eyes');
    expect((await sendBack(cfo, edition.id)).status).toBe(403);
    const admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    try {
      await expectAsync(
        admin.query(
          `update edition set state = 'signed', decided_by = published_by, decided_at = now()
            where id = $1`,
          [edition.id],
        ),
      ).toBeRejectedWithError(/edition_four_eyes/);
    } finally {
      await admin.end();
    }
  });

  it('are frozen: no role changes content, number or a decision, and states go one way', async () => {
    const { edition } = await publish(analyst);
    expect((await sign(cfo, edition.id)).status).toBe(200);
    const owner = new pg.Client({ connectionString: database.adminUrl });
    await owner.connect();
    try {
      for (const change of [
        `content = '{}'`,
        `sha256 = 'x'`,
        `number = 99`,
        `state = 'waiting', decided_by = null, decided_at = null`,
        `state = 'returned'`,
        `decided_at = now()`,
      ])
        await expectAsync(owner.query(`update edition set ${change} where id = $1`, [edition.id]))
          .withContext(change)
          .toBeRejected();
    } finally {
      await owner.end();
    }
  });

  it('are not published while a company has no written reason', async () => {
    const listed = await analyst.get(`/api/panel-versions/${panelVersionId}/companies`);
    const { companies } = listed.body as { companies: { name: string }[] };
    const saved = await analyst.post('/api/peer-groups', {
      panelVersionId,
      ownCompany: 'C06',
      note: '',
      parentId: peerGroupId,
      peers: companies
        .filter(({ name }) => name !== 'C06')
        .map(({ name }) => ({
          company: name,
          isIncluded: true,
          reason: name === 'C02' ? '' : 'x',
        })),
    });
    const fit = await runFit(analyst, (saved.body as { id: string }).id);
    const reply = await analyst.post('/api/editions', {
      fitId: fit.fit.id,
      scenarios: [],
      confidentiality: 'confidential',
      comment: '',
    });
    expect(reply.status).toBe(400);
    expect((reply.body as { detail: string }).detail).toContain('C02');
  });
});
