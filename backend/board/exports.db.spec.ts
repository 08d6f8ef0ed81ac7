import excel from 'exceljs';
import type { TestDatabase } from '../../db/testing/test-database';
import type { EditionReply, FitReply, ScenarioReply } from '../contract';
import { join, signUp, type TestClient } from '../testing/test-client';
import { importPanel, runFit, savePeers } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';
import { pdfPages } from './testing/pdf-pages';

/** Standing of C06, 2,407 (1,275 to 3,539): R 4.2.2 and numpy over the same file, see stats/golden. */
describe('an edition taken out', () => {
  let database: TestDatabase;
  let server: TestServer;
  let analyst: TestClient;
  let edition: EditionReply;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    analyst = await signUp(server, 'Analyst');
    const fit: FitReply = await runFit(
      analyst,
      await savePeers(analyst, await importPanel(analyst), 'C06'),
    );
    const [capex, equity] = fit.result?.prediction?.last.regressors ?? [];
    const saved = await analyst.post('/api/scenarios', {
      fitId: fit.fit.id,
      name: 'Zubau in Łódź',
      note: 'A hall more.',
      plan: [
        { year: 1955, values: [capex + 100, equity] },
        { year: 1956, values: [capex + 100, equity] },
      ],
    });
    const scenario = saved.body as ScenarioReply;
    const published = await analyst.post('/api/editions', {
      fitId: fit.fit.id,
      scenarios: [{ id: scenario.id, version: 1 }],
      confidentiality: 'inside-information',
      comment: 'For the meeting.',
    });
    edition = published.body as EditionReply;
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  const path = (format: string, query = '') =>
    `/api/editions/${edition.edition.id}/export/${format}${query}`;

  it('as PDF has its figures, state, cautions and hash on pages that are numbered', async () => {
    const reply = await analyst.download(path('pdf'));
    expect(reply.status).toBe(200);
    expect(reply.type).toBe('application/pdf');
    const pages = await pdfPages(reply.bytes);
    const text = pages.join('\n');
    expect(text).toContain('2,410 (1,270 to 3,540) USD m above');
    expect(text).toContain('Zubau in Łódź, version 1');
    expect(text).toContain(edition.edition.sha256);
    for (const caution of edition.content.cautions) expect(flat(text)).toContain(flat(caution));
    for (const [index, page] of pages.entries()) {
      expect(page).toContain(`page ${index + 1} of ${pages.length}`);
      expect(page).toContain('DRAFT');
      expect(page).toContain('May be inside information');
    }
  });

  it('follows the unit that is asked for', async () => {
    const pages = await pdfPages((await analyst.download(path('pdf', '?unit=billions'))).bytes);
    expect(pages.join('\n')).toContain('2.41 (1.27 to 3.54) USD bn above');
  });

  it('comes on A4 and on Letter, and in no other format', async () => {
    const a4 = (await analyst.download(path('pdf'))).bytes.toString('latin1');
    const letter = (await analyst.download(path('pdf', '?paper=letter'))).bytes.toString('latin1');
    expect(a4).toContain('/MediaBox [0 0 595.28 841.89]');
    expect(letter).toContain('/MediaBox [0 0 612 792]');
    expect((await analyst.get(path('doc'))).status).toBe(404);
  });

  it('as a workbook has the figures of the edition, and formulas for the scenarios', async () => {
    const { bytes, type } = await analyst.download(path('xlsx'));
    expect(type).toContain('spreadsheetml');
    const workbook = new excel.Workbook();
    await workbook.xlsx.load(bytes as unknown as ArrayBuffer);
    expect(workbook.worksheets.map(({ name }) => name)).toEqual([
      'Edition',
      'Scenarios',
      'Panel rows',
      'Slopes',
      'Intercepts',
      'Model',
    ]);
    const { fit, scenarios } = edition.content;
    expect(workbook.getWorksheet('Slopes')?.getCell('B2').value).toBe(fit.slopes[0].estimate);
    expect(workbook.getWorksheet('Panel rows')?.rowCount).toBe(221);
    const cell = workbook.getWorksheet('Scenarios')?.getCell('D5');
    expect(cell?.formula).toBe('Q5');
    expect(cell?.result).toBe(scenarios[0].years[0].expected.estimate);
    expect(workbook.getWorksheet('Edition')?.getCell('B3').value).toContain(
      '2,410 (1,270 to 3,540) USD m above',
    );
  });

  it('is listed on the edition with who took it, and readers take no draft', async () => {
    await analyst.download(path('pdf'));
    const { access } = (await analyst.get(`/api/editions/${edition.edition.id}`))
      .body as EditionReply;
    expect(
      access?.some(
        ({ by, kind, format }) => by === 'Analyst' && kind === 'exported' && format === 'pdf',
      ),
    ).toBeTrue();
    const reader = await join(server, analyst, ['reader'], 'Reader');
    expect((await reader.get(path('pdf'))).status).toBe(404);
  });
});

function flat(text: string): string {
  return text.replaceAll(/\s+/g, '');
}
