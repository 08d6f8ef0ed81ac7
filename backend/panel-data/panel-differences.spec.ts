import { type ComparedPanel, panelDifferences } from './panel-differences';

type Row = readonly [company: string, year: number, ...values: number[]];

function panelOf(columns: readonly string[], ...rows: readonly Row[]): ComparedPanel {
  const companies = [...new Set(rows.map(([company]) => company))];
  return {
    companies,
    company: rows.map(([company]) => companies.indexOf(company)),
    year: rows.map(([, year]) => year),
    columns: columns.map((name) => ({ name, role: 'other' })),
    values: columns.map((_, column) => rows.map((row) => row[column + 2] as number)),
  };
}

describe('panelDifferences', () => {
  it('matches rows by company and year and columns by header, whatever their order', () => {
    const before = panelOf(['x', 'y'], ['A', 2020, 1, 2], ['B', 2020, 3, NaN]);
    const after = panelOf(['y', 'x'], ['B', 2020, NaN, 3], ['A', 2020, 2, 1]);
    expect(panelDifferences(before, after, 10)).toEqual({
      addedRows: 0,
      removedRows: 0,
      changedCells: 0,
      listed: [],
    });
  });

  it('lists changed cells, then removed rows, then added ones', () => {
    const before = panelOf(['x', 'y'], ['A', 2020, 1, 2], ['B', 2020, 3, NaN]);
    const after = panelOf(['x', 'y'], ['A', 2021, 5, 5], ['B', 2020, NaN, 4]);
    expect(panelDifferences(before, after, 10)).toEqual({
      addedRows: 1,
      removedRows: 1,
      changedCells: 2,
      listed: [
        { company: 'B', year: 2020, kind: 'changed-cell', column: 'x', before: 3, after: null },
        { company: 'B', year: 2020, kind: 'changed-cell', column: 'y', before: null, after: 4 },
        { company: 'A', year: 2020, kind: 'removed-row', column: null, before: null, after: null },
        { company: 'A', year: 2021, kind: 'added-row', column: null, before: null, after: null },
      ],
    });
  });

  it('takes doubles as they are: the last bit is a change, a signed zero is none', () => {
    const before = panelOf(['x'], ['A', 2020, 0.3], ['A', 2021, 0]);
    const after = panelOf(['x'], ['A', 2020, 0.1 + 0.2], ['A', 2021, -0]);
    expect(panelDifferences(before, after, 10).changedCells).toBe(1);
  });

  it('counts a column that only one of the two has as missing in the other', () => {
    const before = panelOf(['x'], ['A', 2020, 1], ['A', 2021, 1]);
    const after = panelOf(['x', 'z'], ['A', 2020, 1, 9], ['A', 2021, 1, NaN]);
    expect(panelDifferences(before, after, 10).listed).toEqual([
      { company: 'A', year: 2020, kind: 'changed-cell', column: 'z', before: null, after: 9 },
    ]);
    expect(panelDifferences(after, before, 10).listed).toEqual([
      { company: 'A', year: 2020, kind: 'changed-cell', column: 'z', before: 9, after: null },
    ]);
  });

  it('knows a column of the model by what it is, under whatever header', () => {
    const named = (capex: string, others: readonly string[], ...rows: readonly Row[]) => ({
      ...panelOf([capex, ...others], ...rows),
      columns: [
        { name: capex, role: 'capex' as const },
        ...others.map((name) => ({ name, role: 'other' as const })),
      ],
    });
    const before = named('capex_eur', ['staff'], ['A', 2020, 1, 7]);
    expect(
      panelDifferences(before, named('Capex', ['staff'], ['A', 2020, 1, 7]), 9).listed,
    ).toEqual([]);
    // The header of one column may well be that of another later.
    const swapped = named('staff', ['capex_eur'], ['A', 2020, 2, 1]);
    expect(panelDifferences(before, swapped, 9).listed).toEqual([
      { company: 'A', year: 2020, kind: 'changed-cell', column: 'staff', before: 1, after: 2 },
      {
        company: 'A',
        year: 2020,
        kind: 'changed-cell',
        column: 'capex_eur',
        before: null,
        after: 1,
      },
      { company: 'A', year: 2020, kind: 'changed-cell', column: 'staff', before: 7, after: null },
    ]);
  });

  it('lists no more than asked and counts all', () => {
    const rows = Array.from({ length: 50 }, (_, index): Row => ['A', 2000 + index, index]);
    const result = panelDifferences(panelOf(['x']), panelOf(['x'], ...rows), 7);
    expect(result.addedRows).toBe(50);
    expect(result.listed.length).toBe(7);
  });

  it('takes the first of rows that stand in a panel twice', () => {
    const before = panelOf(['x'], ['A', 2020, 1]);
    const after = panelOf(['x'], ['A', 2020, 1], ['A', 2020, 2]);
    expect(panelDifferences(before, after, 10)).toEqual(
      jasmine.objectContaining({ addedRows: 0, changedCells: 0 }),
    );
  });
});
