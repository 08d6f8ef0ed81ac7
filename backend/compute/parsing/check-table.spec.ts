import { checkTable } from './check-table';
import { guessMapping } from './guess-mapping';
import type { Table } from './table';
import { TableError } from './table-error';
import { toPanelColumns } from './to-panel-columns';

function tableOf(header: string[], ...rows: string[][]): Table {
  return {
    header,
    repeatedHeaders: [],
    rows,
    lines: rows.map((_, index) => index + 2),
    delimiter: ',',
  };
}

const mapping = { company: 'company', year: 'year', numbers: ['y', 'x'] };
const header = ['company', 'year', 'y', 'x'];

describe('checkTable', () => {
  it('lists every place with what was found there, and counts what is usable', () => {
    const table = tableOf(
      header,
      ['A', '2020', '1', '2'],
      ['A', '2021', 'one', '2'],
      ['A', '2021', '3', 'NA'],
      ['', '2020', '1', '2'],
      ['B', '', '1', '2'],
      ['B', '20x0', '1', '2'],
      ['a ', '2020', '1', '2'],
    );
    const check = checkTable(table, mapping);
    expect(
      check.findings.map(({ row, column, found, code }) => [row, column, found, code]),
    ).toEqual([
      [3, 'y', 'one', 'not-a-number'],
      [3, 'year', '2021', 'duplicate'],
      [4, 'year', '2021', 'duplicate'],
      [7, 'year', '20x0', 'year'],
      [4, 'x', 'NA', 'missing'],
      [5, 'company', '', 'no-company'],
      [6, 'year', '', 'missing'],
      [8, 'company', 'a ', 'spelling'],
    ]);
    expect(check.blockingCount).toBe(4);
    expect(check).toEqual(
      jasmine.objectContaining({
        companies: 2,
        years: 2,
        firstYear: 2020,
        lastYear: 2021,
        rows: 4,
        completeRows: 2,
        findingCount: 8,
      }),
    );
  });

  it('lists text in a number also of rows that name no company or no year, but not their gaps', () => {
    const table = tableOf(
      header,
      ['A', '2020', '1', '2'],
      ['', '2020', 'one', ''],
      ['B', '', '1', 'two'],
      ['B', '20x0', 'three', 'NA'],
      ['B', '2021', '3', '4'],
    );
    const check = checkTable(table, mapping);
    expect(
      check.findings.map(({ row, column, found, code }) => [row, column, found, code]),
    ).toEqual([
      [3, 'y', 'one', 'not-a-number'],
      [4, 'x', 'two', 'not-a-number'],
      [5, 'year', '20x0', 'year'],
      [5, 'y', 'three', 'not-a-number'],
      [3, 'company', '', 'no-company'],
      [4, 'year', '', 'missing'],
    ]);
    expect(check.blockingCount).toBe(4);
    expect(check.rows).toBe(2);
    expect(check.completeRows).toBe(2);
  });

  it('lists no more than asked and still counts all', () => {
    const rows = Array.from({ length: 20 }, (_, index) => ['A', String(2000 + index), 'x', '1']);
    const check = checkTable(tableOf(header, ...rows), mapping, 5);
    expect(check.findings.length).toBe(5);
    expect(check.findingCount).toBe(20);
  });

  it('says that there is nothing in a table without usable rows', () => {
    const check = checkTable(tableOf(header), mapping);
    expect(check).toEqual(
      jasmine.objectContaining({ companies: 0, firstYear: null, lastYear: null }),
    );
  });

  it('names the columns that are not there, and those of one name', () => {
    const table = { ...tableOf(header), repeatedHeaders: ['y'] };
    const check = (numbers: string[]): unknown => checkTable(table, { ...mapping, numbers });
    expect(() => check(['z'])).toThrowMatching(
      (error) =>
        error instanceof TableError &&
        error.code === 'missing-column' &&
        error.data.columns?.[0] === 'z',
    );
    for (const numbers of [['y'], ['x', 'x']]) {
      expect(() => check(numbers)).toThrowMatching(
        (error) => error instanceof TableError && error.code === 'ambiguous-column',
      );
    }
  });
});

describe('toPanelColumns', () => {
  it('keeps missing numbers as gaps and each row with its line of the file', () => {
    const table = tableOf(
      header,
      ['A', 'FY2020', '1,5', ''],
      ['', '2021', '1', '1'],
      ['B', '2021', '2', '3'],
    );
    const { data, problems, leftOut } = toPanelColumns(table, {
      company: 'company',
      year: 'year',
      outcome: 'y',
      regressors: ['x'],
    });
    expect(problems).toEqual([]);
    expect(leftOut.map(({ row }) => row)).toEqual([3]);
    expect([...data.fileRow]).toEqual([2, 4]);
    expect([...data.outcome.values]).toEqual([1.5, 2]);
    expect([...data.regressors[0].values]).toEqual([NaN, 3]);
    expect(data.companies).toEqual(['A', 'B']);
  });

  it('reads a column’s decimals off all of its rows, also those that it leaves out', () => {
    const table = tableOf(
      header,
      ['A', '2020', '1.250', '1'],
      ['Sum', '', '1,5', '1'],
      ['B', '2020', '2.250', '1'],
    );
    const { data, problems } = toPanelColumns(table, {
      company: 'company',
      year: 'year',
      outcome: 'y',
      regressors: ['x'],
    });
    expect([...data.outcome.values]).toEqual([1250, 2250]);
    expect(problems).toEqual([]);
  });
});

describe('guessMapping', () => {
  it('knows the usual English headers', () => {
    const headers = [
      'Company',
      'Fiscal Year',
      'Market Cap (EUR m)',
      'CapEx',
      'Book Equity',
      'Revenue',
      'Sector',
    ];
    const row = ['A', 'FY2020', '1', '2', '3', '4', 'Retail'];
    expect(guessMapping(headers, [row])).toEqual({
      company: 'Company',
      year: 'Fiscal Year',
      marketValue: 'Market Cap (EUR m)',
      capex: 'CapEx',
      bookEquity: 'Book Equity',
      others: ['Revenue'],
    });
  });

  it('knows the usual German headers', () => {
    const headers = [
      'Unternehmen',
      'Geschäftsjahr',
      'Marktkapitalisierung',
      'Investitionen',
      'Eigenkapital',
    ];
    expect(guessMapping(headers, [['A', '2020', '1,5', '2,5', '3,5']])).toEqual({
      company: 'Unternehmen',
      year: 'Geschäftsjahr',
      marketValue: 'Marktkapitalisierung',
      capex: 'Investitionen',
      bookEquity: 'Eigenkapital',
      others: [],
    });
  });

  it('reads joined words, and falls back on what the columns hold', () => {
    expect(guessMapping(['bookEquityEur', 'k', 't'], [['1', 'A', '2020']])).toEqual({
      company: 'k',
      year: 't',
      bookEquity: 'bookEquityEur',
      others: [],
    });
  });
});
