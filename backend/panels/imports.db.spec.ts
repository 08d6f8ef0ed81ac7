import type { TestDatabase } from '../../db/testing/test-database';
import type { ImportReply, PanelVersionReply, PanelVersionsReply } from '../contract';
import { signUp, type TestClient } from '../testing/test-client';
import {
  commitImport,
  idOf,
  importPanel,
  importThatEnded,
  referenceMapping,
  referencePanel,
} from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

describe('imports', () => {
  let database: TestDatabase;
  let server: TestServer;
  let analyst: TestClient;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
  });

  beforeEach(async () => {
    analyst = await signUp(server);
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  async function check(text: string, mapping: object = referenceMapping): Promise<ImportReply> {
    const uploaded = await analyst.upload('/api/imports', 'panel.csv', text);
    const id = idOf(uploaded, 201);
    const checked = await analyst.put(`/api/imports/${id}/mapping`, mapping);
    expect(checked.status).toBe(200);
    return checked.body as ImportReply;
  }

  it('show the first rows with their lines and guess which column is what', async () => {
    const reply = (await analyst.upload('/api/imports', 'my_panel.csv', referencePanel()))
      .body as ImportReply;
    expect(reply.headers).toEqual(['company', 'year', 'inv', 'value', 'capital']);
    expect(reply.rowCount).toBe(220);
    expect(reply.firstRows[0]).toEqual({
      row: 2,
      cells: ['C01', '1935', '2.938', '30.284', '52.011'],
    });
    expect(reply.mapping).toEqual(
      jasmine.objectContaining({
        panelName: 'my panel',
        company: 'company',
        year: 'year',
        marketValue: 'value',
        capex: 'inv',
        bookEquity: 'capital',
        reading: reply.reading,
      }),
    );
    expect([reply.sheets, reply.reading.headerRow, reply.state]).toEqual([[], 1, 'mapped']);
  });

  it('say row by row what was found, and do not commit while something blocks', async () => {
    const text =
      'company,year,value,inv,capital\nA,2001,1,2,3\nA,2001,1,2,3\nA,2002,x,2,3\nB,2001,,2,3\n,2003,1,1,1\nB,20x2,1,1,1\n';
    const reply = await check(text);
    const found = reply.check?.findings.map(({ row, code, isBlocking }) => [row, code, isBlocking]);
    expect(found).toEqual(
      jasmine.arrayContaining([
        [4, 'not-a-number', true],
        [5, 'missing', false],
        [6, 'no-company', false],
        [7, 'year', true],
      ]),
    );
    expect(found?.some(([, code]) => code === 'duplicate')).toBeTrue();
    const commit = await analyst.post(`/api/imports/${reply.id}/commit`, { note: '' });
    expect(commit.status).toBe(422);
    expect((await analyst.get('/api/panel-versions')).body).toEqual({ versions: [] });
  });

  it('commit once however often they are asked, and the same panel again as the next version', async () => {
    const reply = await check(referencePanel());
    const commits = await Promise.all(
      Array.from({ length: 5 }, () =>
        analyst.post(`/api/imports/${reply.id}/commit`, { note: 'first' }),
      ),
    );
    for (const commit of commits) expect(idOf(commit, 202)).toBe(reply.id);
    const ended = await importThatEnded(analyst, reply.id);
    const again = await analyst.post(`/api/imports/${reply.id}/commit`, { note: 'again' });
    expect((again.body as ImportReply).panelVersionId).toBe(ended.panelVersionId);
    const next = await importPanel(analyst);
    const { versions } = (await analyst.get('/api/panel-versions')).body as PanelVersionsReply;
    expect(
      versions.map(({ id, number, parentId, origin, note }) => [
        id,
        number,
        parentId,
        origin,
        note,
      ]),
    ).toEqual([
      [next, 2, ended.panelVersionId, 'import', 'first'],
      [ended.panelVersionId ?? '', 1, null, 'import', 'first'],
    ]);
    expect((await analyst.delete(`/api/imports/${reply.id}`)).status).toBe(409);
  });

  it('keep cells, lines and the file itself exactly', async () => {
    const id = await importPanel(analyst);
    const panel = (await analyst.get(`/api/panel-versions/${id}`)).body as PanelVersionReply;
    expect(panel.rows.company.length).toBe(220);
    const at = panel.rows.fileRow.indexOf(2);
    expect(panel.rows.values.map((column) => column[at])).toEqual([30.284, 2.938, 52.011]);
    const file = await analyst.get(`/api/files/${panel.version.file.id}`);
    expect(file.headers['content-disposition']).toBe('attachment; filename=panel.csv');
    expect(file.headers['content-security-policy']).toContain('sandbox');
    expect(Buffer.from(file.body as Buffer).toString()).toBe(referencePanel());
  });

  it('open the sample panel, checked and ready to commit', async () => {
    const sample = (await analyst.post('/api/imports/sample')).body as ImportReply;
    expect(sample.check?.blockingCount).toBe(0);
    expect(sample.check?.companies).toBe(14);
    expect(await commitImport(analyst, sample.id)).toMatch(/^[0-9a-f-]{36}$/);
  });

  it('refuse what is no CSV, what is too large, and what is no table, each in its own words', async () => {
    expect((await analyst.upload('/api/imports', 'panel.exe', 'x')).status).toBe(415);
    const large = Buffer.alloc(40 * 1024 * 1024 + 1, 'x');
    expect((await analyst.upload('/api/imports', 'panel.csv', large)).status).toBe(413);
    const refusals: readonly (readonly [string, number, string])[] = [
      ['', 422, 'csv_invalid'],
      ['a,b\n\0,1\n', 415, 'type_not_allowed'],
      [`company,year\n${'x'.repeat(70_000)},1\n`, 422, 'csv_invalid'],
    ];
    for (const [content, status, code] of refusals) {
      const reply = await analyst.upload('/api/imports', 'panel.csv', content);
      expect(reply.status).withContext(content.slice(0, 20)).toBe(status);
      expect((reply.body as { code: string }).code).toBe(code);
      expect((reply.body as { detail: string }).detail.length).toBeGreaterThan(20);
    }
    expect((await analyst.get('/api/session')).status).toBe(200);
  });

  it('refuse a table of more cells than can be read in its memory', async () => {
    const wide = `c,y,${Array.from({ length: 190 }, (_, column) => `v${column}`).join(',')}`;
    const row = `A,2000,${Array.from({ length: 190 }, () => '1').join(',')}`;
    const text = `${wide}\n${`${row}\n`.repeat(100_000)}`.slice(0, 39 * 1024 * 1024);
    const reply = await analyst.upload('/api/imports', 'panel.csv', text);
    expect(reply.status).toBe(413);
    expect((await analyst.get('/api/session')).status).toBe(200);
  });

  it('name a column that is chosen twice or is not there', async () => {
    const uploaded = await analyst.upload('/api/imports', 'panel.csv', referencePanel());
    const path = `/api/imports/${idOf(uploaded, 201)}/mapping`;
    const twice = await analyst.put(path, { ...referenceMapping, capex: 'value' });
    expect(twice.status).toBe(400);
    expect((twice.body as { errors: unknown[] }).errors).toEqual([
      { pointer: '/capex', detail: '“value” is chosen for two things' },
    ]);
    const absent = await analyst.put(path, { ...referenceMapping, bookEquity: 'none' });
    expect(absent.status).toBe(400);
  });
});
