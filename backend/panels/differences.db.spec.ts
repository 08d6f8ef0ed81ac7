import type { TestDatabase } from '../../db/testing/test-database';
import type { PanelDifferencesReply, PanelVersionReply } from '../contract';
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
        expect({ ...found, listed: inOrder(found.listed) }).toEqual({
          ...counts,
          listed: inOrder(listed),
        });
        compared += listed.length;
      }
    expect(compared).toBeGreaterThan(50);
  });
});

function toCompared({ rows, columns }: PanelVersionReply) {
  const companies = [...new Set(rows.company)];
  return {
    companies,
    company: rows.company.map((name) => companies.indexOf(name)),
    year: rows.year,
    columns: columns.map(({ name }) => name),
    values: rows.values.map((cells) => cells.map((cell) => cell ?? NaN)),
  };
}

type Listed = PanelDifferencesReply['listed'];

function inOrder(listed: readonly Listed[number][]): Listed {
  const key = ({ kind, company, year, column }: Listed[number]): string =>
    [kind, company, year, column].join(' ');
  return [...listed].sort((a, b) => (key(a) < key(b) ? -1 : 1));
}
