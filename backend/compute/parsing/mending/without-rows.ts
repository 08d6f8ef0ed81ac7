import type { Table } from '../table';

/** A table without some lines of the file, and the lines that it did not have. */
export interface ShortenedTable {
  readonly table: Table;
  readonly lost: readonly number[];
}

/** @param lines  lines of the file that are left out, with every row of the table that stands on them. */
export function withoutRows(table: Table, lines: readonly number[]): ShortenedTable {
  if (lines.length === 0) return { table, lost: [] };
  const excluded = new Set(lines);
  const known = new Set(table.lines);
  const lost = [...excluded].filter((line) => !known.has(line));
  const kept: number[] = [];
  table.lines.forEach((line, row) => {
    if (!excluded.has(line)) kept.push(row);
  });
  const { placeOf, isFormula, isNumber } = table;
  return {
    table: {
      ...table,
      rows: kept.map((row) => table.rows[row]),
      lines: kept.map((row) => table.lines[row]),
      ...(placeOf && {
        placeOf: (row: number, column: number) => placeOf(kept[row], column),
      }),
      ...(isFormula && {
        isFormula: (row: number, column: number) => isFormula(kept[row], column),
      }),
      ...(isNumber && {
        isNumber: (row: number, column: number) => isNumber(kept[row], column),
      }),
    },
    lost,
  };
}
