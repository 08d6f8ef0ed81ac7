import { randomUUID } from 'node:crypto';
import excel from 'exceljs';
import { insideInformationCaution, type ImportReply, type PanelVersionReply } from '../contract';
import type { TestDatabase } from '../../db/testing/test-database';
import { signUp, type TestClient } from '../testing/test-client';
import { idOf, importPanel, referenceMapping } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

const text = [
  'company,year,value,inv,capital,sector',
  '"Arvo, Steel",2001,0.1,1,5,+Steel',
  '"Arvo, Steel",2002,12345678.91234568,,-5.5,+Steel',
  '=2+3,2001,1e-7,2,3,Paper',
].join('\n');
const mapping = {
  ...referenceMapping,
  panelName: 'Größe: a/b\\c "2026"',
  attributes: ['sector'],
  currency: 'EUR',
};

describe('exports of a panel version', () => {
  let database: TestDatabase;
  let server: TestServer;
  let analyst: TestClient;
  let id: string;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    analyst = await signUp(server);
    id = await importPanel(analyst, text, mapping);
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  async function download(path: string, client = analyst): Promise<Buffer> {
    const reply = await client.agent
      .get(path)
      .buffer(true)
      .parse((res, done) => {
        const parts: Buffer[] = [];
        res.on('data', (part: Buffer) => parts.push(part));
        res.on('end', () => {
          done(null, Buffer.concat(parts));
        });
      });
    expect(reply.status).toBe(200);
    return reply.body as Buffer;
  }

  async function workbook(path: string): Promise<excel.Workbook> {
    const book = new excel.Workbook();
    await book.xlsx.load((await download(path)) as unknown as ArrayBuffer);
    return book;
  }

  const cellsOf = (sheet: excel.Worksheet | undefined): unknown[][] => {
    const lines: unknown[][] = [];
    sheet?.eachRow((row) => lines.push((row.values as unknown[]).slice(1)));
    return lines;
  };

  it('are CSV that a spreadsheet opens and computes nothing from', async () => {
    const bytes = await download(`/api/panel-versions/${id}/export/csv`);
    expect([...bytes.subarray(0, 3)]).toEqual([0xef, 0xbb, 0xbf]);
    expect(bytes.subarray(3).toString()).toBe(
      [
        'company,year,value,inv,capital,sector,amounts in',
        "'=2+3,2001,1e-7,2,3,Paper,EUR millions",
        `"Arvo, Steel",2001,0.1,1,5,'+Steel,EUR millions`,
        `"Arvo, Steel",2002,12345678.91234568,,-5.5,'+Steel,EUR millions`,
        '',
      ].join('\r\n'),
    );
  });

  it('are CSV with decimal commas where they are asked for', async () => {
    const bytes = await download(`/api/panel-versions/${id}/export/csv?decimalSign=,`);
    expect(bytes.toString()).toContain("Arvo, Steel;2002;12345678,91234568;;-5,5;'+Steel;EUR");
    const wrong = await analyst.get(`/api/panel-versions/${id}/export/csv?decimalSign=x`);
    expect(wrong.status).toBe(400);
  });

  it('are a workbook of numbers and texts, with a sheet that says what it is', async () => {
    const book = await workbook(`/api/panel-versions/${id}/export/xlsx`);
    expect(book.worksheets.map(({ name }) => name)).toEqual(['Panel', 'About']);
    expect(cellsOf(book.getWorksheet('Panel'))).toEqual([
      ['company', 'year', 'value', 'inv', 'capital', 'sector', 'amounts in'],
      ['=2+3', 2001, 1e-7, 2, 3, 'Paper', 'EUR millions'],
      ['Arvo, Steel', 2001, 0.1, 1, 5, '+Steel', 'EUR millions'],
      // eslint-disable-next-line no-sparse-arrays -- a missing cell is no cell
      ['Arvo, Steel', 2002, 12345678.91234568, , -5.5, '+Steel', 'EUR millions'],
    ]);
    const about = new Map(
      cellsOf(book.getWorksheet('About')).map(([label, cell]) => [label, cell]),
    );
    const { version } = (await analyst.get(`/api/panel-versions/${id}`)).body as PanelVersionReply;
    expect(about.get('Panel')).toBe(mapping.panelName);
    expect(about.get('Version')).toBe(1);
    expect(about.get('Note')).toBe('first');
    expect(about.get('Made by')).toBe('Founder');
    expect((about.get('Made on (UTC)') as Date).getTime()).toBeCloseTo(
      new Date(version.createdAt).getTime(),
      -1,
    );
    expect(about.get('Currency')).toBe('EUR');
    expect(about.get('Unit')).toBe('millions');
    expect(about.get('Source file')).toBe('panel.csv');
    expect(about.get('SHA-256 of the source file')).toBe(version.file.sha256);
    expect(about.get('Caution')).toBe(insideInformationCaution);
  });

  it('give the same panel when the file is brought in again', async () => {
    const plain = referenceMapping;
    const rows = 'company,year,value,inv,capital\nA,2001,0.1,,3\nB,2001,1234567.891,2,-3\n';
    const first = await importPanel(analyst, rows, plain);
    for (const format of ['csv', 'xlsx']) {
      const bytes = await download(`/api/panel-versions/${first}/export/${format}`);
      const uploaded = await analyst.upload('/api/imports', `again.${format}`, bytes);
      const path = `/api/imports/${idOf(uploaded, 201)}/mapping`;
      const { reading } = uploaded.body as ImportReply;
      const checked = (await analyst.put(path, { ...plain, reading })).body as ImportReply;
      expect(checked.check?.changes)
        .withContext(format)
        .toEqual(jasmine.objectContaining({ addedRows: 0, removedRows: 0, changedCells: 0 }));
    }
  });

  it('say the measure of their own amounts, though an older export said another', async () => {
    const version = await importPanel(analyst, 'company,year,value,inv,capital\nA,2001,1,2,3\n');
    const older = await download(`/api/panel-versions/${version}/export/csv`);
    const again = await importPanel(analyst, older.toString(), {
      ...referenceMapping,
      attributes: ['amounts in'],
      unit: 'thousands',
    });
    const bytes = await download(`/api/panel-versions/${again}/export/csv`);
    expect(bytes.toString().trim().split('\r\n').slice(1)).toEqual(['A,2001,1,2,3,USD thousands']);
  });

  it('have a name that any file system takes', async () => {
    const reply = await analyst.get(`/api/panel-versions/${id}/export/csv`);
    const disposition = reply.headers['content-disposition'];
    expect(disposition).toContain(
      `filename*=UTF-8''${encodeURIComponent('Größe-a-b-c-2026-version-1.csv')}`,
    );
  });

  it('are recorded with who took which, a look at the head alone is not', async () => {
    const other = await signUp(server);
    const version = await importPanel(other);
    await other.agent.head(`/api/panel-versions/${version}/export/xlsx`).expect(200);
    await download(`/api/panel-versions/${version}/export/csv`, other);
    const { session } = (await other.get('/api/session')).body as {
      session: { workspace: { id: string } };
    };
    const entries = await server.composition.services.repositories.inWorkspace(
      session.workspace.id,
      (tx) =>
        tx.executeSql(`select subject_id, detail from activity where action = $1`, [
          'panel-exported',
        ]),
    );
    expect(entries.rows).toEqual([{ subjectId: version, detail: { format: 'csv' } }]);
  });

  it('of an unknown version or in an unknown format are not found', async () => {
    for (const path of [`${randomUUID()}/export/csv`, `${id}/export/pdf`])
      expect((await analyst.get(`/api/panel-versions/${path}`)).status).toBe(404);
    expect((await analyst.get('/api/panel-template/pdf')).status).toBe(404);
  });

  it('start from a template that is understood when it is filled in', async () => {
    const template = (await download('/api/panel-template/csv')).toString();
    expect(template).toBe(
      '\uFEFFcompany,fiscal_year,market_value,capex,book_equity,industry,country\r\n',
    );
    const filled = `${template}Arvo,2001,10,1,5,Pumps,Norway\r\nArvo,2002,11,2,6,Pumps,Norway\r\n`;
    const { mapping: guess } = (await analyst.upload('/api/imports', 'filled.csv', filled))
      .body as ImportReply;
    expect(guess).toEqual(
      jasmine.objectContaining({
        company: 'company',
        year: 'fiscal_year',
        marketValue: 'market_value',
        capex: 'capex',
        bookEquity: 'book_equity',
      }),
    );
    const book = await workbook('/api/panel-template/xlsx');
    const headers = template.trim().replace('\uFEFF', '').split(',');
    expect(cellsOf(book.getWorksheet('Panel'))).toEqual([headers]);
    const explained = cellsOf(book.getWorksheet('Columns')).map(([header]) => header);
    expect(explained.slice(0, 7)).toEqual(headers);
  });
});
