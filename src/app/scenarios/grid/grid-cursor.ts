/** A cell of the grid: row and column, from 0. */
export interface GridPlace {
  readonly row: number;
  readonly column: number;
}

/** Rows and columns that the grid has. */
export interface GridSize {
  readonly rows: number;
  readonly columns: number;
}

/**
 * Where a key leads from a cell, as in every grid: arrows, Home and End in the row, with Ctrl in the grid.
 *
 * @returns undefined for a key that leads nowhere.
 */
export function movedPlace(
  { key, ctrlKey }: Pick<KeyboardEvent, 'key' | 'ctrlKey'>,
  { row, column }: GridPlace,
  { rows, columns }: GridSize,
): GridPlace | undefined {
  const within = (place: GridPlace): GridPlace => ({
    row: Math.min(rows - 1, Math.max(0, place.row)),
    column: Math.min(columns - 1, Math.max(0, place.column)),
  });
  switch (key) {
    case 'ArrowUp':
      return within({ row: row - 1, column });
    case 'ArrowDown':
      return within({ row: row + 1, column });
    case 'ArrowLeft':
      return within({ row, column: column - 1 });
    case 'ArrowRight':
      return within({ row, column: column + 1 });
    case 'Home':
      return { row: ctrlKey ? 0 : row, column: 0 };
    case 'End':
      return { row: ctrlKey ? rows - 1 : row, column: columns - 1 };
    default:
      return undefined;
  }
}

/** A block of cells between two corners. */
export interface GridBlock {
  readonly from: GridPlace;
  readonly to: GridPlace;
}

export function blockBetween(one: GridPlace, other: GridPlace): GridBlock {
  return {
    from: { row: Math.min(one.row, other.row), column: Math.min(one.column, other.column) },
    to: { row: Math.max(one.row, other.row), column: Math.max(one.column, other.column) },
  };
}

export function isInBlock({ from, to }: GridBlock, { row, column }: GridPlace): boolean {
  return row >= from.row && row <= to.row && column >= from.column && column <= to.column;
}
