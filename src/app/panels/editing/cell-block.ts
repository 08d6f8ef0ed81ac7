/** A cell by what the grid shows: position of its row after filters and sorting, and of its column. */
export interface GridPlace {
  readonly row: number;
  readonly column: number;
}

/** A block of cells: from where it was begun to where it was drawn. */
export interface CellBlock {
  readonly anchor: GridPlace;
  readonly head: GridPlace;
}

/** Both ends belong to it. */
export interface CellRange {
  readonly firstRow: number;
  readonly lastRow: number;
  readonly firstColumn: number;
  readonly lastColumn: number;
}

export interface GridExtent {
  readonly rows: number;
  readonly columns: number;
}

export function oneCell(place: GridPlace): CellBlock {
  return { anchor: place, head: place };
}

export function rangeOf({ anchor, head }: CellBlock): CellRange {
  return {
    firstRow: Math.min(anchor.row, head.row),
    lastRow: Math.max(anchor.row, head.row),
    firstColumn: Math.min(anchor.column, head.column),
    lastColumn: Math.max(anchor.column, head.column),
  };
}

export function isOneCell({ anchor, head }: CellBlock): boolean {
  return anchor.row === head.row && anchor.column === head.column;
}

export function isWithin(range: CellRange, { row, column }: GridPlace): boolean {
  return (
    row >= range.firstRow &&
    row <= range.lastRow &&
    column >= range.firstColumn &&
    column <= range.lastColumn
  );
}

export type Direction = 'up' | 'down' | 'left' | 'right';

const steps: Readonly<Record<Direction, GridPlace>> = {
  up: { row: -1, column: 0 },
  down: { row: 1, column: 0 },
  left: { row: 0, column: -1 },
  right: { row: 0, column: 1 },
};

/** The block drawn one cell further, or to the last cell that way. */
export function drawn(
  block: CellBlock,
  direction: Direction,
  far: 'one' | 'all',
  extent: GridExtent,
): CellBlock {
  const step = steps[direction];
  const cells = far === 'one' ? 1 : Math.max(extent.rows, extent.columns);
  const head = {
    row: within(block.head.row + step.row * cells, extent.rows),
    column: within(block.head.column + step.column * cells, extent.columns),
  };
  return { anchor: block.anchor, head };
}

function within(position: number, count: number): number {
  return Math.max(0, Math.min(count - 1, position));
}

/** Rows and columns in which a cell's place in the block differs between the two; drawing these again is enough. */
export interface ChangedCells {
  readonly rows: (row: number) => boolean;
  readonly columns: (column: number) => boolean;
}

export function changedCells(before: CellRange | null, after: CellRange | null): ChangedCells {
  if (before === null || after === null) {
    const range = before ?? after;
    return {
      rows: (row) => range !== null && row >= range.firstRow && row <= range.lastRow,
      columns: (column) =>
        range !== null && column >= range.firstColumn && column <= range.lastColumn,
    };
  }
  const areRowsSame = before.firstRow === after.firstRow && before.lastRow === after.lastRow;
  const areColumnsSame =
    before.firstColumn === after.firstColumn && before.lastColumn === after.lastColumn;
  const rowSign = ({ firstRow, lastRow }: CellRange, row: number): string =>
    row < firstRow || row > lastRow ? '' : `in${row === firstRow}${row === lastRow}`;
  const columnSign = ({ firstColumn, lastColumn }: CellRange, column: number): string =>
    column < firstColumn || column > lastColumn
      ? ''
      : `in${column === firstColumn}${column === lastColumn}`;
  return {
    rows: (row) =>
      areColumnsSame
        ? rowSign(before, row) !== rowSign(after, row)
        : rowSign(before, row) !== '' || rowSign(after, row) !== '',
    columns: (column) =>
      areRowsSame
        ? columnSign(before, column) !== columnSign(after, column)
        : columnSign(before, column) !== '' || columnSign(after, column) !== '',
  };
}
