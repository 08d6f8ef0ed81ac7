import type { TableReading } from '../file-recipe';
import type { FilePreview, NumberedLine } from '../parse-messages';
import { fileKind } from './file-kind';
import { FileRefusal } from './file-refusal';
import { readCsv } from './read-csv';
import { readSheets, type SheetsTable } from './read-sheets';
import { type Delimiter, type Table, tableLimits } from './table';
import { textEncodingOf } from './text-encoding';
import { TableError } from './table-error';
import type { Sheet } from './workbook/read-workbook';

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
    return fileKind(bytes, name) === 'xlsx'
      ? await readXlsx(bytes, reading)
      : await readText(bytes, reading);
  } catch (error) {
    throw error instanceof TableError ? asRefusal(error) : error;
  }
}

async function readText(bytes: Uint8Array, reading: TableReading | null): Promise<FileTable> {
  const encoding = reading?.encoding ?? textEncodingOf(bytes);
  const { grid, delimiter } = await readCsv(bytes, tableLimits, encoding);
  const read = readSheets([{ name: null, isHidden: false, grid }], reading);
  return fileTable({ ...read, reading: { ...read.reading, encoding } }, delimiter, []);
}

async function readXlsx(bytes: Uint8Array, reading: TableReading | null): Promise<FileTable> {
  // Text files, which are the most, do not wait for what unpacks a workbook.
  const { readWorkbook } = await import('./workbook/read-workbook');
  const sheets = await readWorkbook(bytes);
  return fileTable(readSheets(sheets, reading), null, sheets.map(sizeOf));
}

const topLineCount = 15;

function fileTable(
  { table, reading, grid }: SheetsTable,
  delimiter: Delimiter | null,
  sheets: FilePreview['sheets'],
): FileTable {
  return {
    table: { ...table, delimiter },
    reading,
    sheets,
    topLines: grid.rows
      .slice(0, topLineCount)
      .map((cells, row) => ({ row: grid.lines[row], cells: [...cells] })),
    formulaCells: formulaCellsOf(table),
  };
}

function sizeOf({ name, grid }: Sheet): FilePreview['sheets'][number] {
  const columns = grid.rows.reduce((widest, cells) => Math.max(widest, cells.length), 0);
  return { name, rows: grid.rows.length, columns };
}

function formulaCellsOf({ rows, isFormula }: Omit<Table, 'delimiter'>): number {
  if (isFormula === undefined) return 0;
  let count = 0;
  rows.forEach((cells, row) => {
    for (let column = 0; column < cells.length; column += 1) if (isFormula(row, column)) count += 1;
  });
  return count;
}

/** The upload rules' own codes; the tables of the command line keep theirs. */
function asRefusal(error: TableError): FileRefusal {
  return new FileRefusal(
    error.code === 'table-too-large' ? 'sheet_limit' : 'csv_invalid',
    error.message,
  );
}
