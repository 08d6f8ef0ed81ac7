import excel from 'exceljs';
import type { TestDatabase } from '../../db/testing/test-database';
import { mostTableCells } from '../contract';
import { join, signUp, TestClient } from '../testing/test-client';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

const table = {
  name: 'Velmara stands above its peers',
  notes: [{ label: 'Caution', text: 'Not for use outside.' }],
  columns: [{ header: 'company' }, { header: '=value, EUR m' }, { header: 'low, EUR m' }],
  rows: [
    ['Arvo, "Steel"', 0.1, 1e-7],
    ['=2+3', 12345678.91234568, null],
    ['@sum', -5.5, 'open'],
  ],
};

describe('tables of a page as files', () => {
  let database: TestDatabase;
  let server: TestServer;
  let analyst: TestClient;
  let reader: TestClient;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    analyst = await signUp(server);
    reader = await join(server, analyst, ['reader']);
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  async function made(format: string, body: object, client = reader): Promise<Buffer> {
    await client.get('/api/session');
    const reply = await client.agent
      .post(`/api/tables/${format}`)
      .set('Origin', server.url)
      .set('X-XSRF-TOKEN', client.token)
      .send(body)
      .buffer(true)
      .parse((res, done) => {
        const parts: Buffer[] = [];
        res.on('data', (part: Buffer) => parts.push(part));
        res.on('end', () => {
          done(null, Buffer.concat(parts));
        });
      });
    expect(reply.status).toBe(200);
    expect(reply.headers['content-disposition']).toBe(`attachment; filename=table.${format}`);
    return reply.body as Buffer;
  }

  const refusal = async (body: object): Promise<{ status: number; text: string }> =>
    analyst.post('/api/tables/xlsx', body);

  it('are CSV with every digit, which no spreadsheet computes anything from', async () => {
    const bytes = await made('csv', table);
    expect([...bytes.subarray(0, 3)]).toEqual([0xef, 0xbb, 0xbf]);
    expect(bytes.subarray(3).toString()).toBe(
      [
        `company,"'=value, EUR m","low, EUR m"`,
        '"Arvo, ""Steel""",0.1,1e-7',
        "'=2+3,12345678.91234568,",
        "'@sum,-5.5,open",
        '',
      ].join('\r\n'),
    );
  });

  it('are a workbook of numbers and texts, none of them a formula, with what they are', async () => {
    const book = new excel.Workbook();
    await book.xlsx.load((await made('xlsx', table)) as unknown as ArrayBuffer);
    expect(book.worksheets.map(({ name }) => name)).toEqual(['Table', 'About']);
    const [values, about] = book.worksheets;
    const cells = [1, 2, 3, 4].map((row) => [1, 2, 3].map((at) => values.getCell(row, at)));
    expect(cells.map((row) => row.map(({ value }) => value))).toEqual([
      ['company', '=value, EUR m', 'low, EUR m'],
      ['Arvo, "Steel"', 0.1, 1e-7],
      ['=2+3', 12345678.91234568, null],
      ['@sum', -5.5, 'open'],
    ]);
    expect(cells.flat().filter(({ type }) => type === excel.ValueType.Formula)).toEqual([]);
    expect(about.getCell(1, 2).value).toBe(table.name);
    expect(about.getCell(2, 2).value).toBeInstanceOf(Date);
    expect([1, 2].map((at) => about.getCell(3, at).value)).toEqual([
      'Caution',
      'Not for use outside.',
    ]);
  });

  it('may have as many cells as are allowed, and no more', async () => {
    const columns = Array.from({ length: 20 }, (_, at) => ({ header: `c${at}` }));
    const row = columns.map((_, at) => 12345.6789 + at);
    const rows = Array.from({ length: mostTableCells / 20 }, () => row);
    const bytes = await made('csv', { ...table, columns, rows });
    expect(bytes.toString().split('\r\n').length).toBe(rows.length + 2);
    const larger = await refusal({ ...table, columns, rows: [...rows, row] });
    expect(larger.status).toBe(400);
    expect(larger.text).toContain('expected at most 200000 cells; found 200020');
  });

  it('are refused where a row has another number of cells, or anything is not as agreed', async () => {
    const odd = await refusal({ ...table, rows: [['a', 1, 2], ['b']] });
    expect(odd.status).toBe(400);
    expect(odd.text).toContain('expected a cell for each of 3 columns; found 1');
    for (const wrong of [
      { ...table, secret: 1 },
      { ...table, name: '' },
      { ...table, columns: [] },
      { ...table, rows: [['a', 1, true]] },
      { ...table, rows: [['x'.repeat(2001), 1, 2]] },
    ])
      expect((await refusal(wrong)).status)
        .withContext(Object.keys(wrong).join())
        .toBe(400);
    expect((await analyst.post('/api/tables/pdf', table)).status).toBe(404);
  });

  it('are made for nobody who is not signed in, nor for another site', async () => {
    expect((await new TestClient(server.url).post('/api/tables/csv', table)).status).toBe(401);
    const foreign = await analyst.agent
      .post('/api/tables/csv')
      .set('Origin', 'https://elsewhere.example')
      .set('X-XSRF-TOKEN', analyst.token)
      .send(table);
    expect(foreign.status).toBe(403);
  });
});
