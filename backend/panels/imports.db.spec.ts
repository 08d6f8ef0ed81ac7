import pg from 'pg';
import type { TestDatabase } from '../../db/testing/test-database';
import {
  ImportMapping,
  type ImportReply,
  type OpenImportsReply,
  type PanelCompaniesReply,
  type PanelVersionReply,
  type PanelVersionsReply,
} from '../contract';
import { join, signUp, type TestClient } from '../testing/test-client';
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

  async function workspaceId(): Promise<string> {
    const { session } = (await analyst.get('/api/session')).body as {
      session: { workspace: { id: string } };
    };
    return session.workspace.id;
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

  it('take a file whose long name would be cut within a character', async () => {
    const name = `${'n'.repeat(119)}😀 figures.csv`;
    const reply = await analyst.upload('/api/imports', name, referencePanel());
    expect(reply.status).toBe(201);
    const { fileName, mapping } = reply.body as ImportReply;
    expect(fileName).toBe(name);
    expect(mapping.panelName).toBe('n'.repeat(119));
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

  it('are listed until they are a panel version or discarded, to analysts of the workspace alone', async () => {
    const list = async (client: TestClient) =>
      ((await client.get('/api/imports')).body as OpenImportsReply).imports;
    expect(await list(analyst)).toEqual([]);
    const first = await check(referencePanel());
    const second = (await analyst.upload('/api/imports', 'b.csv', referencePanel()))
      .body as ImportReply;
    const third = (await analyst.upload('/api/imports', 'c.csv', referencePanel()))
      .body as ImportReply;
    const open = await list(analyst);
    expect(open.map(({ id, fileName, state, by }) => [id, fileName, state, by])).toEqual([
      [third.id, 'c.csv', 'mapped', 'Founder'],
      [second.id, 'b.csv', 'mapped', 'Founder'],
      [first.id, 'panel.csv', 'checked', 'Founder'],
    ]);
    expect(Math.abs(Date.parse(open[0].at) - Date.now())).toBeLessThan(60_000);

    expect(await list(await join(server, analyst, ['analyst']))).toEqual(open);
    const cfo = await join(server, analyst, ['cfo', 'reader', 'billing_admin']);
    expect((await cfo.get('/api/imports')).status).toBe(403);
    expect(await list(await signUp(server))).toEqual([]);

    await commitImport(analyst, first.id);
    expect((await analyst.delete(`/api/imports/${second.id}`)).status).toBe(204);
    expect((await list(analyst)).map(({ id }) => id)).toEqual([third.id]);
  });

  it('leave a line in the record when they are discarded', async () => {
    const { id } = (await analyst.upload('/api/imports', 'gone.csv', referencePanel()))
      .body as ImportReply;
    await analyst.delete(`/api/imports/${id}`);
    await analyst.delete(`/api/imports/${id}`);
    const admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    try {
      const { rows } = await admin.query(
        `select detail, (select name from person where id = person_id) as name
          from activity where workspace_id = $1 and action = 'import-discarded'`,
        [await workspaceId()],
      );
      expect(rows).toEqual([{ detail: { fileName: 'gone.csv' }, name: 'Founder' }]);
    } finally {
      await admin.end();
    }
  });

  it('are read another way on request, and the columns are chosen anew', async () => {
    const text = 'Figures of the peers;;\nfirm;year;value\nA;2001;1,5\nA;2002;2,5\n';
    const uploaded = (await analyst.upload('/api/imports', 'peers.csv', text)).body as ImportReply;
    const path = `/api/imports/${uploaded.id}/reading`;
    const first = (await analyst.put(path, { ...uploaded.reading, headerRow: 1 }))
      .body as ImportReply;
    expect(first.headers[0]).toBe('Figures of the peers');
    expect(first.topLines[1].cells.slice(0, 3)).toEqual(['firm', 'year', 'value']);
    const second = (await analyst.put(path, { ...uploaded.reading, headerRow: 2 }))
      .body as ImportReply;
    expect(second.headers).toEqual(['firm', 'year', 'value']);
    expect(second.firstRows[0]).toEqual({ row: 3, cells: ['A', '2001', '1,5'] });
    expect(second.mapping.panelName).toBe('peers');
    expect([second.state, second.reading.headerRow, second.check]).toEqual(['mapped', 2, null]);
    expect((await analyst.put(path, { ...uploaded.reading, headerRow: 900 })).status).toBe(400);
    expect((await analyst.put(path, { ...uploaded.reading, headerRow: 0 })).status).toBe(400);
  });

  it('read the file as the mapping says where that is another way', async () => {
    const text = `Title,,,,\n${referencePanel()}`;
    const uploaded = (await analyst.upload('/api/imports', 'p.csv', text)).body as ImportReply;
    const reading = { ...uploaded.reading, headerRow: 2 };
    await analyst.put(`/api/imports/${uploaded.id}/reading`, { ...reading, headerRow: 1 });
    const path = `/api/imports/${uploaded.id}/mapping`;
    const checked = await analyst.put(path, { ...referenceMapping, reading });
    expect(checked.status).withContext(checked.text).toBe(200);
    const reply = checked.body as ImportReply;
    expect([reply.headers[0], reply.reading.headerRow]).toEqual(['company', 2]);
    expect([reply.check?.rows, reply.mapping.reading]).toEqual([220, reading]);
  });

  it('keep how the file became the panel, what describes companies and each row’s currency', async () => {
    const text =
      'company,year,value,inv,capital,sector,money\n' +
      'A,2001,10,2,3,Pumps,USD\nA,2002,10,2,3,Valves,EUR\nB,2001,1,2,3,,EUR\n';
    const mapping = {
      ...referenceMapping,
      currency: 'EUR',
      attributes: ['sector'],
      conversion: {
        columns: [],
        currencies: {
          column: 'money',
          rates: [{ currency: 'USD', year: 2001, average: 0.5, yearEnd: 0.9 }],
        },
        prices: null,
        fiscalYears: { rule: 'year-of-end', usualEndMonth: 12, companies: [] },
      },
    };
    const id = await importPanel(analyst, text, mapping);
    const panel = (await analyst.get(`/api/panel-versions/${id}`)).body as PanelVersionReply;
    expect(panel.rows.values.map(([first]) => first)).toEqual([9, 1, 2.7]);
    const { companies } = (await analyst.get(`/api/panel-versions/${id}/companies`))
      .body as PanelCompaniesReply;
    expect(companies.map(({ name, attributes }) => [name, attributes])).toEqual([
      ['A', { sector: 'Valves' }],
      ['B', {}],
    ]);
    const stored = await server.composition.services.repositories.inWorkspace(
      await workspaceId(),
      async (tx) => ({
        recipe: await tx.panels.recipe(id),
        rows: await tx.panelRows.block(id, 3),
      }),
    );
    const { panelName: _, ...recipe } = ImportMapping.parse(mapping);
    expect(stored.recipe).toEqual(recipe);
    expect(stored.rows.currency).toEqual(['USD', 'EUR', 'EUR']);
  });

  it('say what would change in the newest version of the panel', async () => {
    const id = await importPanel(analyst);
    const changed = referencePanel()
      .replace('30.284', '31.5')
      .replace(/\nC11,1954[^\n]*/, '')
      .replace(/\n$/, '\nC12,1954,1,2,3\n');
    const { changes } = (await check(changed)).check ?? {};
    expect(changes).toEqual(
      jasmine.objectContaining({
        panelVersionId: id,
        number: 1,
        addedRows: 1,
        removedRows: 1,
        changedCells: 1,
      }),
    );
    expect(changes?.listed).toContain({
      company: 'C01',
      year: 1935,
      kind: 'changed-cell',
      column: 'value',
      before: 30.284,
      after: 31.5,
    });
    const other = await check(changed, { ...referenceMapping, panelName: 'Another' });
    expect(other.check?.changes).toBeNull();
  });

  it('refuse a workbook of more than 10 MB, and what says that it is larger before it is sent', async () => {
    const workbook = Buffer.alloc(10 * 1024 * 1024 + 20_000, 'x');
    const reply = await analyst.upload('/api/imports', 'panel.xlsx', workbook);
    expect(reply.status).toBe(413);
    expect((reply.body as { detail: string }).detail).toContain('10 MB');
    const declared = analyst.agent
      .post('/api/imports')
      .set('Origin', server.url)
      .set('X-XSRF-TOKEN', analyst.token)
      .set('Content-Type', 'multipart/form-data; boundary=x')
      .set('Content-Length', String(41 * 1024 * 1024));
    expect((await declared.send('--x\r\n')).status).toBe(413);
  });

  it('keep at most 500 files and 2 GB a workspace, and take more once some are gone', async () => {
    const reply = (await analyst.upload('/api/imports', 'a.csv', referencePanel()))
      .body as ImportReply;
    const admin = new pg.Client({ connectionString: database.adminUrl });
    await admin.connect();
    try {
      const id = await workspaceId();
      await admin.query(
        `insert into stored_file (workspace_id, id, name, byte_size, sha256, content, created_by)
          select workspace_id, gen_random_uuid(), name, 1, '', '', created_by
          from stored_file, generate_series(1, 499) where workspace_id = $1`,
        [id],
      );
      const more = await analyst.upload('/api/imports', 'b.csv', referencePanel());
      expect(more.status).toBe(409);
      expect((more.body as { type: string }).type).toMatch(/\/quota$/);
      expect((await analyst.delete(`/api/imports/${reply.id}`)).status).toBe(204);
      expect((await analyst.upload('/api/imports', 'b.csv', referencePanel())).status).toBe(201);

      await admin.query(`delete from stored_file where workspace_id = $1 and sha256 = ''`, [id]);
      await admin.query(`update stored_file set byte_size = 2147483647 where workspace_id = $1`, [
        id,
      ]);
      const large = await analyst.upload('/api/imports', 'c.csv', referencePanel());
      expect(large.status).toBe(409);
      expect((large.body as { detail: string }).detail).toContain('2 GB');
    } finally {
      await admin.end();
    }
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
