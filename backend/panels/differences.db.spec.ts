import type { TestDatabase } from '../../db/testing/test-database';
import type { CellHistoryReply, PanelDifferencesReply, PanelVersionReply } from '../contract';
import { panelDifferences } from '../panel-data';
import { signUp, type TestClient } from '../testing/test-client';
import { importPanel, referenceMapping } from '../testing/test-model';
import { createMigratedDatabase, startTestServer, type TestServer } from '../testing/test-server';

/** Linear congruential, as in Numerical Recipes: the same panels each time. */
function draws(seed: number): () => number {
  let state = seed;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}

/** A panel whose rows, cells and columns come and go from one seed to the next. */
function file(seed: number): { readonly text: string; readonly others: readonly string[] } {
  const draw = draws(seed);
  const others = ['staff', 'sites'].filter(() => draw() < 0.6);
  const value = (): string => (draw() < 0.2 ? '' : String(Math.floor(draw() * 3) + 0.5));
  const lines = ['Arvo', 'Birk', 'Cala'].flatMap((company) =>
    [2001, 2002, 2003, 2004]
      .filter(() => draw() < 0.7)
      .map((year) => [company, year, value(), value(), value(), ...others.map(value)].join(',')),
  );
  const header = ['company', 'year', 'value', 'inv', 'capital', ...others].join(',');
  return {
    text: [header, 'Dorn,2001,1,1,1' + ',1'.repeat(others.length), ...lines].join('\n'),
    others,
  };
}

describe('the differences of two panel versions', () => {
  let database: TestDatabase;
  let server: TestServer;
  let analyst: TestClient;

  beforeAll(async () => {
    database = await createMigratedDatabase();
    server = await startTestServer(database);
    analyst = await signUp(server);
  });

  afterAll(async () => {
    await server.close();
    await database.drop();
  });

  it('are in the database those that the check of a file finds', async () => {
    const versions: PanelVersionReply[] = [];
    for (const seed of [1, 2, 3, 4]) {
      const { text, others } = file(seed);
      const id = await importPanel(analyst, text, { ...referenceMapping, others });
      versions.push((await analyst.get(`/api/panel-versions/${id}`)).body as PanelVersionReply);
    }
    let compared = 0;
    for (const before of versions)
      for (const after of versions) {
        const address = `/api/panel-versions/${before.version.id}/differences/${after.version.id}`;
        const found = (await analyst.get(address)).body as PanelDifferencesReply;
        const { listed, ...counts } = panelDifferences(toCompared(before), toCompared(after), 5000);
        const { addedRows, removedRows, changedCells } = found;
        expect({ addedRows, removedRows, changedCells }).toEqual(counts);
        expect(inOrder(found.listed)).toEqual(inOrder(listed));
        compared += listed.length;
      }
    expect(compared).toBeGreaterThan(50);
  });

  const three = 'Arvo,2001,1234.567,7,5\nArvo,2002,0.1,,6\n';
  const differences = async (before: string, after: string) =>
    (await analyst.get(`/api/panel-versions/${before}/differences/${after}`))
      .body as PanelDifferencesReply;
  const history = async (id: string, column: number) => {
    const query = `company=Arvo&year=2001&column=${column}`;
    const reply = await analyst.get(`/api/panel-versions/${id}/cell-history?${query}`);
    return (reply.body as CellHistoryReply).entries.map(
      ({ number, value, header, currency, unit }) => [number, value, header, currency, unit],
    );
  };

  it('know a column of the model under another header, and say that it has one', async () => {
    const own = { ...referenceMapping, panelName: 'Renamed' };
    const before = await importPanel(analyst, `company,year,value,inv,capital\n${three}`, own);
    const mapping = { ...own, capex: 'Capital expenditure' };
    const text = `company,year,value,Capital expenditure,capital\n${three.replace(',5\n', ',5.5\n')}`;
    const after = await importPanel(analyst, text, mapping);
    const found = await differences(before, after);
    expect(found.renamed).toEqual([{ role: 'capex', before: 'inv', after: 'Capital expenditure' }]);
    expect(found.listed.map(({ column, before: was, after: is }) => [column, was, is])).toEqual([
      ['capital', 5, 5.5],
    ]);
    expect(await history(after, 1)).toEqual([
      [1, 7, 'inv', 'USD', 'millions'],
      [2, 7, 'Capital expenditure', 'USD', 'millions'],
    ]);
    expect((await history(after, 0)).length).toBe(1);
  });

  it('take a change of the unit for none of the figures, and say what money is in', async () => {
    const own = { ...referenceMapping, panelName: 'Units', others: ['staff'] };
    const header = 'company,year,value,inv,capital,staff\n';
    const before = await importPanel(
      analyst,
      `${header}Arvo,2001,1234.567,7,5,31\nArvo,2002,0.1,,6,32\nArvo,2003,3,4,5,33\n`,
      { ...own, unit: 'thousands' },
    );
    const after = await importPanel(
      analyst,
      `${header}Arvo,2001,1.234567,.007,.005,31\nArvo,2002,.0001,,.006,32\nArvo,2003,.003,.004,.0051,34\n`,
      own,
    );
    const found = await differences(before, after);
    expect(found.money).toEqual({ currency: 'USD', unit: 'millions' });
    expect(found.listed.map(({ column, before: was, after: is }) => [column, was, is])).toEqual([
      ['capital', 0.005, 0.0051],
      ['staff', 33, 34],
    ]);
    expect([found.changedCells, found.addedRows, found.removedRows]).toEqual([2, 0, 0]);
    const back = await differences(after, before);
    expect(back.money).toEqual({ currency: 'USD', unit: 'thousands' });
    expect(back.changedCells).toBe(2);
    expect(await history(after, 0)).toEqual([
      [1, 1234.567, 'value', 'USD', 'thousands'],
      [2, 1.234567, 'value', 'USD', 'millions'],
    ]);
    expect((await history(after, 3)).length).toBe(1);
  });

  it('leave money of two currencies as each version has it', async () => {
    const own = { ...referenceMapping, panelName: 'Currencies' };
    const text = `company,year,value,inv,capital\n${three}`;
    const before = await importPanel(analyst, text, own);
    const after = await importPanel(analyst, text, { ...own, currency: 'EUR', unit: 'thousands' });
    const found = await differences(before, after);
    expect(found.money).toBeNull();
    expect(found.listed).toEqual([]);
    expect(await history(after, 1)).toEqual([
      [1, 7, 'inv', 'USD', 'millions'],
      [2, 7, 'inv', 'EUR', 'thousands'],
    ]);
  });
});

function toCompared({ rows, columns }: PanelVersionReply) {
  const companies = [...new Set(rows.company)];
  return {
    companies,
    company: rows.company.map((name) => companies.indexOf(name)),
    year: rows.year,
    columns,
    values: rows.values.map((cells) => cells.map((cell) => cell ?? NaN)),
  };
}

type Listed = PanelDifferencesReply['listed'];

function inOrder(listed: readonly Listed[number][]): Listed {
  const key = ({ kind, company, year, column }: Listed[number]): string =>
    [kind, company, year, column].join(' ');
  return [...listed].sort((a, b) => (key(a) < key(b) ? -1 : 1));
}
