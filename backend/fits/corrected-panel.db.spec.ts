import type { TestDatabase } from '../../db/testing/test-database';
import type { EditionReply, FitReply, LineageReply } from '../contract';
import { signUp, type TestClient } from '../testing/test-client';
import { idOf, importPanel, runFit, savePeers } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

describe('a fit on a corrected panel', () => {
  let database: TestDatabase;
  let server: TestServer;
  let analyst: TestClient;
  let corrected: string;
  let fitId: string;

  const added = (year: number, values: readonly number[]) =>
    values.map((value, column) => ({
      ...{ company: 'C01', year, column, value },
      ...{ reason: 'Filled in', source: 'Report' },
    }));
  const correct = async (id: string, edit: object) =>
    idOf(
      await analyst.post(`/api/panel-versions/${id}/corrections`, {
        note: 'two more years',
        addedRows: [],
        removedRows: [],
        ...edit,
      }),
      201,
    );

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    analyst = await signUp(server);
    const first = await importPanel(analyst);
    corrected = await correct(first, {
      addedRows: [1955, 1956].map((year) => ({ company: 'C01', year })),
      cells: [...added(1955, [30, 3, 52]), ...added(1956, [31, 3])],
    });
    const { fit } = await runFit(analyst, await savePeers(analyst, corrected, 'C06'));
    fitId = fit.id;
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  const lineage = async () =>
    (await analyst.get(`/api/fits/${fitId}/lineage/slope.0`)).body as LineageReply;

  it('takes typed rows that are complete, and its lineage shows those alone', async () => {
    const { rows } = (await lineage()).cells;
    expect(rows.length).toBe(221);
    const typed = rows.filter(({ fileRow }) => fileRow === 0);
    expect(typed.map(({ company, year, values }) => [company, year, ...values])).toEqual([
      ['C01', 1955, 30, 3, 52],
    ]);
    const [{ origins }] = typed;
    expect(origins).toEqual(
      origins.map((origin) => ({
        corrected: {
          ...{ by: 'Founder', at: origin?.corrected?.at ?? '' },
          ...{ reason: 'Filled in', source: 'Report', before: null },
        },
        conversion: null,
      })),
    );
    const others = rows.filter(({ fileRow }) => fileRow !== 0);
    expect(others.every((row) => row.origins.every((origin) => origin === null))).toBeTrue();
  });

  it('tells typed rows that lack a value by company and year', async () => {
    const { result } = (await analyst.get(`/api/fits/${fitId}`)).body as FitReply;
    expect(result?.sample.dropped).toEqual([
      { company: 'C01', year: 1956, row: 0, column: 'capital', reason: 'missing' },
    ]);
  });

  it('says when its panel has a newer version, and so does an edition of it', async () => {
    const published = await analyst.post('/api/editions', {
      ...{ fitId, scenarios: [], confidentiality: 'confidential', comment: '' },
    });
    const edition = published.body as EditionReply;
    const read = async () => [
      ((await analyst.get(`/api/fits/${fitId}`)).body as FitReply).newerPanelVersion,
      ((await analyst.get(`/api/editions/${edition.edition.id}`)).body as EditionReply)
        .newerPanelVersion,
    ];
    expect(await read()).toEqual([null, null]);
    await importPanel(analyst, undefined, {
      ...{ panelName: 'Another', company: 'company', year: 'year', marketValue: 'value' },
      ...{ capex: 'inv', bookEquity: 'capital', others: [], currency: 'USD', unit: 'millions' },
    });
    expect(await read()).toEqual([null, null]);
    const third = await correct(corrected, {
      removedRows: [{ company: 'C01', year: 1956 }],
      cells: [],
    });
    const newer = { id: third, number: 3 };
    expect(await read()).toEqual([newer, newer]);
  });
});
