import { readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import excel from 'exceljs';
import { pdfPages } from '../../backend/board/testing/pdf-pages';
import type { EditionReply } from '../../backend/contract';
import { sentenceText } from '../../backend/figures';
import { signUp } from '../../backend/testing/test-client';
import { importPanel, runFit as runFitOnServer, savePeers } from '../../backend/testing/test-model';
import {
  createMigratedDatabase,
  startTestServer,
  type TestServer,
} from '../../backend/testing/test-server';
import type { TestDatabase } from '../../db/testing/test-database';
import { runFit } from '../fit/run-fit';

interface CommandReply {
  readonly hash: string;
  readonly slopes: readonly { readonly estimate: number; readonly low: number | null }[];
  readonly standing: { readonly estimate: number; readonly low: number; readonly high: number };
}

/** The same file through the command and through the server: `stats/golden` says where its figures come from. */
describe('the figures of an edition', () => {
  let database: TestDatabase;
  let server: TestServer;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  it('are the same in the API, the command, the workbook and on paper', async () => {
    const file = fileURLToPath(
      new URL('../../backend/stats/golden/grunfeld11_value_on_inv_capital.csv', import.meta.url),
    );
    const asked = `--panel ${file} --company company --year year --outcome value --regressors inv,capital --own C06`;
    const command = (await runFit(asked.split(' '), undefined)) as CommandReply;

    const analyst = await signUp(server);
    const panel = await importPanel(analyst, await readFile(file, 'utf8'));
    const { fit } = await runFitOnServer(analyst, await savePeers(analyst, panel, 'C06'));
    const published = await analyst.post('/api/editions', {
      fitId: fit.id,
      scenarios: [],
      confidentiality: 'confidential',
      comment: '',
    });
    const { edition, content } = published.body as EditionReply;
    expect(content.fit.slopes.map(({ estimate, low }) => [estimate, low])).toEqual(
      command.slopes.map(({ estimate, low }) => [estimate, low]),
    );
    expect(content.fit.standing?.estimate).toBe(command.standing.estimate);
    expect(content.fit.standing?.low).toBe(command.standing.low);

    const path = `/api/editions/${edition.id}/export`;
    const workbook = new excel.Workbook();
    const { bytes } = await analyst.download(`${path}/xlsx`);
    await workbook.xlsx.load(bytes as unknown as ArrayBuffer);
    const slopes = workbook.getWorksheet('Slopes');
    expect(slopes?.getCell('B2').value).toBe(command.slopes[0].estimate);
    expect(slopes?.getCell('B3').value).toBe(command.slopes[1].estimate);

    const { currency, unit: panelUnit } = content.panelVersion;
    const setting = { currency, panelUnit, unit: 'billions' } as const;
    const paper = (
      await pdfPages((await analyst.download(`${path}/pdf?unit=billions`)).bytes)
    ).join(' ');
    expect(paper.replaceAll(/\s+/g, ' ')).toContain(sentenceText(content.headline, setting));
    const { estimate, low, high } = command.standing;
    const inBillions = [estimate, low, high].map((value) => (value / 1000).toFixed(2));
    expect(sentenceText(content.headline, setting)).toContain(
      `${inBillions[0]} (${inBillions[1]} to ${inBillions[2]}) USD bn`,
    );
  });
});
