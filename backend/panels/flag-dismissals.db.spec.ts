import type { TestDatabase } from '../../db/testing/test-database';
import type { FlagDismissal, FlagDismissalsReply, PanelVersionSummary } from '../contract';
import { signUp, type TestClient } from '../testing/test-client';
import { idOf, importPanel, referenceMapping } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

const text =
  'company,year,value,inv,capital\nArvo,2001,10,1,5\nArvo,2003,11,,5.5\nBirk,2001,-4,2,3\n';

describe('dismissed flags', () => {
  let database: TestDatabase;
  let server: TestServer;
  let analyst: TestClient;
  let version: PanelVersionSummary;
  let path: string;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
  });

  beforeEach(async () => {
    analyst = await signUp(server);
    await importPanel(analyst, text, referenceMapping);
    const listed = await analyst.get('/api/panel-versions');
    [version] = (listed.body as { versions: PanelVersionSummary[] }).versions;
    path = `/api/panels/${version.panelId}/flag-dismissals`;
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  const sign = {
    ...{ company: 'Birk', year: 2001, column: 0, code: 'sign', value: -4 },
    reason: 'As reported.',
  };
  const gap = { ...sign, company: 'Arvo', year: 2002, column: null, code: 'year-gap', value: null };
  const listed = async () => ((await analyst.get(path)).body as FlagDismissalsReply).dismissals;
  const correct = async (id: string, value: number) =>
    idOf(
      await analyst.post(`/api/panel-versions/${id}/corrections`, {
        note: 'x',
        cells: [
          { company: 'Birk', year: 2001, column: 0, value, reason: 'Misread', source: 'Report' },
        ],
        addedRows: [],
        removedRows: [],
      }),
      201,
    );

  it('are kept with who, when and why, once a flag, until they are taken back', async () => {
    const made = await analyst.post(path, sign);
    expect(made.status).toBe(201);
    const dismissal = made.body as FlagDismissal;
    expect(dismissal).toEqual({
      ...sign,
      code: 'sign',
      id: dismissal.id,
      at: dismissal.at,
      by: 'Founder',
    });
    expect((await analyst.post(path, sign)).status).toBe(409);
    const whole = (await analyst.post(path, gap)).body as FlagDismissal;
    expect((await analyst.post(path, gap)).status).toBe(409);
    expect((await listed()).map(({ id }) => id)).toEqual([whole.id, dismissal.id]);
    expect((await analyst.delete(`${path}/${dismissal.id}`)).status).toBe(204);
    expect((await analyst.delete(`${path}/${dismissal.id}`)).status).toBe(404);
    expect(await listed()).toEqual([whole]);
  });

  it('hold for the value of the newest version: another one is a flag of its own', async () => {
    expect((await analyst.post(path, sign)).status).toBe(201);
    await correct(version.id, -5);
    const late = await analyst.post(path, sign);
    expect(late.status).toBe(409);
    expect((late.body as { detail: string }).detail).toContain(
      '“value” of Birk 2001 is -5 in version 2; it was -4',
    );
    expect((await analyst.post(path, { ...sign, value: -5 })).status).toBe(201);
    expect((await listed()).map(({ value }) => value)).toEqual([-5, -4]);
  });

  it('stand at a place of the panel: a cell that it has, or a year that it lacks', async () => {
    for (const [wrong, status] of [
      [{ ...sign, company: 'Nobody' }, 400],
      [{ ...sign, column: 3 }, 400],
      [{ ...sign, code: 'year-gap' }, 400],
      [{ ...gap, code: 'sign' }, 400],
      [{ ...gap, code: 'duplicate' }, 400],
      [{ ...gap, year: 2001, code: 'duplicate', value: 1 }, 400],
      [{ ...gap, company: 'Nobody' }, 400],
      [{ ...gap, value: 1 }, 400],
      [{ ...gap, year: 2000 }, 400],
      [{ ...gap, year: 2004 }, 400],
      [{ ...gap, year: 2003 }, 409],
      [{ ...sign, reason: ' ' }, 400],
    ] as const)
      expect((await analyst.post(path, wrong)).status)
        .withContext(JSON.stringify(wrong))
        .toBe(status);
    expect(await listed()).toEqual([]);
  });

  it('are of a whole row where a company may stand in twice, of a cell where its figures do', async () => {
    const twice = { ...gap, year: 2001, code: 'duplicate' };
    expect((await analyst.post(path, twice)).status).toBe(201);
    expect((await analyst.post(path, { ...sign, code: 'duplicate' })).status).toBe(201);
    expect((await listed()).map(({ code, column }) => [code, column])).toEqual([
      ['duplicate', 0],
      ['duplicate', null],
    ]);
  });

  it('stay with a column of the model that a later file calls otherwise', async () => {
    expect((await analyst.post(path, sign)).status).toBe(201);
    const mapping = { ...referenceMapping, marketValue: 'worth' };
    await importPanel(analyst, text.replace('value', 'worth'), mapping);
    expect((await listed()).map(({ column }) => column)).toEqual([0]);
  });

  it('stay with their column, wherever a later version has it', async () => {
    const wide = 'company,year,value,inv,capital,staff,debt\nArvo,2001,10,1,5,,\n';
    const of = (others: readonly string[]) =>
      importPanel(analyst, wide, { ...referenceMapping, others });
    await of(['staff']);
    const missing = { ...sign, company: 'Arvo', column: 3, code: 'missing', value: null };
    expect((await analyst.post(path, missing)).status).toBe(201);
    await of(['debt', 'staff']);
    expect((await listed()).map(({ column }) => column)).toEqual([4]);
    await of(['debt']);
    expect(await listed()).toEqual([]);
    expect((await analyst.post(path, missing)).status).toBe(201);
    expect((await listed()).map(({ column }) => column)).toEqual([3]);
  });

  it('are of one panel: another panel of the workspace shows none and takes none back', async () => {
    const made = (await analyst.post(path, sign)).body as FlagDismissal;
    await importPanel(analyst, text, { ...referenceMapping, panelName: 'Another' });
    const versions = (await analyst.get('/api/panel-versions')).body as {
      versions: PanelVersionSummary[];
    };
    const other = `/api/panels/${versions.versions[0].panelId}/flag-dismissals`;
    expect((await analyst.get(other)).body).toEqual({ dismissals: [] });
    expect((await analyst.delete(`${other}/${made.id}`)).status).toBe(404);
    expect((await listed()).length).toBe(1);
  });
});
