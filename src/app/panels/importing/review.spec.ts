import type { ImportFinding, ReviewRow } from '@contract';
import { kindCounts, reviewOf } from './review';

function finding(row: number, column: string, change: Partial<ImportFinding> = {}): ImportFinding {
  const rest = { found: 'abc', code: 'not-a-number', detail: 'Expected a number.' } as const;
  return { row, column, isBlocking: true, ...rest, ...change };
}

function line(row: number, ...cells: string[]): ReviewRow {
  return { row, cells, isTaken: true, isExcluded: false };
}

describe('the review of a check', () => {
  it('puts a finding to the cell of its row, and keeps rows that were mended', () => {
    const rows = [line(2, 'A', '2020', 'abc'), line(3, 'B', '2020', '7')];
    const review = reviewOf(
      { findings: [finding(2, 'mv'), finding(9, 'mv')], reviewRows: rows },
      ['firm', 'year', 'mv'],
      1,
    );
    expect(review.rows.map(({ row, findings }) => [row.row, findings.length])).toEqual([
      [2, 1],
      [3, 0],
    ]);
    expect(review.rows[0].findings[0].column).toBe(2);
    expect(review.elsewhere.map(({ row }) => row)).toEqual([9]);
  });

  it('finds the row of a wide sheet by the year in the column’s header', () => {
    const rows = ['2019', '2020', '2021'].map((year) => line(4, 'A', year, 'x', 'y'));
    const review = reviewOf(
      { findings: [finding(4, 'Capex 2020')], reviewRows: rows },
      ['Company', 'Year', 'Market value', 'Capex'],
      1,
    );
    expect(review.rows.map(({ row }) => row.cells[1])).toEqual(['2020']);
    expect(review.rows[0].findings[0].column).toBe(3);
  });

  it('shows a left-out line of a wide sheet once', () => {
    const rows = ['2019', '2020'].map((year) => ({ ...line(4, 'A', year), isExcluded: true }));
    const review = reviewOf({ findings: [], reviewRows: rows }, ['Company', 'Year'], 1);
    expect(review.rows.map(({ row }) => row.cells[1])).toEqual(['2019']);
  });

  it('counts findings by kind, those that keep the file out first', () => {
    const empty = finding(3, 'mv', { code: 'missing', isBlocking: false });
    const year = finding(4, 'year', { code: 'year' });
    expect(
      kindCounts([empty, empty, year]).map(({ title, count, isBlocking }) => [
        title,
        count,
        isBlocking,
      ]),
    ).toEqual([
      ['Not a year', 1, true],
      ['Empty cell', 2, false],
    ]);
  });
});
