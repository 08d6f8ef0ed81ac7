import type { TestDatabase } from '../../db/testing/test-database';
import type { EditionReply, FitReply, LineageReply, ScenarioReply } from '../contract';
import { join, signUp, type TestClient, testPassword } from '../testing/test-client';
import { importPanel, openWarnings, runFit, savePeers } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

/** Figures: R 4.2.2 and numpy over the same file, see stats/golden. */
describe('the main job, from a file to a signed edition', () => {
  let database: TestDatabase;
  let server: TestServer;
  let analyst: TestClient;
  let cfo: TestClient;
  let fit: FitReply;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    analyst = await signUp(server, 'Analyst');
    cfo = await join(server, analyst, ['cfo'], 'CFO');
    const panelVersionId = await importPanel(analyst);
    fit = await runFit(analyst, await savePeers(analyst, panelVersionId, 'C06'));
  });

  afterAll(async () => {
    const warnings = server.log.filter((line) => line.includes('database warning'));
    expect(warnings).withContext('settings outside a transaction').toEqual([]);
    await server.close();
    await database.drop();
  });

  it('places the own company with its interval and rank set', () => {
    expect(fit.failure).toBeNull();
    const standing = fit.result?.standing;
    expect(standing?.estimate).toBeCloseTo(2407.024642135653, 6);
    expect(standing?.low).toBeCloseTo(1274.9650076424, 6);
    expect(standing?.high).toBeCloseTo(3539.0842766289056, 6);
    expect(standing?.rankSet).toEqual([1, 1]);
  });

  it('answers the same fit when the same is asked again', async () => {
    const again = await analyst.post('/api/fits', { peerGroupId: fit.peerGroup.id });
    expect((again.body as FitReply).fit.id).toBe(fit.fit.id);
  });

  it('traces a figure to the rows and columns of the file', async () => {
    const reply = (await cfo.get(`/api/fits/${fit.fit.id}/lineage/standing`)).body as LineageReply;
    expect(reply.cells.rows.length).toBe(220);
    expect(reply.cells.columns.map(({ name }) => name)).toEqual(['value', 'inv', 'capital']);
    expect(reply.cells.rows[0]).toEqual({
      fileRow: 2,
      company: 'C01',
      year: 1935,
      values: [30.284, 2.938, 52.011],
      origins: [null, null, null],
    });
    expect(reply.panelVersion.file.name).toBe('panel.csv');
    expect((await cfo.get(`/api/fits/${fit.fit.id}/lineage/slope.7`)).status).toBe(404);
  });

  it('saves a scenario with the server’s own figures, publishes and has the CFO sign', async () => {
    const [capex, equity] = fit.result?.prediction?.last.regressors ?? [];
    const year = (fit.result?.prediction?.last.year ?? 0) + 1;
    const saved = await analyst.post('/api/scenarios', {
      fitId: fit.fit.id,
      name: 'Build-out',
      note: '',
      plan: [{ year, values: [capex + 100, equity] }],
    });
    expect(saved.status).toBe(201);
    const scenario = saved.body as ScenarioReply;
    expect(scenario.years[0].difference.estimate).toBeCloseTo(285.6081190034189, 6);

    const published = await analyst.post('/api/editions', {
      fitId: fit.fit.id,
      scenarios: [{ id: scenario.id, version: 1 }],
      confidentiality: 'confidential',
      comment: 'For the meeting.',
    });
    expect(published.status).toBe(201);
    const edition = published.body as EditionReply;
    expect(edition.maySign).toBeFalse();

    const path = `/api/editions/${edition.edition.id}`;
    expect((await analyst.post(`${path}/sign`, { password: testPassword })).status).toBe(403);
    expect((await cfo.post(`${path}/sign`, { password: 'not the password' })).status).toBe(403);
    await openWarnings(cfo, edition.edition.id);
    const twice = await Promise.all([
      cfo.post(`${path}/sign`, { password: testPassword }),
      cfo.post(`${path}/sign`, { password: testPassword }),
    ]);
    expect(twice.map(({ status }) => status).sort()).toEqual([200, 409]);
    const signed = (await analyst.get(path)).body as EditionReply;
    expect(signed.edition.state).toBe('signed');
    expect(signed.edition.decision?.by).toBe('CFO');
  });
});
