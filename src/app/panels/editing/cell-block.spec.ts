import {
  type CellRange,
  changedCells,
  drawn,
  isOneCell,
  isWithin,
  oneCell,
  rangeOf,
} from './cell-block';

const extent = { rows: 10, columns: 5 };

describe('a block of cells', () => {
  it('is drawn cell by cell and back over where it began', () => {
    let block = oneCell({ row: 4, column: 2 });
    expect(isOneCell(block)).toBeTrue();
    block = drawn(block, 'down', 'one', extent);
    block = drawn(block, 'right', 'one', extent);
    expect(rangeOf(block)).toEqual({ firstRow: 4, lastRow: 5, firstColumn: 2, lastColumn: 3 });
    for (let times = 0; times < 3; times++) block = drawn(block, 'up', 'one', extent);
    expect(rangeOf(block)).toEqual({ firstRow: 2, lastRow: 4, firstColumn: 2, lastColumn: 3 });
    expect(block.anchor).toEqual({ row: 4, column: 2 });
  });

  it('stops at the edges', () => {
    const block = oneCell({ row: 4, column: 2 });
    expect(drawn(block, 'down', 'all', extent).head).toEqual({ row: 9, column: 2 });
    expect(drawn(block, 'left', 'all', extent).head).toEqual({ row: 4, column: 0 });
    const corner = oneCell({ row: 0, column: 4 });
    expect(drawn(drawn(corner, 'up', 'one', extent), 'right', 'one', extent)).toEqual(corner);
  });

  it('knows its cells', () => {
    const range = rangeOf({ anchor: { row: 3, column: 3 }, head: { row: 1, column: 2 } });
    expect(isWithin(range, { row: 1, column: 3 })).toBeTrue();
    expect(isWithin(range, { row: 0, column: 3 })).toBeFalse();
    expect(isWithin(range, { row: 2, column: 4 })).toBeFalse();
  });

  it('asks for no more cells to be drawn again than change', () => {
    const range = (lastRow: number, lastColumn: number): CellRange => ({
      ...{ firstRow: 1, firstColumn: 1 },
      ...{ lastRow, lastColumn },
    });
    const rowsOf = (before: CellRange | null, after: CellRange | null) =>
      Array.from({ length: 10 }, (_, row) => row).filter(changedCells(before, after).rows);
    const columnsOf = (before: CellRange | null, after: CellRange | null) =>
      Array.from({ length: 5 }, (_, column) => column).filter(changedCells(before, after).columns);
    expect(rowsOf(range(4, 2), range(5, 2))).toEqual([4, 5]);
    expect(columnsOf(range(4, 2), range(5, 2))).toEqual([1, 2]);
    expect(columnsOf(range(4, 2), range(4, 3))).toEqual([2, 3]);
    expect(rowsOf(range(4, 2), range(5, 3))).toEqual([1, 2, 3, 4, 5]);
    expect(rowsOf(null, range(2, 2))).toEqual([1, 2]);
    expect(rowsOf(null, null)).toEqual([]);
  });
});
