import { randomUUID } from 'node:crypto';
import pg from 'pg';
import type { TestDatabase } from '../db/testing/test-database';
import { type ApiRoute, apiRoutes } from './contract';
import { signUp, type TestClient, testPassword } from './testing/test-client';
import { idOf, importPanel, referencePanel, runFit, savePeers } from './testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from './testing/test-server';

/** A workspace with something of everything, under names that only it has. */
interface Filled {
  readonly client: TestClient;
  readonly ids: Readonly<Record<string, string>>;
}

async function fill(server: TestServer, canary: string): Promise<Filled> {
  const client = await signUp(server, canary);
  const { session } = (await client.get('/api/session')).body as {
    session: { person: { id: string } };
  };
  const roles = ['analyst', 'billing_admin', 'cfo'];
  expect((await client.put(`/api/members/${session.person.id}/roles`, { roles })).status).toBe(204);
  const panel = referencePanel().replaceAll('C06', `${canary}-own`);
  const uploaded = await client.upload('/api/imports', `${canary}.csv`, panel);
  const importId = idOf(uploaded, 201);
  const panelVersionId = await importPanel(client, panel);
  const peerGroupId = await savePeers(client, panelVersionId, `${canary}-own`);
  const { fit, panelVersion, result } = await runFit(client, peerGroupId);
  const corrected = await client.post(`/api/panel-versions/${panelVersionId}/corrections`, {
    ...correctionBody,
    cells: [{ ...cell, reason: canary, source: canary }],
  });
  const { panelId } = panelVersion;
  const flag = { ...cell, code: 'jump', reason: canary };
  const dismissed = await client.post(`/api/panels/${panelId}/flag-dismissals`, flag);
  const bootstrapId = randomUUID();
  const peerTrialId = randomUUID();
  const createdBy = session.person.id;
  await server.composition.services.repositories.inWorkspace(
    await workspaceOf(client),
    async (tx) => {
      await tx.bootstraps.insert({ id: bootstrapId, fitId: fit.id, seed: 7, createdBy });
      await tx.bootstraps.fail(bootstrapId, canary, new Date());
      const request = {
        ...trialOf(panelVersionId, `${canary}-own`),
        specification: { regressors: [] },
      };
      await tx.peerTrials.insert({
        id: peerTrialId,
        panelVersionId,
        request,
        requestKey: canary,
        createdBy,
      });
      await tx.peerTrials.fail(peerTrialId, canary, new Date());
      await tx.peerTrials.keepFitted(canary, { canary });
      const recipient = `${canary}@people.example`;
      const mail = { id: randomUUID(), eventKey: canary, recipient, template: 'edition-waiting' };
      await tx.mail.insert({ ...mail, detail: {} }, 60);
    },
  );
  const last = result?.prediction?.last;
  const text = { name: `${canary} plan`, note: canary };
  const plan = [{ year: (last?.year ?? 0) + 1, values: last?.regressors }];
  const saved = await client.post('/api/scenarios', { fitId: fit.id, ...text, plan });
  const published = await client.post('/api/editions', {
    fitId: fit.id,
    scenarios: [{ id: idOf(saved, 201), version: 1 }],
    confidentiality: 'confidential',
    comment: canary,
  });
  const { edition } = published.body as { edition: { id: string } };
  const invitation = await client.post('/api/members/invitations', {
    email: `${canary}@invited.example`,
    roles: ['reader'],
  });
  return {
    client,
    ids: {
      importId,
      panelVersionId,
      otherId: idOf(corrected, 201),
      panelId,
      dismissalId: idOf(dismissed, 201),
      format: 'csv',
      peerGroupId,
      peerTrialId,
      fitId: fit.id,
      fileId: panelVersion.file.id,
      scenarioId: idOf(saved, 201),
      editionId: edition.id,
      personId: session.person.id,
      invitationId: idOf(invitation, 201),
      figure: 'standing',
    },
  };
}

const cell = { company: 'C01', year: 1935, column: 0, value: 1.5 };
const trialOf = (panelVersionId: string, ownCompany: string) => ({
  panelVersionId,
  ownCompany,
  peers: ['C02'],
  candidates: [],
});
const correctionBody = { note: 'x', addedRows: [], removedRows: [] };

const bodies: Readonly<Record<string, (ids: Filled['ids']) => object>> = {
  savePeerGroup: ({ panelVersionId }) => ({
    panelVersionId,
    ownCompany: 'C01',
    note: '',
    parentId: null,
    peers: [{ company: 'C02', isIncluded: true, reason: 'x' }],
  }),
  startPeerTrial: ({ panelVersionId }) => ({
    ...trialOf(panelVersionId, 'C01'),
    specification: {},
  }),
  startFit: ({ peerGroupId }) => ({ peerGroupId }),
  startBootstrap: () => ({ seed: 1 }),
  saveDraft: () => ({
    scenarioId: null,
    name: 'x',
    note: '',
    plan: [{ year: 1955, values: [1, 1] }],
  }),
  saveScenario: ({ fitId }) => ({
    fitId,
    name: 'x',
    note: '',
    plan: [{ year: 1955, values: [1, 1] }],
  }),
  changeScenario: () => ({
    name: 'x',
    note: '',
    version: 1,
    plan: [{ year: 1955, values: [1, 1] }],
  }),
  publishEdition: ({ fitId }) => ({
    fitId,
    scenarios: [],
    confidentiality: 'confidential',
    comment: '',
  }),
  checkImport: () => ({
    panelName: 'x',
    company: 'company',
    year: 'year',
    marketValue: 'value',
    capex: 'inv',
    bookEquity: 'capital',
    others: [],
    currency: 'EUR',
    unit: 'millions',
  }),
  readImportAs: () => ({
    sheet: null,
    headerRow: 1,
    layout: { kind: 'long' },
    decimalSign: 'as-found',
  }),
  commitImport: () => ({ note: '' }),
  saveCorrections: () => ({
    ...correctionBody,
    cells: [{ ...cell, reason: 'x', source: 'x' }],
  }),
  restorePanelVersion: () => ({ note: 'x' }),
  dismissFlag: () => ({ ...cell, code: 'jump', reason: 'x' }),
  signEdition: () => ({ password: testPassword }),
  returnEdition: () => ({ comment: 'no' }),
  commentEdition: () => ({ block: 'headline', text: 'no' }),
  changeRoles: () => ({ roles: ['reader'] }),
};

/** Every route that takes an id of the other workspace, in its path or its body, answers 404 and nothing of it. */
async function tryEveryRoute(mine: Filled, other: Filled, canary: string): Promise<number> {
  let tried = 0;
  for (const [name, route] of Object.entries<ApiRoute>(apiRoutes)) {
    const body = bodies[name]?.(other.ids);
    const isAimed = /:\w+Id\b/.test(route.path) || name in bodies;
    if (!isAimed) continue;
    const query = name === 'readCellHistory' ? '?company=C01&year=1935&column=0' : '';
    const path = route.path.replace(/:(\w+)/g, (_, key: string) => other.ids[key]) + query;
    const method = route.method.toLowerCase() as 'get' | 'post' | 'put' | 'delete';
    const reply = await mine.client[method](path, body);
    tried++;
    // A draft that is not there reads as none, and discarding none changes nothing.
    if (name === 'readDraft') expect(reply.body).toEqual({ draft: null });
    else if (name !== 'discardDraft')
      expect(reply.status).withContext(`${route.method} ${path}`).toBe(404);
    expect(JSON.stringify(reply.body) + reply.text)
      .withContext(name)
      .not.toContain(canary);
  }
  for (const list of [
    'listImports',
    'listPanelVersions',
    'listPeerGroups',
    'listFits',
    'listEditions',
    'listMembers',
    'readDesk',
  ] as const) {
    const reply = await mine.client.get(apiRoutes[list].path);
    expect(reply.status).withContext(list).toBe(200);
    expect(reply.text).withContext(list).not.toContain(canary);
  }
  return tried;
}

describe('two workspaces', () => {
  let database: TestDatabase;
  let server: TestServer;
  let first: Filled;
  let second: Filled;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    first = await fill(server, 'heron');
    second = await fill(server, 'osprey');
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  it('reach nothing of each other by any route, with both walls up', async () => {
    expect(await tryEveryRoute(first, second, 'osprey')).toBeGreaterThan(25);
    expect(await tryEveryRoute(second, first, 'heron')).toBeGreaterThan(25);
  });

  it('see only their own rows by row level security alone, without any filter', async () => {
    const app = new pg.Client({ connectionString: database.appUrl });
    await app.connect();
    try {
      const tables = await app.query<{ relname: string }>(`select relname from pg_class
        where relrowsecurity and relkind = 'r' and relnamespace = 'public'::regnamespace`);
      expect(tables.rows.length).toBeGreaterThan(18);
      for (const { relname } of tables.rows) {
        const none = await app.query(`select workspace_id from ${relname}`);
        expect(none.rowCount).withContext(`${relname} without a workspace`).toBe(0);
        await app.query('begin');
        const id = await workspaceOf(first.client);
        await app.query(`select set_config('app.workspace', $1, true)`, [id]);
        const own = await app.query<{ workspace_id: string }>(
          `select workspace_id from ${relname}`,
        );
        expect(own.rows.every((row) => row.workspace_id === id))
          .withContext(relname)
          .toBeTrue();
        if (['fit_bootstrap', 'peer_trial', 'trial_fit', 'mail'].includes(relname))
          expect(own.rowCount).withContext(relname).toBe(1);
        await app.query('commit');
      }
    } finally {
      await app.end();
    }
  });

  it('cannot write a row into, or move one to, another workspace', async () => {
    const app = new pg.Client({ connectionString: database.appUrl });
    await app.connect();
    try {
      await app.query('begin');
      await app.query(`select set_config('app.workspace', gen_random_uuid()::text, true)`);
      await expectAsync(
        app.query(`insert into workspace (workspace_id, name) values (gen_random_uuid(), 'x')`),
      ).toBeRejectedWithError(/row-level security/);
      await app.query('rollback');

      const ids = await Promise.all([first, second].map(({ client }) => workspaceOf(client)));
      await app.query('begin');
      await app.query(`select set_config('app.workspace', $1, true)`, [ids[0]]);
      await expectAsync(
        app.query('update scenario set workspace_id = $1', [ids[1]]),
      ).toBeRejectedWithError(/row-level security/);
      await app.query('rollback');

      // A reference across workspaces: row level security does not see foreign keys, so the keys name the workspace.
      await app.query('begin');
      await app.query(`select set_config('app.workspace', $1, true)`, [ids[0]]);
      await expectAsync(
        app.query(
          `insert into scenario (workspace_id, id, fit_id, version, created_by)
            values ($1, gen_random_uuid(), $2, 1, $3)`,
          [ids[0], second.ids['fitId'], first.ids['personId']],
        ),
      ).toBeRejectedWithError(/foreign key/);
      await app.query('rollback');
    } finally {
      await app.end();
    }
  });
});

async function workspaceOf(client: TestClient): Promise<string> {
  const { session } = (await client.get('/api/session')).body as {
    session: { workspace: { id: string } };
  };
  return session.workspace.id;
}

describe('two workspaces with row level security taken down', () => {
  it('still reach nothing of each other: the filter of the repositories is a wall of its own', async () => {
    const database = await createMigratedDatabase();
    const admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    const server = await startTestServer(database);
    try {
      await admin.query(`do $$ declare name text; begin
        for name in select relname from pg_class where relrowsecurity and relkind = 'r' loop
          execute format('alter table %I disable row level security', name);
        end loop; end $$`);
      const mine = await fill(server, 'heron');
      const other = await fill(server, 'osprey');
      expect(await tryEveryRoute(mine, other, 'osprey')).toBeGreaterThan(25);
    } finally {
      await admin.end();
      await server.close();
      await database.drop();
    }
  });
});
