import type { TestDatabase } from '../../db/testing/test-database';
import type { DraftReply, FitReply, ScenarioReply } from '../contract';
import { join, signUp, type TestClient } from '../testing/test-client';
import { importPanel, runFit, savePeers } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

describe('scenarios', () => {
  let database: TestDatabase;
  let server: TestServer;
  let analyst: TestClient;
  let fit: FitReply;
  let plan: ScenarioReply['plan'];

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    analyst = await signUp(server);
    fit = await runFit(analyst, await savePeers(analyst, await importPanel(analyst), 'C06'));
    const last = fit.result?.prediction?.last;
    plan = [{ year: (last?.year ?? 0) + 1, values: [...(last?.regressors ?? [])] }];
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  const save = async (body: object = {}): Promise<ScenarioReply> => {
    const whole = { fitId: fit.fit.id, name: 'Plan', note: '', plan, ...body };
    const reply = await analyst.post('/api/scenarios', whole);
    expect(reply.status).toBe(201);
    return reply.body as ScenarioReply;
  };
  const draftPath = (): string => `/api/fits/${fit.fit.id}/draft`;
  const keepDraft = (name: string) =>
    analyst.put(draftPath(), { scenarioId: null, name, note: '', plan });
  const draftName = async (): Promise<string | undefined> =>
    ((await analyst.get(draftPath())).body as DraftReply).draft?.name;

  it('of a new plan take its draft with them; copies and plans beside it leave it alone', async () => {
    await keepDraft('Unsaved');
    const beside = await save({ keepsDraft: true });
    expect(await draftName()).toBe('Unsaved');
    expect((await analyst.post(`/api/scenarios/${beside.id}/copy`)).status).toBe(201);
    expect(await draftName()).toBe('Unsaved');
    await save();
    expect(await draftName()).toBeUndefined();
  });

  it('keep drafts to the person', async () => {
    await keepDraft('Mine');
    const colleague = await join(server, analyst, ['analyst']);
    const theirs = (await colleague.get(draftPath())).body as DraftReply;
    expect(theirs.draft).toBeNull();
  });

  it('changed by two people at once keep the first and tell the second', async () => {
    const { id } = await save();
    const change = (name: string) =>
      analyst.put(`/api/scenarios/${id}`, { name, note: '', plan, version: 1 });
    const both = await Promise.all([change('One'), change('Two')]);
    expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
    const stored = (await analyst.get(`/api/scenarios/${id}`)).body as ScenarioReply;
    expect(stored.version).toBe(2);
  });

  it('that are deleted are gone until they are restored', async () => {
    const { id } = await save();
    expect((await analyst.delete(`/api/scenarios/${id}`)).status).toBe(204);
    expect((await analyst.get(`/api/scenarios/${id}`)).status).toBe(404);
    expect((await analyst.post(`/api/scenarios/${id}/restore`)).status).toBe(200);
    expect((await analyst.get(`/api/scenarios/${id}`)).status).toBe(200);
  });

  it('name a year that does not follow and a value that is missing', async () => {
    const wrong = [{ year: plan[0].year + 1, values: [1] }];
    const reply = await analyst.post('/api/scenarios', {
      fitId: fit.fit.id,
      name: 'Plan',
      note: '',
      plan: wrong,
    });
    expect(reply.status).toBe(400);
    const { errors } = reply.body as { errors: { pointer: string }[] };
    expect(errors.map(({ pointer }) => pointer)).toEqual(['/plan/0/year', '/plan/0/values']);
  });
});
