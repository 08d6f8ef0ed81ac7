import { type CellRemark, findingAt, type FindingList } from './finding-list';
import type { Table } from './table';

/** Finds every cell of some columns that a formula wrote. */
export function findFormulas(
  table: Table,
  headers: readonly string[],
  findings: FindingList,
): void {
  const { isFormula } = table;
  if (isFormula === undefined) return;
  for (const column of headers.map((header) => table.header.indexOf(header))) {
    for (let row = 0; row < table.rows.length; row++) {
      if (isFormula(row, column)) findings.add(findingAt(table, row, column, storedValue));
    }
  }
}

const storedValue: CellRemark = {
  code: 'formula',
  detail: 'A formula stands here: the value that was last stored for it is taken.',
  isBlocking: false,
};
