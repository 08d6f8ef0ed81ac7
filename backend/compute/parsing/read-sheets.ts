import type { TableLayout, TableReading } from '../file-recipe';
import { FileRefusal } from './file-refusal';
import type { Grid } from './grid';
import { findHeaderRow, isNumber } from './header-row';
import { recogniseLayout } from './layout/recognise-layout';
import { type WideSheet, wideSheet } from './layout/wide-sheet';
import { sheetAVariable, variablesInRows, yearsInColumns } from './layout/years-in-columns';
import type { SheetOfFile } from './sheet-of-file';
import type { Table } from './table';
import { tableOfGrid } from './table-of-grid';

export interface SheetsTable {
  readonly table: Omit<Table, 'delimiter'>;
  readonly reading: TableReading;
  /** The sheet that was read, or the first of several. */
  readonly grid: Grid;
}

const longestHeader = 500;
const lastHeaderLine = 1000;

/**
 * Reads the sheets of a file as one long table.
 *
 * @param reading  null to have sheet, header row and layout recognised.
 * @throws {FileRefusal} 'reading_invalid' where the reading does not fit the file.
 */
export function readSheets(
  sheets: readonly SheetOfFile[],
  reading: TableReading | null,
): SheetsTable {
  const sheet = reading === null ? likelySheet(sheets) : sheetOf(sheets, reading);
  const { grid } = sheet;
  const headerIndex =
    reading === null ? (findHeaderRow(grid) ?? 0) : rowFromLine(grid, reading.headerRow);
  const layout = reading?.layout ?? recogniseLayout(sheets, sheet, headerIndex);
  refuseLowHeader(grid.lines[headerIndex]);
  const table = tableOf(sheets, sheet, headerIndex, layout);
  refuseLongHeader(table.header);
  return {
    table,
    reading: {
      sheet: sheet.name,
      headerRow: grid.lines[headerIndex],
      layout,
      decimalSign: reading?.decimalSign ?? decimalSignOf(sheet),
    },
    grid,
  };
}

function tableOf(
  sheets: readonly SheetOfFile[],
  { name, grid }: SheetOfFile,
  headerIndex: number,
  layout: TableLayout,
): Omit<Table, 'delimiter'> {
  switch (layout.kind) {
    case 'long':
      return tableOfGrid(grid, headerIndex, name === null ? undefined : widthOf(grid, headerIndex));
    case 'years-in-columns': {
      const wide = expectWide(wideSheet(grid, headerIndex), grid.lines[headerIndex], name);
      return layout.item === null
        ? yearsInColumns(wide, name ?? 'Value')
        : variablesInRows(wide, layout.item);
    }
    case 'sheet-a-variable':
      return sheetAVariable(
        layout.sheets.map((variable) => {
          const sheet = sheetNamed(sheets, variable);
          return { ...wideSheetNear(sheet, grid.lines[headerIndex]), variable };
        }),
      );
  }
}

function refuseLowHeader(line: number): void {
  if (line > lastHeaderLine)
    throw new FileRefusal(
      'reading_invalid',
      `expected the headers on one of the first ${lastHeaderLine} lines; the first filled ones begin on line ${line}`,
    );
}

/** A column is named by its header wherever it is spoken of. */
function refuseLongHeader(header: readonly string[]): void {
  const index = header.findIndex((text) => text.length > longestHeader);
  if (index === -1) return;
  throw new FileRefusal(
    'sheet_limit',
    `expected headers of at most ${longestHeader} characters; the one of column ${index + 1} is longer`,
  );
}

/** Sheets of one workbook may begin on different lines: where the line has no years, the sheet's own header counts. */
function wideSheetNear({ name, grid }: SheetOfFile, line: number): WideSheet {
  const prefix = `${name ?? ''} `;
  const onLine = grid.lines.indexOf(line);
  const found = onLine === -1 ? undefined : wideSheet(grid, onLine, prefix);
  return expectWide(found ?? wideSheet(grid, findHeaderRow(grid) ?? 0, prefix), line, name);
}

function expectWide(wide: WideSheet | undefined, line: number, name: string | null): WideSheet {
  if (wide !== undefined) return wide;
  const where = name === null ? '' : ` of “${name}”`;
  throw new FileRefusal(
    'reading_invalid',
    `expected a column of companies and years in the headers on line ${line}${where}; found none`,
  );
}

/** The first sheet on show that has a table; else the first that is filled. */
function likelySheet(sheets: readonly SheetOfFile[]): SheetOfFile {
  const filled = sheets.filter(({ grid }) => grid.rows.length > 0);
  const shown = filled.filter(({ isHidden }) => !isHidden);
  const found =
    shown.find(({ grid }) => findHeaderRow(grid) !== undefined) ?? [...shown, ...filled].at(0);
  if (found !== undefined) return found;
  throw new FileRefusal('reading_invalid', 'expected a sheet with cells; found empty ones only');
}

function sheetOf(sheets: readonly SheetOfFile[], { sheet, layout }: TableReading): SheetOfFile {
  if (layout.kind === 'sheet-a-variable') return sheetNamed(sheets, layout.sheets[0]);
  return sheetNamed(sheets, sheet);
}

function sheetNamed(sheets: readonly SheetOfFile[], name: string | null): SheetOfFile {
  const found = sheets.find((sheet) => sheet.name === name);
  if (found !== undefined && found.grid.rows.length > 0) return found;
  const expected = name === null ? 'a sheet to be chosen' : `a filled sheet “${name}”`;
  const names = sheets.map((sheet) => sheet.name ?? 'a text file').join(', ');
  throw new FileRefusal('reading_invalid', `expected ${expected}; the file has ${names}`);
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

/** Notes beside a sheet's table are columns without a header. */
function widthOf(grid: Grid, headerIndex: number): number {
  return grid.rows.slice(headerIndex).reduce((widest, cells) => Math.max(widest, cells.length), 0);
}

/** Numbers that a workbook stores need no sign; texts among them may be written either way. */
function decimalSignOf({ name, grid }: SheetOfFile): TableReading['decimalSign'] {
  if (name === null) return 'as-found';
  const hasSignedTexts = grid.rows.some((cells, row) =>
    cells.some(
      (cell, column) =>
        (cell.includes(',') || cell.includes('.')) &&
        grid.isNumber?.(row, column) !== true &&
        isNumber(cell),
    ),
  );
  return hasSignedTexts ? 'as-found' : '.';
}
