import { parse } from 'csv-parse/sync';
import { type FitResult, fitPanel, type PanelColumns, type Specification } from '../../stats';
import { panelOf, plainSpecification, sha256 } from '../../stats/testing/golden-panels';
import { rowsCsv } from './rows-csv';
import { rowsUsed } from './rows-used';

const values = [0.1 + 0.2, -1234.5, 1e21, 5e-324, 1 / 3, 7];

/** Two companies of six years, one of them named like a formula, and one of a single row. */
const panel: PanelColumns = panelOf(
  ['=B', 'A']
    .flatMap((company, shift) =>
      values.map((value, index) => ({
        company,
        year: 2005 - index,
        outcome: value,
        regressors: [((index * 5 + shift) % 7) + 0.25],
      })),
    )
    .concat({ company: 'C, Inc.', year: 2004, outcome: 1, regressors: [2] }),
  { outcome: 'value', regressors: ['capex'] },
);

function fitted(change: Partial<Specification>): FitResult {
  return fitPanel(panel, { ...plainSpecification, ...change }, null, undefined, { sha256 });
}

function cells(change: Partial<Specification>): string[][] {
  const result = fitted(change);
  const names = { company: 'company', year: '@year', outcome: 'value', regressors: ['capex'] };
  const header = { ...names, lag: result.specification.lag };
  return parse([...rowsCsv(header, rowsUsed(panel, result))].join(''));
}

describe('the rows of a replication pack', () => {
  it('carry every number at full precision and every name, and no formula', () => {
    const [header, ...rows] = cells({});
    expect(header).toEqual(['company', "'@year", 'value', 'capex', 'file row', 'used']);
    const ofB = rows.filter(([company]) => company === "'=B");
    expect(ofB.map(([, , outcome]) => Number(outcome))).toEqual([...values].reverse());
    expect(ofB.map(([, year]) => Number(year))).toEqual([2000, 2001, 2002, 2003, 2004, 2005]);
    expect(ofB.some(([, , outcome]) => outcome.startsWith("'"))).toBeFalse();
  });

  it('keep a name with a line end in one cell, whichever line end it is', () => {
    const broken = panelOf(
      values.map((value, index) => ({
        company: index < 3 ? 'C\n03' : 'D\r04',
        year: 2000 + (index % 3),
        outcome: value,
        regressors: [index + 0.25],
      })),
      { outcome: 'value', regressors: ['inv\nest'] },
    );
    const result = fitPanel(broken, plainSpecification, null, undefined, { sha256 });
    const names = { company: 'company', year: 'year', outcome: 'value', regressors: ['inv\nest'] };
    const text = [...rowsCsv({ ...names, lag: 0 }, rowsUsed(broken, result))].join('');
    const [header, ...rows] = parse(text, { record_delimiter: '\r\n' });
    expect(text).toContain('"inv\nest"');
    expect(text).toContain('"C\n03"');
    expect(text).toContain('"D\r04"');
    expect(header[3]).toBe('inv\nest');
    expect(rows.map(([company]) => company)).toEqual([
      ...Array<string>(3).fill('C\n03'),
      ...Array<string>(3).fill('D\r04'),
    ]);
  });

  it('are written in parts of some thousand rows', () => {
    const names = { company: 'company', year: 'year', outcome: 'value', regressors: [] };
    const row = { company: 'A', year: 2000, outcome: 1, regressors: [], fileRow: 2, isUsed: true };
    const parts = [...rowsCsv({ ...names, lag: 0 }, Array<typeof row>(12_000).fill(row))];
    expect(parts.map((part) => part.split('\r\n').length - 1)).toEqual([1, 5000, 5000, 2000]);
  });

  it('come by company and year, with the company of one row marked as unused', () => {
    const rows = cells({}).slice(1);
    expect(rows.map(([company]) => company)).toEqual([
      ...Array<string>(6).fill("'=B"),
      ...Array<string>(6).fill('A'),
      'C, Inc.',
    ]);
    expect(rows.map((row) => row[5])).toEqual([...Array<string>(12).fill('yes'), 'no']);
    expect(rows.at(-1)).toEqual(['C, Inc.', '2004', '1', '2', '14', 'no']);
  });

  it('hold the regressors of the year before where the fit lags them', () => {
    const [header, ...rows] = cells({ lag: 1 });
    expect(header[3]).toBe('capex (year before)');
    const before = new Map(
      cells({}).map(([company, year, , capex]) => [`${company} ${Number(year) + 1}`, capex]),
    );
    expect(rows.length).toBe(10);
    for (const [company, year, , capex] of rows)
      expect(capex).toBe(before.get(`${company} ${year}`) ?? '');
  });
});
