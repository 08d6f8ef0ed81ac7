export interface GridPlace {
  readonly row: number;
  readonly column: number;
}

const page = 10;

/** Where a key leads in a grid: arrows, Page Up and Down, Home and End of the row, with Ctrl of the grid. Null for others. */
export function gridMove(
  event: Pick<KeyboardEvent, 'key' | 'ctrlKey'>,
  { row, column }: GridPlace,
  rows: number,
  columns: number,
): GridPlace | null {
  if (rows === 0 || columns === 0) return null;
  const within = (place: GridPlace): GridPlace => ({
    row: Math.min(Math.max(place.row, 0), rows - 1),
    column: Math.min(Math.max(place.column, 0), columns - 1),
  });
  switch (event.key) {
    case 'ArrowRight':
      return within({ row, column: column + 1 });
    case 'ArrowLeft':
      return within({ row, column: column - 1 });
    case 'ArrowDown':
      return within({ row: row + 1, column });
    case 'ArrowUp':
      return within({ row: row - 1, column });
    case 'PageDown':
      return within({ row: row + page, column });
    case 'PageUp':
      return within({ row: row - page, column });
    case 'Home':
      return within({ row: event.ctrlKey ? 0 : row, column: 0 });
    case 'End':
      return within({ row: event.ctrlKey ? rows - 1 : row, column: columns - 1 });
    default:
      return null;
  }
}
