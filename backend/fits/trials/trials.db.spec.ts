import { randomUUID } from 'node:crypto';
import pg from 'pg';
import { eventually } from '../../../db/testing/eventually';
import type { TestDatabase } from '../../../db/testing/test-database';
import { type FitReply, PeerTrialReply, type TrialOutcome } from '../../contract';
import { join, signUp, type TestClient } from '../../testing/test-client';
import { idOf, importPanel, runFit } from '../../testing/test-model';
import {
  createMigratedDatabase,
  startTestServer,
  type TestServer,
} from '../../testing/test-server';

const own = 'C06';
const peers = ['C05', 'C01', 'C07', 'C02', 'C09'];
const candidates = ['C03', 'C04'];

/** Companies × 25 years of made-up figures, from a linear congruential generator. */
function madeUpPanel(companies: number): string {
  let state = 3;
  const draw = (): number => (state = (state * 1_103_515_245 + 12_345) % 2 ** 31) / 2 ** 31;
  const lines = ['company,year,value,inv,capital'];
  for (let company = 0; company < companies; company++)
    for (let year = 2000; year < 2025; year++) {
      const [inv, capital] = [10 + 50 * draw(), 100 + 400 * draw()];
      lines.push(`F${company},${year},${2 * inv + 0.5 * capital + 100 * draw()},${inv},${capital}`);
    }
  return lines.join('\n');
}

function figuresOf(outcome: TrialOutcome | null | undefined) {
  if (outcome?.kind !== 'fitted') throw new Error(`expected figures; found ${outcome?.kind}`);
  return outcome.figures;
}

/** What a trial says of a group, read off the fit of that group. */
function figuresOfFit({ result }: FitReply) {
  if (result?.standing == null) throw new Error('expected a fit with a standing');
  const figure = ({ estimate, standardError, low, high }: typeof result.standing) => ({
    estimate,
    standardError,
    low,
    high,
  });
  return {
    hash: result.hash,
    companies: result.sample.companies,
    ranked: result.intercepts.length,
    slopes: result.slopes.map(({ name, estimate, standardError, low, high }) => ({
      name,
      estimate,
      standardError,
      low,
      high,
    })),
    standing: figure(result.standing),
    rankSet: result.standing.rankSet,
  };
}

describe('trying a peer group out', () => {
  let database: TestDatabase;
  let server: TestServer;
  let admin: pg.Client;
  let analyst: TestClient;
  let panelVersionId: string;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    analyst = await signUp(server, 'Trials');
    panelVersionId = await importPanel(analyst);
  });

  afterAll(async () => {
    await admin.end();
    await server.close();
    await database.drop();
  });

  async function start(client: TestClient, body: object): Promise<PeerTrialReply> {
    const reply = await client.post('/api/peer-trials', body);
    expect(reply.status).withContext(reply.text).toBe(202);
    return PeerTrialReply.parse(reply.body);
  }

  async function read(client: TestClient, id: string): Promise<PeerTrialReply> {
    return PeerTrialReply.parse((await client.get(`/api/peer-trials/${id}`)).body);
  }

  function ended(client: TestClient, id: string): Promise<PeerTrialReply> {
    return eventually('the end of a trial', async () => {
      const found = await read(client, id);
      return ['queued', 'running'].includes(found.state) ? undefined : found;
    });
  }

  async function tried(change: object = {}): Promise<PeerTrialReply> {
    const body = {
      panelVersionId,
      ownCompany: own,
      peers,
      candidates,
      specification: {},
      ...change,
    };
    const trial = await ended(analyst, (await start(analyst, body)).id);
    expect(trial.state).toBe('done');
    return trial;
  }

  let groupId: string | null = null;
  async function saveAndFit(members: readonly string[], specification: object): Promise<FitReply> {
    const out = ['C10', 'C11'].map((company) => ({ company, isIncluded: false, reason: 'Other.' }));
    const saved = await analyst.post('/api/peer-groups', {
      panelVersionId,
      ownCompany: own,
      note: '',
      parentId: groupId,
      peers: [
        ...members.map((company) => ({ company, isIncluded: true, reason: 'Near.' })),
        ...out,
      ],
    });
    groupId = idOf(saved, 201);
    return runFit(analyst, groupId, specification);
  }

  it('gives to the last digit what saving and fitting each group gives', async () => {
    for (const specification of [
      {},
      { effects: 'company,year', form: 'log', lag: 1, slopes: 'cr1', confidence: 0.9 },
    ] as const) {
      const trial = await tried({ specification });
      expect(trial.progress).toEqual({ done: 8, total: 8 });
      const groups: [TrialOutcome | null, readonly string[]][] = [
        [trial.chosen, peers],
        ...trial.without.map(({ company, outcome }): [TrialOutcome | null, readonly string[]] => [
          outcome,
          peers.filter((peer) => peer !== company),
        ]),
        ...trial.taking.map(({ company, outcome }): [TrialOutcome | null, readonly string[]] => [
          outcome,
          [...peers, company],
        ]),
      ];
      expect(groups.length).toBe(8);
      for (const [outcome, members] of groups)
        expect(figuresOf(outcome))
          .withContext(members.join())
          .toEqual(figuresOfFit(await saveAndFit(members, specification)));
    }
  });

  it('answers the same request, in whichever order, with the trial that exists', async () => {
    const first = await tried();
    const again = await tried({
      peers: [...peers].reverse(),
      candidates: [...candidates].reverse(),
    });
    expect(again.id).toBe(first.id);
    expect((await tried({ candidates: ['C03'] })).id).not.toBe(first.id);
  });

  async function keptFits(): Promise<number> {
    const { rows } = await admin.query<{ count: number }>(
      'select count(*)::integer as count from trial_fit',
    );
    return rows[0].count;
  }

  it('fits no group twice that a changed choice has in common with an earlier one', async () => {
    const first = await tried({ specification: { confidence: 0.8 } });
    const before = await keptFits();
    const marked = figuresOf(first.without[0].outcome).hash;
    await admin.query(
      `update trial_fit set outcome = jsonb_set(outcome, '{figures,companies}', '99') where hash = $1`,
      [marked],
    );
    const [left, ...rest] = peers;
    const changed = await tried({
      peers: rest,
      candidates: [left],
      specification: { confidence: 0.8 },
    });
    expect(figuresOf(changed.chosen)).toEqual({
      ...figuresOf(first.without[0].outcome),
      companies: 99,
    });
    expect(figuresOf(changed.taking[0].outcome)).toEqual(figuresOf(first.chosen));
    expect((await keptFits()) - before)
      .withContext('new are the groups without two members')
      .toBe(4);
  });

  it('says why a group has no figures, and goes on', async () => {
    const trial = await tried({ peers: ['C05'], candidates: ['C03'] });
    expect(trial.chosen?.kind).toBe('fitted');
    const [alone] = trial.without;
    const { code, detail } = alone.outcome as Extract<TrialOutcome, { kind: 'refused' }>;
    expect([alone.company, code]).toEqual(['C05', 'too-few-companies']);
    expect(detail).toMatch(/compan/);
    expect(figuresOf(trial.taking[0].outcome).companies).toBe(3);
  });

  it('takes companies of the panel alone, each once', async () => {
    const body = { panelVersionId, ownCompany: own, specification: {} };
    const reply = await analyst.post('/api/peer-trials', {
      ...body,
      peers: ['C01', 'Elsewhere', own],
      candidates: ['C01'],
    });
    expect(reply.status).toBe(400);
    const { errors } = reply.body as { errors: { pointer: string }[] };
    expect(errors.map(({ pointer }) => pointer)).toEqual(['/peers/1', '/peers/2', '/candidates/0']);
    const columns = await analyst.post('/api/peer-trials', {
      ...body,
      peers,
      candidates: [],
      specification: { furtherRegressors: ['nothing'] },
    });
    const wrong = columns.body as { errors: { pointer: string }[] };
    expect(wrong.errors.map(({ pointer }) => pointer)).toEqual([
      '/specification/furtherRegressors/0',
    ]);
  });

  it('leaves the nearest sixty of many members out, all of them in the group', async () => {
    const client = await signUp(server, 'Large');
    const version = await importPanel(client, madeUpPanel(64));
    const members = Array.from({ length: 63 }, (_, index) => `F${index + 1}`);
    const body = { panelVersionId: version, ownCompany: 'F0', peers: members, candidates: [] };
    const trial = await ended(client, (await start(client, { ...body, specification: {} })).id);
    expect(trial.without.map(({ company }) => company)).toEqual(members.slice(0, 60));
    expect(figuresOf(trial.chosen).companies).toBe(64);
    expect(figuresOf(trial.without[59].outcome).companies).toBe(63);
  });

  it('stops soon once it is cancelled, with what came until then, and keeps nobody waiting', async () => {
    const client = await signUp(server, 'Cancelled');
    const version = await importPanel(client, madeUpPanel(40));
    const members = Array.from({ length: 39 }, (_, index) => `F${index + 1}`);
    const body = { panelVersionId: version, ownCompany: 'F0', peers: members, candidates: [] };
    const slow = await start(client, { ...body, specification: { slopes: 'wild', seed: 1 } });
    await eventually('a first group', async () => (await read(client, slow.id)).progress.done > 0);
    const path = `/api/peer-trials/${slow.id}`;
    expect((await client.delete(path)).status).toBe(204);
    const small = await start(client, { ...body, peers: ['F1', 'F2'], specification: {} });
    expect((await ended(client, small.id)).state).toBe('done');
    const stopped = await read(client, slow.id);
    expect(stopped.state).toBe('cancelled');
    expect(stopped.progress.done).toBeLessThan(40);
    expect(stopped.chosen?.kind).toBe('fitted');
    expect(stopped.without.at(-1)?.outcome).toBeNull();
    expect((await client.delete(path)).status)
      .withContext('it has ended')
      .toBe(409);
    const anew = await start(client, { ...body, specification: { slopes: 'wild', seed: 1 } });
    expect(anew.id).withContext('a cancelled one may be asked for anew').not.toBe(slow.id);
    expect((await client.delete(`/api/peer-trials/${anew.id}`)).status).toBe(204);
  });

  it('goes on where a server died, and says so when no try could end it', async () => {
    const { id } = await tried({ specification: { confidence: 0.7 } });
    const [half, given] = [randomUUID(), randomUUID()];
    const refused = [{ kind: 'refused', code: 'kept', detail: 'Kept.', subjects: [] }];
    for (const [copy, key] of [
      [half, 'half'],
      [given, 'given'],
    ])
      await admin.query(
        `insert into peer_trial (workspace_id, id, panel_version_id, request, request_key, state,
            outcomes, created_by)
          select workspace_id, $2, panel_version_id, request, $3, 'running', $4, created_by
          from peer_trial where id = $1`,
        [id, copy, key, JSON.stringify(refused)],
      );
    await queue(half, 0);
    const done = await ended(analyst, half);
    expect([done.state, done.chosen]).toEqual(['done', refused[0] as TrialOutcome]);
    expect(figuresOf(done.without[0].outcome).companies).toBe(5);
    await admin.query(`update peer_trial set request = '{}' where id = $1`, [given]);
    await queue(given, 4);
    const failed = await eventually('the end', async () => {
      const { rows } = await admin.query<{ state: string; failure: string | null }>(
        'select state, failure from peer_trial where id = $1',
        [given],
      );
      return rows[0].state === 'running' ? undefined : rows[0];
    });
    expect(failed.state).toBe('failed');
    expect(failed.failure).toContain('Start it again');
  });

  /** Queues a job of a trial that was tried so many times. */
  async function queue(trialId: string, retries: number): Promise<void> {
    const ticketId = randomUUID();
    await admin.query(
      `insert into job_ticket (id, workspace_id, kind, subject_id)
        select $1, workspace_id, 'peer-trial', id from peer_trial where id = $2`,
      [ticketId, trialId],
    );
    await admin.query(
      `insert into pgboss.job (name, data, retry_limit, retry_count)
        values ('peer-trial', $1, 4, $2)`,
      [{ ticketId }, retries],
    );
  }

  it('is for analysts, and of one workspace', async () => {
    const { id } = await tried();
    const other = await signUp(server, 'Other');
    expect((await other.get(`/api/peer-trials/${id}`)).status).toBe(404);
    expect((await other.delete(`/api/peer-trials/${id}`)).status).toBe(404);
    const cfo = await join(server, analyst, ['cfo']);
    expect((await cfo.get(`/api/peer-trials/${id}`)).status).toBe(403);
    const body = { panelVersionId, ownCompany: own, peers, candidates, specification: {} };
    expect((await other.post('/api/peer-trials', body)).status).toBe(404);
    expect((await cfo.post('/api/peer-trials', body)).status).toBe(403);
  });

  it('is done for three choices at a time in a workspace', async () => {
    const { id } = await tried();
    const waiting = await admin.query<{ id: string }>(
      `insert into peer_trial (workspace_id, id, panel_version_id, request, request_key, state, created_by)
        select workspace_id, gen_random_uuid(), panel_version_id, request, 'waiting ' || number,
          'queued', created_by
        from peer_trial, generate_series(1, 3) as number where id = $1
        returning id`,
      [id],
    );
    const body = { panelVersionId, ownCompany: own, candidates: [], specification: {} };
    const refused = await analyst.post('/api/peer-trials', { ...body, peers: ['C10'] });
    expect(refused.status).toBe(429);
    for (const row of waiting.rows)
      expect((await analyst.delete(`/api/peer-trials/${row.id}`)).status).toBe(204);
  });
});
