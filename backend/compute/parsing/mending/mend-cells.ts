import type { FileMending } from '../../file-recipe';
import type { IsCell } from '../grid';
import { placeOfCell, type Table } from '../table';

export type MendedCell = FileMending['cells'][number];

/** A table with cells as they should read, and the mends that found no cell of the file. */
export interface MendedTable {
  readonly table: Table;
  readonly lost: readonly MendedCell[];
}

/**
 * Puts the mended texts in place of the file's. Where several rows of a long table show one cell of a wide sheet, all of
 * them get the text. Of two mends of one cell the later counts; a mended cell no longer counts as a formula's or as
 * a number stored as one: what a person writes is a text.
 */
export function mendCells(table: Table, cells: readonly MendedCell[]): MendedTable {
  if (cells.length === 0) return { table, lost: [] };
  const mends = new Map(cells.map((cell) => [keyOf(cell.row, cell.column), cell]));
  const lines = new Set(cells.map(({ row }) => row));
  const found = new Set<string>();
  const width = table.header.length;
  const mendedAt = new Set<number>();
  const rows = table.rows.map((cellsOfRow, row) => {
    if (table.placeOf === undefined && !lines.has(table.lines[row])) return cellsOfRow;
    let copy: string[] | undefined;
    for (let column = 0; column < width; column++) {
      const { line, header } = placeOfCell(table, row, column);
      if (!lines.has(line)) continue;
      const key = keyOf(line, header);
      const mend = mends.get(key);
      if (mend === undefined) continue;
      copy ??= [...cellsOfRow];
      copy[column] = mend.text;
      found.add(key);
      mendedAt.add(row * width + column);
    }
    return copy ?? cellsOfRow;
  });
  const { isFormula, isNumber } = table;
  const unmended = (isCell: IsCell): IsCell => {
    return (row, column) => !mendedAt.has(row * width + column) && isCell(row, column);
  };
  return {
    table: {
      ...table,
      rows,
      ...(isFormula && { isFormula: unmended(isFormula) }),
      ...(isNumber && { isNumber: unmended(isNumber) }),
    },
    lost: [...mends].filter(([key]) => !found.has(key)).map(([, cell]) => cell),
  };
}

/** A line holds no line end, so that two places never share a key. */
function keyOf(line: number, header: string): string {
  return `${line}\n${header}`;
}
