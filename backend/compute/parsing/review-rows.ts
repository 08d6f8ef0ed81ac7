import type { FileMending } from '../file-recipe';
import type { FileCheck, FileFinding } from '../parse-messages';
import type { TablePanel } from './panel-of-table';
import type { Table } from './table';

/** So many rows that were mended or left out are shown besides those with findings. */
const mostMendedRows = 500;

/**
 * The rows to look at, in the order of the table: those that the findings stand in, and those that are mended or left
 * out, so that either can be taken back.
 */
export function reviewRows(
  panel: TablePanel,
  mending: FileMending,
  findings: readonly FileFinding[],
): FileCheck['reviewRows'] {
  const excluded = new Set(mending.excludedRows);
  const touched = [...mending.excludedRows, ...mending.cells.map(({ row }) => row)];
  const wanted = new Set([
    ...findings.map(({ row }) => row),
    ...[...new Set(touched)].slice(0, mostMendedRows),
  ]);
  const taken = new Set<readonly string[]>();
  for (const row of panel.tableRow) taken.add(panel.mended.table.rows[row]);
  const { whole } = panel.mended;
  return whole.rows.flatMap((cells, row) => {
    const line = whole.lines[row];
    if (!linesOf(whole, row).some((lineOfCell) => wanted.has(lineOfCell))) return [];
    return [{ row: line, cells, isTaken: taken.has(cells), isExcluded: excluded.has(line) }];
  });
}

/** Lines of the file that a row's cells stand on. */
function linesOf(table: Table, row: number): readonly number[] {
  const { placeOf } = table;
  if (placeOf === undefined) return [table.lines[row]];
  return [table.lines[row], ...table.header.map((_, column) => placeOf(row, column).line)];
}
