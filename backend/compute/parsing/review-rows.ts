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
  if (wanted.size === 0) return [];
  const { whole, table } = panel.mended;
  const shown = [...whole.rows.keys()].filter((row) => standsOn(wanted, whole, row));
  const untaken = new Set(shown.map((row) => whole.rows[row]));
  for (const row of panel.tableRow) untaken.delete(table.rows[row]);
  return shown.map((row) => {
    const [cells, line] = [whole.rows[row], whole.lines[row]];
    return { row: line, cells, isTaken: !untaken.has(cells), isExcluded: excluded.has(line) };
  });
}

/** Whether any cell of a row stands on one of the lines of the file. */
function standsOn(lines: ReadonlySet<number>, table: Table, row: number): boolean {
  if (lines.has(table.lines[row])) return true;
  const { placeOf, header } = table;
  return placeOf !== undefined && header.some((_, column) => lines.has(placeOf(row, column).line));
}
