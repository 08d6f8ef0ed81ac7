import type { TestDatabase } from '../../db/testing/test-database';
import type { EditionReply, FitReply, ScenarioReply, StartFit } from '../contract';
import { tQuantile } from '../stats';
import { predict, type PredictionBasis } from '../stats/prediction';
import { signUp, type TestClient } from '../testing/test-client';
import { importPanel, runFit, savePeers } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

const specifications: readonly { readonly name: string; readonly chosen: Partial<StartFit> }[] = [
  { name: 'in logs', chosen: { form: 'log' } },
  { name: 'with year effects', chosen: { effects: 'company,year' } },
  { name: 'of the year before', chosen: { lag: 1 } },
  { name: 'with the bootstrap', chosen: { slopes: 'wild' } },
  {
    name: 'in logs with year effects, the year before and the bootstrap',
    chosen: { form: 'log', effects: 'company,year', lag: 1, slopes: 'wild', seed: 7 },
  },
];

describe('plans and editions through a fit', () => {
  let database: TestDatabase;
  let server: TestServer;
  let analyst: TestClient;
  let peerGroupId: string;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    analyst = await signUp(server);
    peerGroupId = await savePeers(analyst, await importPanel(analyst), 'C06');
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  function basisOf({ result }: FitReply): PredictionBasis {
    const basis = result?.prediction ?? null;
    if (basis === null) throw new Error('expected a prediction in the fit; found none');
    return basis;
  }

  /** Two years: capex a tenth up in the first, held in the second. */
  function planOf(basis: PredictionBasis): ScenarioReply['plan'] {
    const [capex, equity] = basis.held ?? basis.last.regressors;
    const { year } = basis.last;
    return [
      { year: year + 1, values: [capex * 1.1, equity] },
      { year: year + 2, values: [capex, equity] },
    ];
  }

  async function save(fit: FitReply, plan: ScenarioReply['plan']) {
    return analyst.post('/api/scenarios', { fitId: fit.fit.id, name: 'Up', note: '', plan });
  }

  for (const { name, chosen } of specifications)
    it(`${name} are stored with the figures that the browser has, and published`, async () => {
      const fit = await runFit(analyst, peerGroupId, chosen);
      expect(fit.failure).toBeNull();
      const basis = basisOf(fit);
      const plan = planOf(basis);
      const saved = await save(fit, plan);
      expect(saved.status).withContext(saved.text).toBe(201);
      const scenario = saved.body as ScenarioReply;
      const years = plan.map(({ year, values }) => ({ year, regressors: values }));
      predict(basis, { years }, tQuantile).forEach((shown, index) => {
        if (shown.expected === null) throw new Error(shown.reason);
        const stored = scenario.years[index];
        const { estimate, low, high } = shown.expected;
        expect([stored.expected.estimate, stored.expected.low, stored.expected.high]).toEqual([
          estimate,
          low,
          high,
        ]);
        expect(stored.difference.estimate).toBe(shown.difference.estimate);
        expect(Object.keys(stored.expected)).not.toContain('log');
      });
      const published = await analyst.post('/api/editions', {
        fitId: fit.fit.id,
        scenarios: [{ id: scenario.id, version: 1 }],
        confidentiality: 'confidential',
        comment: '',
      });
      expect(published.status).withContext(published.text).toBe(201);
      const { content } = published.body as EditionReply;
      expect(content.fit).toEqual(fit.result ?? content.fit);
      expect(content.scenarios[0].years).toEqual(scenario.years);
    });

  it('of the year before change nothing in the year of the plan', async () => {
    const fit = await runFit(analyst, peerGroupId, { lag: 1 });
    const { years } = (await save(fit, planOf(basisOf(fit)))).body as ScenarioReply;
    expect(years[0].difference.estimate).toBe(0);
    expect(years[1].difference.estimate).not.toBe(0);
  });

  it('in logs name an amount that is not above zero, also in a year that nothing reads yet', async () => {
    const fit = await runFit(analyst, peerGroupId, { form: 'log', lag: 1 });
    const [first, second] = planOf(basisOf(fit));
    const reply = await save(fit, [first, { ...second, values: [0, second.values[1]] }]);
    expect(reply.status).toBe(400);
    expect((reply.body as { errors: { pointer: string }[] }).errors).toEqual([
      {
        pointer: '/plan/1/values/0',
        detail: 'expected an amount above zero, for the fit reads logs; found 0',
      },
    ] as never);
  });
});
