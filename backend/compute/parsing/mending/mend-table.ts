import type { FileMending } from '../../file-recipe';
import type { FindingList } from '../finding-list';
import type { Table } from '../table';
import { mendCells } from './mend-cells';
import { withoutRows } from './without-rows';

/** A table as mended; the file itself never changes. */
export interface Mended {
  /** With the mended cells, rows that are left out still among them. */
  readonly whole: Table;
  /** What is read: without the rows that are left out. */
  readonly table: Table;
}

/** Mends a table, and finds every mend whose cell or line the file, as it is read, does not have. */
export function mendTable(
  table: Table,
  { cells, excludedRows }: Pick<FileMending, 'cells' | 'excludedRows'>,
  findings: FindingList,
): Mended {
  const mended = mendCells(table, cells);
  for (const { row, column, text } of mended.lost) {
    const detail = `The file as it is read has no cell ${column} on line ${row}: what was written there is not used.`;
    findings.add({ row, column, found: text, code: 'mending', detail, isBlocking: false });
  }
  const shortened = withoutRows(mended.table, excludedRows);
  for (const row of shortened.lost) {
    const detail = `The file as it is read has no row on line ${row}: there is nothing to leave out.`;
    findings.add({ row, column: '', found: '', code: 'mending', detail, isBlocking: false });
  }
  return { whole: mended.table, table: shortened.table };
}
