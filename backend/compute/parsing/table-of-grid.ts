import type { Grid } from './grid';
import type { Table } from './table';
import { TableError } from './table-error';
import { uniqueHeader } from './unique-header';

/**
 * The long table that begins with a header row: a row a line, lines above the header left out.
 *
 * @param headerIndex  row of the grid that holds the column headers.
 * @param width  columns of the table; as many as there are headers where it is left out.
 * @throws {TableError} 'csv-invalid' for a line with more filled cells than there are headers, with its place.
 */
export function tableOfGrid(
  grid: Grid,
  headerIndex: number,
  width = grid.rows[headerIndex].length,
): Omit<Table, 'delimiter'> {
  const headers = Array.from(
    { length: width },
    (_, column) => grid.rows[headerIndex][column] ?? '',
  );
  const lines = grid.lines.slice(headerIndex + 1);
  const rows = grid.rows.slice(headerIndex + 1).map((cells, row) => {
    if (cells.length === width) return cells;
    if (cells.slice(width).some((cell) => cell.trim() !== '')) {
      const message = `expected at most ${width} cells on line ${lines[row]}, as many as the header has; found ${cells.length}`;
      throw new TableError('csv-invalid', message, { row: lines[row], column: width + 1 });
    }
    return Array.from({ length: width }, (_, column) => cells[column] ?? '');
  });
  const { isFormula, isNumber } = grid;
  const first = headerIndex + 1;
  return {
    ...uniqueHeader(headers),
    rows,
    lines,
    ...(isFormula && {
      isFormula: (row: number, column: number) => isFormula(row + first, column),
    }),
    ...(isNumber && {
      isNumber: (row: number, column: number) => isNumber(row + first, column),
    }),
  };
}
