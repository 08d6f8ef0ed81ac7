import { createHash } from 'node:crypto';
import { fitPanel } from '../backend/stats';
import { familiarRange } from '../backend/stats/prediction';
import {
  demoOwnCompany,
  demoPanelCsv,
  demoPeerReasons,
  demoPeople,
  demoScenarios,
} from './demo-panel';

describe('the demo story', () => {
  const rows = demoPanelCsv()
    .trimEnd()
    .split('\n')
    .slice(1)
    .map((line) => line.split(','));
  const companies = new Set(rows.map(([company]) => company));
  const fit = fitDemoPanel(rows, [...companies]);

  it('gives each peer a reason of its own, and leaves one out', () => {
    const peers = Object.entries(demoPeerReasons);
    expect(new Set([demoOwnCompany, ...peers.map(([name]) => name)])).toEqual(companies);
    expect(peers.filter(([, peer]) => !peer.included).map(([name]) => name)).toEqual(['Zethorin']);
    expect(new Set(peers.map(([, { reason }]) => reason)).size).toBe(13);
    for (const [name, { reason }] of peers) {
      expect(reason.length).withContext(name).toBeGreaterThan(60);
    }
  });

  it('plans the three years after the panel, twice', () => {
    expect(new Set(demoScenarios.map(({ name }) => name)).size).toBe(2);
    for (const { years } of demoScenarios) {
      expect(years.map(({ year }) => year)).toEqual([2026, 2027, 2028]);
    }
  });

  it('has one person for each role, at an address that cannot exist', () => {
    expect(demoPeople.map(({ role }) => role)).toEqual([
      'analyst',
      'cfo',
      'reader',
      'billing_admin',
    ]);
    expect(new Set(demoPeople.map(({ name }) => name)).size).toBe(4);
    for (const { email } of demoPeople) expect(email).toMatch(/^[a-z]+\.[a-z]+@velmara\.example$/);
  });

  it('puts the own company clearly above its peers, but not first', () => {
    const standing = fit.standing;
    expect(standing?.estimate).toBeCloseTo(1_810.88, 1);
    expect(standing?.low).toBeGreaterThan(1_000);
    expect(standing?.rankSet).toEqual([2, 5]);
  });

  it('has slopes that a finance department would believe', () => {
    const [capex, equity] = fit.slopes;
    expect(capex.estimate).toBeCloseTo(2.005, 3);
    expect(capex.low).toBeGreaterThan(1);
    expect(equity.estimate).toBeCloseTo(0.75, 3);
    expect(equity.low).toBeGreaterThan(0.5);
    expect(fit.warnings).toEqual([]);
  });

  it('plans once within the familiar range and once at its edge', () => {
    const basis = fit.prediction;
    if (basis === null) throw new Error('expected a prediction for the own company; found none');
    const kinds = demoScenarios.map(({ years }) =>
      years.map((year) => familiarRange(basis, [year.capex, year.bookEquity]).kind),
    );
    expect(kinds).toEqual([
      ['inside', 'inside', 'inside'],
      ['inside', 'edge', 'edge'],
    ]);
  });
});

/** The fit that the demo workspace shows: defaults, and every peer that is included. */
function fitDemoPanel(rows: readonly (readonly string[])[], companies: readonly string[]) {
  const numbers = (index: number): Float64Array =>
    Float64Array.from(rows, (row) => (row[index] === '' ? NaN : Number(row[index])));
  const included = Object.entries(demoPeerReasons).filter(([, peer]) => peer.included);
  return fitPanel(
    {
      companies,
      company: Int32Array.from(rows, (row) => companies.indexOf(row[0])),
      year: Int32Array.from(rows, (row) => Number(row[1])),
      outcome: { name: 'market_value', values: numbers(2) },
      regressors: [
        { name: 'capex', values: numbers(3) },
        { name: 'book_equity', values: numbers(4) },
      ],
      fileRow: Int32Array.from(rows, (_, index) => index + 2),
    },
    { effects: 'company', form: 'levels', lag: 0, slopes: 'cr2', confidence: 0.95, seed: null },
    demoOwnCompany,
    included.map(([name]) => name),
    { sha256: (text) => createHash('sha256').update(text).digest('hex') },
  );
}
