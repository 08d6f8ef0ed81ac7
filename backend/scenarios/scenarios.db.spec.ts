import type { TestDatabase } from '../../db/testing/test-database';
import type {
  DraftReply,
  FitReply,
  ScenarioCopyReply,
  ScenarioReply,
  ScenarioVersionsReply,
} from '../contract';
import { join, signUp, type TestClient } from '../testing/test-client';
import { importPanel, runFit, savePeers } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

interface Faults {
  readonly errors: readonly { readonly pointer: string; readonly detail: string }[];
}

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

  it('keep outlook, rules and ranges with each version', async () => {
    const outlook = {
      start: 'carry-the-gap',
      yearEffect: 'last',
      confidence: 0.8,
      bandConfidence: 0.6,
    };
    const [capex, equity] = plan[0].values;
    const ruled = [{ year: plan[0].year, values: [capex, (capex * 50) / 100] }];
    const rules = [
      { rule: { kind: 'hold' }, moves: [] },
      { rule: { kind: 'share', percent: 50, of: 0 }, moves: [] },
    ];
    const ranges = [[{ low: capex * 0.9, high: capex * 1.2 }, null]];
    const first = await save();
    expect(first.outlook).toEqual({
      start: 'model-level',
      yearEffect: 'last',
      confidence: 0.95,
      bandConfidence: 0.8,
    });
    expect(first.rules).toEqual([
      { rule: null, moves: [] },
      { rule: null, moves: [] },
    ]);
    const text = { name: 'Ruled', note: '', plan: ruled, outlook, rules };
    const changed = await analyst.put(`/api/scenarios/${first.id}`, {
      ...text,
      uncertainty: { seed: 7, ranges },
      version: 1,
    });
    expect(changed.status).withContext(changed.text).toBe(200);
    const { versions } = (await analyst.get(`/api/scenarios/${first.id}/versions`))
      .body as ScenarioVersionsReply;
    expect(versions.map(({ version, name }) => [version, name])).toEqual([
      [2, 'Ruled'],
      [1, 'Plan'],
    ]);
    const stored = changed.body as ScenarioReply;
    expect(stored.outlook as object).toEqual(outlook);
    expect(versions[0].outlook).toEqual(stored.outlook);
    expect(versions[0].rules).toEqual(stored.rules);
    expect(versions[0].uncertainty).toEqual({ seed: 7, ranges });
    expect(versions[1].uncertainty).toBeNull();
    // A lower level of confidence, and another starting point, give another interval for the same plan.
    const width = ({ low, high }: { low: number | null; high: number | null }) =>
      (high ?? 0) - (low ?? 0);
    const [sure] = (await save({ plan: ruled })).years;
    expect(width(versions[0].years[0].expected)).toBeLessThan(width(sure.expected));
    expect(versions[0].years[0].expected.estimate).not.toBeCloseTo(sure.expected.estimate, 3);
    expect(width(sure.band ?? { low: 0, high: 0 })).toBeGreaterThan(0);
    expect(equity).toBeGreaterThan(0);
  });

  it('refuse amounts that their rule does not give, and ranges that do not hold the plan', async () => {
    const rules = [
      { rule: { kind: 'grow', percent: 5 }, moves: [] },
      { rule: null, moves: [] },
    ];
    const wrong = await analyst.post('/api/scenarios', {
      fitId: fit.fit.id,
      name: 'Plan',
      note: '',
      plan,
      rules,
    });
    expect(wrong.status).toBe(400);
    const [fault] = (wrong.body as Faults).errors;
    expect(fault.pointer).toBe('/plan/0/values/0');
    expect(fault.detail).toContain('which the rule of inv gives');
    const ranges = [[{ low: plan[0].values[0] + 1, high: plan[0].values[0] + 2 }, null]];
    const off = await analyst.post('/api/scenarios', {
      fitId: fit.fit.id,
      name: 'Plan',
      note: '',
      plan,
      uncertainty: { seed: 1, ranges },
    });
    expect((off.body as Faults).errors[0].pointer).toBe('/uncertainty/ranges/0/0');
  });

  it('are copied onto another fit with what changed', async () => {
    const source = await save({
      name: 'Build-out',
      rules: [
        { rule: { kind: 'hold' }, moves: [] },
        { rule: null, moves: [] },
      ],
    });
    const logs = await runFit(analyst, fit.peerGroup.id, { form: 'log' });
    const copied = await analyst.post(`/api/scenarios/${source.id}/copy`, { fitId: logs.fit.id });
    expect(copied.status).toBe(201);
    const { scenario, changes } = copied.body as ScenarioCopyReply;
    expect(scenario.fitId).toBe(logs.fit.id);
    expect(scenario.name).toBe('Build-out');
    expect(scenario.copiedFrom).toEqual({
      id: source.id,
      name: 'Build-out',
      version: 1,
      fitId: fit.fit.id,
    });
    expect(scenario.rules[0].rule).toEqual({ kind: 'hold' });
    expect(changes.droppedYears).toEqual([]);
    expect(changes.years.map(({ before }) => before)).toEqual([source.years[0].expected]);
    expect(changes.years[0].after).toEqual(scenario.years[0].expected);
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
