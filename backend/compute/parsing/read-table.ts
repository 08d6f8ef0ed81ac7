import { readCsv } from './read-csv';
import type { Table, TableLimits } from './table';
import { tableOfGrid } from './table-of-grid';

/**
 * Reads a CSV file whose first line that is not blank holds the headers.
 *
 * @param source  the file's bytes, or a stream of them.
 * @throws {TableError} 'csv-invalid' with the line, or 'table-too-large' as soon as a limit is passed.
 */
export async function readTable(
  source: Uint8Array | AsyncIterable<Uint8Array>,
  limits?: TableLimits,
): Promise<Table> {
  const { grid, delimiter } = await readCsv(source, limits);
  return { ...tableOfGrid(grid, 0), delimiter };
}
