import { plainHeader, tableOf } from '../../testing/tables';
import { FindingList } from '../finding-list';
import type { Table } from '../table';
import { companyNames } from './company-names';
import { mendTable } from './mend-table';

const table = tableOf(plainHeader, ['A', '2020', 'x', '1', '1'], ['B', '2020', '2', '1', '1']);

describe('mendTable', () => {
  it('puts texts in place of the file’s and leaves lines out; the table itself stays', () => {
    const before = structuredClone(table);
    const findings = new FindingList();
    const mended = mendTable(
      table,
      { cells: [{ row: 2, column: 'mv', text: '7' }], excludedRows: [3] },
      findings,
    );
    expect(mended.table.rows).toEqual([['A', '2020', '7', '1', '1']]);
    expect(mended.table.lines).toEqual([2]);
    expect(mended.whole.rows.length).toBe(2);
    expect(table).toEqual(before);
    expect(findings.count).toBe(0);
  });

  it('finds what it cannot mend, without standing in the way', () => {
    const findings = new FindingList();
    const mended = mendTable(
      table,
      {
        cells: [
          { row: 9, column: 'mv', text: '7' },
          { row: 2, column: 'gone', text: '8' },
        ],
        excludedRows: [99],
      },
      findings,
    );
    expect(mended.table.rows).toEqual(table.rows);
    expect(
      findings
        .first()
        .map(({ row, column, found, code, isBlocking }) => [row, column, found, code, isBlocking]),
    ).toEqual([
      [2, 'gone', '8', 'mending', false],
      [9, 'mv', '7', 'mending', false],
      [99, '', '', 'mending', false],
    ]);
  });

  it('takes the later of two mends of one cell, and no longer counts it as a formula', () => {
    const withFormulas: Table = { ...table, isFormula: (_, column) => column === 2 };
    const cells = ['5', '6'].map((text) => ({ row: 3, column: 'mv', text }));
    const mended = mendTable(withFormulas, { cells, excludedRows: [2] }, new FindingList());
    expect(mended.table.rows[0][2]).toBe('6');
    expect(mended.table.isFormula?.(0, 2)).toBeFalse();
    expect(mended.whole.isFormula?.(0, 2)).toBeTrue();
  });

  it('finds cells of a wide sheet by its own line and header, also after rows that are left out', () => {
    const wide: Table = {
      ...tableOf(plainHeader, ['A', '2020', '1'], ['B', '2020', '2'], ['B', '2021', '3']),
      lines: [4, 5, 5],
      placeOf: (row, column) => ({
        line: row === 0 ? 4 : 5,
        header: column === 0 ? 'company' : `mv ${row === 2 ? 2021 : 2020}`,
      }),
    };
    const cells = [
      { row: 5, column: 'mv 2021', text: '30' },
      { row: 5, column: 'company', text: 'C' },
    ];
    const mended = mendTable(wide, { cells, excludedRows: [4] }, new FindingList());
    expect(mended.table.rows.map(([company, , value]) => [company, value])).toEqual([
      ['C', '2'],
      ['C', '30'],
    ]);
    expect(mended.table.placeOf?.(1, 2)).toEqual({ line: 5, header: 'mv 2021' });
  });
});

describe('companyNames', () => {
  it('takes off blanks around a name and follows renames to their end', () => {
    const nameOf = companyNames([
      { from: 'A ', to: 'B' },
      { from: 'B', to: 'C' },
    ]);
    expect(['A', ' A', 'B', 'C', 'D '].map(nameOf)).toEqual(['C', 'C', 'C', 'C', 'D']);
  });

  it('leaves names as they are that lead back to each other', () => {
    const nameOf = companyNames([
      { from: 'A', to: 'B' },
      { from: 'B', to: 'A' },
      { from: 'X', to: 'A' },
      { from: 'Y', to: 'Y' },
    ]);
    expect(['A', 'B', 'X', 'Y'].map(nameOf)).toEqual(['A', 'B', 'X', 'Y']);
  });

  it('takes the later of two renames of one name', () => {
    const renames = ['B', 'C'].map((to) => ({ from: 'A', to }));
    expect(companyNames(renames)('A')).toBe('C');
  });
});
