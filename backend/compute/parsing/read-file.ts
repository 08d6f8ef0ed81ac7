import type { TableReading } from '../file-recipe';
import type { FilePreview, NumberedLine } from '../parse-messages';
import { FileRefusal } from './file-refusal';
import type { Grid } from './grid';
import { findHeaderRow } from './header-row';
import { readCsv } from './read-csv';
import type { Table } from './table';
import { TableError } from './table-error';
import { tableOfGrid } from './table-of-grid';

/** A file as a long table, and how it was read. */
export interface FileTable {
  readonly table: Table;
  /** As asked for, or as recognised. */
  readonly reading: TableReading;
  /** Sheets of a workbook, hidden ones too; empty for a CSV file. */
  readonly sheets: FilePreview['sheets'];
  /** The first lines of the file or sheet as they stand. */
  readonly topLines: readonly NumberedLine[];
  /** Cells of the table that a formula wrote; its stored value was read. */
  readonly formulaCells: number;
}

const topLineCount = 15;

/**
 * Reads an uploaded file as a long table.
 *
 * @param name  the file's name; its ending says what kind it claims to be.
 * @param reading  sheet, header row and layout; null to have them recognised.
 * @throws {FileRefusal} for a file that is refused, or a reading that does not fit it.
 */
export async function readFile(
  bytes: Uint8Array,
  name: string,
  reading: TableReading | null,
): Promise<FileTable> {
  try {
    return await readCsvFile(bytes, reading);
  } catch (error) {
    throw error instanceof TableError ? asRefusal(error) : error;
  }
}

async function readCsvFile(bytes: Uint8Array, reading: TableReading | null): Promise<FileTable> {
  const { grid, delimiter } = await readCsv(bytes);
  const headerIndex = reading === null ? findHeaderRow(grid) : rowFromLine(grid, reading.headerRow);
  return {
    table: { ...tableOfGrid(grid, headerIndex), delimiter },
    reading: reading ?? {
      sheet: null,
      headerRow: grid.lines[headerIndex],
      layout: { kind: 'long' },
      decimalSign: 'as-found',
    },
    sheets: [],
    topLines: topLinesOf(grid),
    formulaCells: 0,
  };
}

function topLinesOf(grid: Grid): NumberedLine[] {
  return grid.rows
    .slice(0, topLineCount)
    .map((cells, row) => ({ row: grid.lines[row], cells: [...cells] }));
}

/** The first filled row from the line on. */
function rowFromLine(grid: Grid, line: number): number {
  const row = grid.lines.findIndex((filled) => filled >= line);
  if (row !== -1) return row;
  const last = grid.lines[grid.lines.length - 1];
  throw new FileRefusal(
    'reading_invalid',
    `expected the headers on line ${line} or below; the last filled line is ${last}`,
  );
}

/** The upload rules' own codes; the tables of the command line keep theirs. */
function asRefusal(error: TableError): FileRefusal {
  return new FileRefusal(
    error.code === 'table-too-large' ? 'sheet_limit' : 'csv_invalid',
    error.message,
  );
}
