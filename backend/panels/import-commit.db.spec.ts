import { randomInt } from 'node:crypto';
import { setTimeout as pause } from 'node:timers/promises';
import pg from 'pg';
import type { TestDatabase } from '../../db/testing/test-database';
import type { ImportReply, PanelVersionsReply } from '../contract';
import { inventedPanelCsv, inventedPanelMapping } from '../testing/invented-panel';
import { signUp, type TestClient } from '../testing/test-client';
import { idOf, importThatEnded, referenceMapping, referencePanel } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';
import type { Actor } from './import-draft';

const longestMs = 120_000;
/** Of a wait within a spec: it says what was waited for before the runner ends the spec without a word. */
const longestWaitMs = 60_000;

describe('a commit of an import', () => {
  let database: TestDatabase;
  let admin: pg.Client;
  let server: TestServer;
  let other: TestServer;
  let analyst: TestClient;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    [server, other] = await Promise.all([startTestServer(database), startTestServer(database)]);
  });

  beforeEach(async () => {
    analyst = await signUp(server);
  });

  afterAll(async () => {
    await Promise.all([server.close(), other.close()]);
    await admin.end();
    await database.drop();
  });

  async function checked(text: string, mapping: object): Promise<string> {
    const id = idOf(await analyst.upload('/api/imports', 'panel.csv', text), 201);
    idOf(await analyst.put(`/api/imports/${id}/mapping`, mapping), 200);
    return id;
  }

  const here = async (id: string): Promise<string> =>
    server.composition.services.commits.finish(await me(), id, '');

  const commit = (id: string) => analyst.post(`/api/imports/${id}/commit`, { note: '' });

  async function me(): Promise<Actor> {
    const { session } = (await analyst.get('/api/session')).body as {
      session: { person: { id: string }; workspace: { id: string } };
    };
    return { personId: session.person.id, workspaceId: session.workspace.id };
  }

  async function versions(): Promise<PanelVersionsReply['versions']> {
    return ((await analyst.get('/api/panel-versions')).body as PanelVersionsReply).versions;
  }

  async function rowsWritten(): Promise<number> {
    const { workspaceId } = await me();
    const found = await admin.query<{ count: number }>(
      'select count(*)::integer as count from panel_row where workspace_id = $1',
      [workspaceId],
    );
    return found.rows[0].count;
  }

  /** Until rows are being written. @returns the process of the database that writes them. */
  async function untilWriting(): Promise<number> {
    for (const until = Date.now() + longestWaitMs; Date.now() < until;) {
      const found = await admin.query<{ pid: number }>(`select pid from pg_stat_activity
        where datname = current_database() and query like 'insert into panel_row%'
          and application_name = 'kinvale-work' and xact_start is not null`);
      if (found.rows.length > 0) return found.rows[0].pid;
      await pause(1);
    }
    const found = await admin.query<{ state: string; failure: string | null }>(
      'select state, failure from import_draft order by created_at desc limit 1',
    );
    const { state, failure } = found.rows[0];
    throw new Error(
      `expected rows being written within ${longestWaitMs / 1000} s; the import is ${state}: ${failure ?? 'no reason'}`,
    );
  }

  it(
    'leaves nothing when it is cancelled, whenever that is, and can be asked for again at once',
    async () => {
      const rows = 10_000;
      const id = await checked(inventedPanelCsv(rows), inventedPanelMapping('Panel'));
      const started = Date.now();
      let wasCommitted = false;
      for (let attempt = 0; attempt < 6 && !wasCommitted; attempt++) {
        expect((await commit(id)).status).toBe(202);
        if (attempt === 0) await untilWriting();
        else await pause(randomInt(Date.now() - started));
        const { status } = await analyst.delete(`/api/imports/${id}/commit`);
        wasCommitted = status === 409;
        expect([204, 409]).toContain(status);
        const { state, progress } = (await analyst.get(`/api/imports/${id}`)).body as ImportReply;
        expect(state).toBe(wasCommitted ? 'committed' : 'checked');
        expect(progress).toBeNull();
        if (!wasCommitted) expect(await versions()).toEqual([]);
      }
      await commit(id);
      expect((await importThatEnded(analyst, id)).state).toBe('committed');
      await pause(300);
      expect((await versions()).map(({ rows: count }) => count)).toEqual([rows]);
      expect(await rowsWritten()).toBe(rows);
      expect((await analyst.delete(`/api/imports/${id}/commit`)).status).toBe(409);
    },
    longestMs,
  );

  it(
    'is one version, whole, though the database cuts its connection off in the middle',
    async () => {
      const rows = 30_000;
      const id = await checked(inventedPanelCsv(rows), inventedPanelMapping('Panel'));
      await commit(id);
      await admin.query('select pg_terminate_backend($1)', [await untilWriting()]);
      expect(await rowsWritten()).toBe(0);
      expect((await importThatEnded(analyst, id)).state).toBe('committed');
      expect((await versions()).map(({ number, rows: count }) => [number, count])).toEqual([
        [1, rows],
      ]);
      expect(await rowsWritten()).toBe(rows);
    },
    longestMs,
  );

  it(
    'gives way to one of the same panel at the same time, and follows it once it is checked again',
    async () => {
      const mapping = inventedPanelMapping('Panel');
      const ids = [
        await checked(inventedPanelCsv(4000), mapping),
        await checked(inventedPanelCsv(6000), mapping),
      ];
      const actor = await me();
      const [one, another] = [server, other].map(({ composition }) => composition.services.commits);
      const made = await Promise.allSettled([
        one.finish(actor, ids[0], 'here'),
        another.finish(actor, ids[1], 'there'),
      ]);
      expect(made.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
      const late = ids[made.findIndex(({ status }) => status === 'rejected')];
      expect((await versions()).map(({ number }) => number)).toEqual([1]);
      idOf(await analyst.put(`/api/imports/${late}/mapping`, mapping), 200);
      await one.finish(actor, late, 'again');
      const found = await versions();
      expect(found.map(({ number }) => number).sort()).toEqual([1, 2]);
      const [first, second] = [1, 2].map((number) => found.find((row) => row.number === number));
      expect([first?.parentId, second?.parentId]).toEqual([null, first?.id]);
      expect(second?.panelId).toBe(first?.panelId ?? '');
    },
    longestMs,
  );

  it('is refused when the panel was corrected since the check, and changes nothing', async () => {
    const first = await here(await checked(referencePanel(), referenceMapping));
    const id = await checked(referencePanel(), referenceMapping);
    const correction = {
      ...{ company: 'C01', year: 1935, column: 0, value: 99 },
      ...{ reason: 'Misread', source: 'Annual report' },
    };
    const edit = { note: 'mended', cells: [correction], addedRows: [], removedRows: [] };
    const corrected = await analyst.post(`/api/panel-versions/${first}/corrections`, edit);
    const latestId = idOf(corrected, 201);
    const refused = await commit(id);
    expect(refused.status).toBe(409);
    const problem = refused.body as { type: string; detail: string; latestId: string };
    expect(problem.type).toMatch(/\/stale-version$/);
    expect(problem.latestId).toBe(latestId);
    expect(problem.detail).toContain('Founder made version 2 of “Reference” after this file was');
    expect(((await analyst.get(`/api/imports/${id}`)).body as ImportReply).state).toBe('checked');
    const again = await analyst.put(`/api/imports/${id}/mapping`, referenceMapping);
    expect((again.body as ImportReply).check?.changes?.changedCells).toBe(1);
    expect(await here(id)).not.toBe(latestId);
    expect((await versions()).map(({ number }) => number).sort()).toEqual([1, 2, 3]);
  });

  it('fails in words when the panel gets another version before its rows are written', async () => {
    const first = await here(await checked(referencePanel(), referenceMapping));
    const id = await checked(referencePanel(), referenceMapping);
    const { workspaceId } = await me();
    await admin.query('begin');
    await admin.query('select pg_advisory_xact_lock(hashtextextended($1, 0))', [
      `${workspaceId} ${referenceMapping.panelName}`,
    ]);
    expect((await commit(id)).status).toBe(202);
    await admin.query(
      `insert into panel_version (workspace_id, id, panel_id, number, parent_id, file_id, currency,
          unit, company_header, year_header, columns, note, companies, row_count, first_year,
          last_year, created_by)
        select workspace_id, gen_random_uuid(), panel_id, 2, id, file_id, currency, unit,
          company_header, year_header, columns, note, companies, row_count, first_year, last_year,
          created_by
        from panel_version where id = $1`,
      [first],
    );
    await admin.query('commit');
    const { state, failure } = await importThatEnded(analyst, id);
    expect(state).toBe('failed');
    expect(failure).toContain('Founder made version 2 of “Reference” after this file was checked');
    expect(await rowsWritten()).toBe(220);
  });

  it('holds the import: nobody maps, reads or discards it meanwhile', async () => {
    const id = await checked(referencePanel(), referenceMapping);
    await admin.query(
      `update import_draft set state = 'committing', commit_id = gen_random_uuid(), note = '',
        committed_by = created_by, progress = '{"done":5,"of":220}' where id = $1`,
      [id],
    );
    const reply = (await analyst.get(`/api/imports/${id}`)).body as ImportReply;
    expect(reply.progress).toEqual({ done: 5, of: 220 });
    const path = `/api/imports/${id}`;
    expect((await analyst.put(`${path}/mapping`, referenceMapping)).status).toBe(409);
    expect((await analyst.put(`${path}/reading`, reply.reading)).status).toBe(409);
    expect((await analyst.delete(path)).status).toBe(409);
    expect((await analyst.delete(`${path}/commit`)).status).toBe(204);
    expect((await analyst.delete(path)).status).toBe(204);
  });

  it('says in words why it failed, and can be asked for again', async () => {
    const id = await checked(referencePanel(), referenceMapping);
    const swap = `update stored_file set content = $2 where id =
      (select file_id from import_draft where id = $1)`;
    await admin.query(swap, [id, Buffer.alloc(20)]);
    await commit(id);
    const failed = await importThatEnded(analyst, id);
    expect(failed.state).toBe('failed');
    expect(failed.failure?.length).toBeGreaterThan(20);
    expect(failed.panelVersionId).toBeNull();
    expect(await versions()).toEqual([]);
    await admin.query(swap, [id, Buffer.from(referencePanel())]);
    expect(((await commit(id)).body as ImportReply).failure).toBeNull();
    expect((await importThatEnded(analyst, id)).state).toBe('committed');
  });

  it('waits for others of the workspace: three are made at a time', async () => {
    const id = await checked(referencePanel(), referenceMapping);
    const { workspaceId } = await me();
    await admin.query(
      `insert into import_draft (workspace_id, id, file_id, state, preview, mapping, created_by,
          note, commit_id, committed_by)
        select workspace_id, gen_random_uuid(), file_id, 'committing', preview, mapping, created_by,
          '', gen_random_uuid(), created_by
        from import_draft, generate_series(1, 3) where workspace_id = $1`,
      [workspaceId],
    );
    const refused = await commit(id);
    expect(refused.status).toBe(429);
    expect((refused.body as { type: string }).type).toMatch(/\/quota$/);
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0);
    await admin.query(
      `update import_draft set state = 'checked' where workspace_id = $1 and id <> $2`,
      [workspaceId, id],
    );
    expect((await commit(id)).status).toBe(202);
    expect((await importThatEnded(analyst, id)).state).toBe('committed');
  });

  it(
    'of 200,000 rows leaves the server free for others',
    async () => {
      const rows = 200_000;
      const id = await checked(inventedPanelCsv(rows), inventedPanelMapping('Panel'));
      const started = performance.now();
      await commit(id);
      const waits: number[] = [];
      let progress: ImportReply['progress'] = null;
      for (let state = 'committing'; state === 'committing';) {
        const asked = performance.now();
        expect((await analyst.get('/api/session')).status).toBe(200);
        waits.push(performance.now() - asked);
        const reply = (await analyst.get(`/api/imports/${id}`)).body as ImportReply;
        ({ state } = reply);
        if ((reply.progress?.done ?? 0) > 0) ({ progress } = reply);
        await pause(20);
      }
      const took = performance.now() - started;
      expect((await versions()).map(({ rows: count }) => count)).toEqual([rows]);
      expect(progress?.of).toBe(rows);
      expect(waits.length).toBeGreaterThan(20);
      // In time of the import, since machines differ: no request waits for a good part of it.
      expect(Math.max(...waits)).toBeLessThan(took / 5);
    },
    2 * longestMs,
  );
});
