import { checkFile } from './check-file';
import { type FileRecipe, panelColumns } from './file-recipe';
import type { FileCheck, PanelBlock } from './parse-messages';
import type { Table } from './parsing/table';
import { plainHeader, plainRecipe, tableOf } from './testing/tables';

function check(
  table: Table,
  recipe: Partial<FileRecipe> = {},
  current: PanelBlock | null = null,
): FileCheck {
  return checkFile({ table, formulaCells: 0 }, { ...plainRecipe, ...recipe }, current);
}

const mending = plainRecipe.mending;

describe('checkFile', () => {
  it('counts what is usable and lists what is not, blocking findings first', () => {
    const result = check(
      tableOf(
        plainHeader,
        ['A', '2020', '1', '2', '3'],
        ['A', '2021', 'one', '2', '3'],
        ['A', '2022', '3', 'NA', '3'],
        ['', '2020', '1', '2', '3'],
        ['B', '', '1', '2', '3'],
        ['B', '20x0', '1', '2', '3'],
        ['a ', '2023', '1', '2', '3'],
      ),
    );
    expect(
      result.findings.map(({ row, column, found, code }) => [row, column, found, code]),
    ).toEqual([
      [3, 'mv', 'one', 'not-a-number'],
      [7, 'year', '20x0', 'year'],
      [4, 'capex', 'NA', 'missing'],
      [5, 'company', '', 'no-company'],
      [6, 'year', '', 'missing'],
      [8, 'company', 'a ', 'spelling'],
    ]);
    expect(result).toEqual(
      jasmine.objectContaining({
        companies: 2,
        years: 4,
        firstYear: 2020,
        lastYear: 2023,
        rows: 4,
        completeRows: 2,
        leftOutRows: 3,
        findingCount: 6,
        blockingCount: 2,
        changes: null,
        missingRates: [],
      }),
    );
    expect(result.spellings).toEqual([
      [
        { company: 'A', rows: 3 },
        { company: 'a', rows: 1 },
      ],
    ]);
  });

  it('says of a row that stands again where it stands first', () => {
    const figures = ['1', '2', '3'];
    const { findings } = check(
      tableOf(
        plainHeader,
        ['A', '2020', ...figures],
        ['B', '2020', ...figures],
        ['A', '2020', ...figures],
        ['A', 'FY2020', ...figures],
      ),
    );
    expect(findings.map(({ row, code, sameAs }) => [row, code, sameAs])).toEqual([
      [2, 'duplicate', undefined],
      [4, 'duplicate', 2],
      [5, 'duplicate', 2],
    ]);
  });

  it('shows the rows of its findings, whether they are taken, and those that are mended or left out', () => {
    const result = check(
      tableOf(
        plainHeader,
        ['A', '2020', '1', '2', '3'],
        ['A', '2021', 'one', '2', '3'],
        ['', '2022', '3', '1', '3'],
        ['Sum', '2022', 'x', '1', '3'],
        ['A', '2022', '3', '1', 'y'],
      ),
      { mending: { ...mending, cells: [{ row: 6, column: 'be', text: '9' }], excludedRows: [5] } },
    );
    expect(result.reviewRows).toEqual([
      { row: 3, cells: ['A', '2021', 'one', '2', '3'], isTaken: true, isExcluded: false },
      { row: 4, cells: ['', '2022', '3', '1', '3'], isTaken: false, isExcluded: false },
      { row: 5, cells: ['Sum', '2022', 'x', '1', '3'], isTaken: false, isExcluded: true },
      { row: 6, cells: ['A', '2022', '3', '1', '9'], isTaken: true, isExcluded: false },
    ]);
    expect(result.leftOutRows).toBe(2);
    expect(result.blockingCount).toBe(1);
  });

  it('lists no more than 500 findings and counts all', () => {
    const rows = Array.from({ length: 1200 }, (_, index) => [
      'A',
      String(1000 + index),
      index < 1100 ? '' : 'x',
      '1',
      '1',
    ]);
    const result = check(tableOf(plainHeader, ...rows));
    expect(result.findings.length).toBe(500);
    expect(result.findingCount).toBe(1200);
    expect(result.blockingCount).toBe(100);
    expect(result.findings.map(({ row }) => row)).toEqual([
      ...Array.from({ length: 100 }, (_, index) => 1102 + index),
      ...Array.from({ length: 400 }, (_, index) => 2 + index),
    ]);
  });

  it('offers a new name beside one that the panel has, and the panel’s as the one to read it as', () => {
    const current: PanelBlock = {
      companies: ['Arvo', 'Brimholt', 'BRIMHOLT', 'Corvane'],
      company: Int32Array.of(0, 1, 2, 3),
      year: Int32Array.of(2019, 2019, 2019, 2019),
      columns: panelColumns(plainRecipe),
      values: [1, 2, 3].map((value) => Float64Array.of(value, value, value, value)),
    };
    const table = tableOf(
      plainHeader,
      ['arvo', '2019', '1', '2', '3'],
      ['arvo', '2020', '1', '2', '3'],
      ['Brimholt', '2020', '1', '2', '3'],
    );
    const { spellings, findings } = check(table, {}, current);
    expect(spellings).toEqual([
      [
        { company: 'Arvo', rows: 0 },
        { company: 'arvo', rows: 2 },
      ],
    ]);
    expect(findings.map(({ row, found, code }) => [row, found, code])).toEqual([
      [2, 'arvo', 'spelling'],
    ]);
    expect(findings[0].detail).toContain('“Arvo” of the panel’s newest version');
    const renames = [{ from: 'arvo', to: 'Arvo' }];
    const renamed = check(table, { mending: { ...mending, renames } }, current);
    expect([renamed.spellings, renamed.findings]).toEqual([[], []]);
    expect(renamed.changes?.addedRows).toBe(2);
  });

  it('lists no more than 500 groups of spellings and finds all', () => {
    const rows = Array.from({ length: 600 }, (_, index) =>
      ['firm', 'FIRM'].map((word) => [`${word} ${index}`, '2020', '1', '1', '1']),
    ).flat();
    const result = check(tableOf(plainHeader, ...rows));
    expect(result.spellings.length).toBe(500);
    expect(result.findingCount).toBe(600);
  });

  it('shows the first twenty rows as the panel would hold them', () => {
    const rows = Array.from({ length: 30 }, (_, index) => [
      index % 2 === 0 ? 'A' : 'B',
      String(2000 + index),
      '1,5',
      'NA',
      '3',
    ]);
    const result = check(tableOf(plainHeader, ...rows), {
      mending: { ...mending, renames: [{ from: 'B', to: 'Beta' }] },
      conversion: {
        ...plainRecipe.conversion,
        columns: [{ column: 'mv', unit: 'thousands', measure: null }],
      },
    });
    expect(result.firstRows.length).toBe(20);
    expect(result.firstRows[1]).toEqual({
      row: 3,
      company: 'Beta',
      year: 2001,
      values: [1500, null, 3],
    });
  });

  it('says what the file would change in the panel of the same name', () => {
    const current: PanelBlock = {
      companies: ['B', 'A'],
      company: Int32Array.of(0, 1, 1),
      year: Int32Array.of(2020, 2020, 2021),
      columns: panelColumns(plainRecipe),
      values: [Float64Array.of(1, 2, 3), Float64Array.of(1, NaN, 3), Float64Array.of(1, 2, 3)],
    };
    const table = tableOf(
      plainHeader,
      ['A', '2020', '2', '7', '2'],
      ['A', '2021', '3', '3', '3'],
      ['A', '2022', '4', '4', '4'],
    );
    expect(check(table, {}, current).changes).toEqual({
      addedRows: 1,
      removedRows: 1,
      changedCells: 1,
      listed: [
        { company: 'A', year: 2020, kind: 'changed-cell', column: 'capex', before: null, after: 7 },
        { company: 'B', year: 2020, kind: 'removed-row', column: null, before: null, after: null },
        { company: 'A', year: 2022, kind: 'added-row', column: null, before: null, after: null },
      ],
    });
  });

  it('finds formulas in the columns that it takes, none of them blocking', () => {
    const table: Table = {
      ...tableOf([...plainHeader, 'note'], ['A', '2020', '1', '2', '3', 'x']),
      isFormula: (_, column) => column >= 4,
    };
    const result = checkFile({ table, formulaCells: 2 }, plainRecipe, null);
    expect(
      result.findings.map(({ column, code, isBlocking }) => [column, code, isBlocking]),
    ).toEqual([['be', 'formula', false]]);
    expect(result.formulaCells).toBe(2);
  });

  it('refuses a name too long for one, and years of fewer than four digits', () => {
    const table = tableOf(
      plainHeader,
      ['N'.repeat(201), '2020', '1', '2', '3'],
      ['N'.repeat(200), '2020', '1', '2', '3'],
      ['A', '20', '1', '2', '3'],
    );
    const result = check(table);
    expect(result.findings.map(({ row, code, isBlocking }) => [row, code, isBlocking])).toEqual([
      [2, 'no-company', true],
      [4, 'year', true],
    ]);
    expect(result.rows).toBe(1);
  });

  it('knows the year-end of a company by any of its names', () => {
    const table = tableOf(
      plainHeader,
      ['A', '2020', '1', '2', '3'],
      ['Alpha', '2022', '1', '2', '3'],
    );
    const result = check(table, {
      mending: { ...mending, renames: [{ from: 'A', to: 'Alpha' }] },
      conversion: {
        ...plainRecipe.conversion,
        fiscalYears: {
          rule: 'year-of-most-months',
          usualEndMonth: 12,
          companies: [{ company: 'A', endMonth: 3 }],
        },
      },
    });
    expect(result.firstRows.map(({ year }) => year)).toEqual([2019, 2021]);
  });

  it('says that there is nothing in a table without usable rows', () => {
    expect(check(tableOf(plainHeader))).toEqual(
      jasmine.objectContaining({ companies: 0, firstYear: null, lastYear: null, firstRows: [] }),
    );
  });

  it('names text columns that are not there', () => {
    const attributes = ['industry'];
    expect(() => check(tableOf(plainHeader), { attributes })).toThrowError(/no industry/u);
    const currencies = { column: 'cur', rates: [] };
    const conversion = { ...plainRecipe.conversion, currencies };
    expect(() => check(tableOf(plainHeader), { conversion })).toThrowError(/no cur/u);
  });
});
