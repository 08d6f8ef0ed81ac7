import { once } from 'node:events';
import type { PassThrough } from 'node:stream';
import { setImmediate } from 'node:timers/promises';
import excel from 'exceljs';
import type { PanelTable } from './panel-table';

/** Texts and dates beside what they are. */
export type NotedLine = readonly [label: string, text: string | number | Date];

export interface NotedTable {
  readonly name: string;
  readonly table: PanelTable;
  /** A second sheet that says what the first one is. */
  readonly notes: { readonly name: string; readonly lines: readonly NotedLine[] };
  readonly createdAt: Date;
}

/** Rows that are written in one go: a few milliseconds of work. */
const rowsInPart = 250;

/**
 * Writes a table as an XLSX workbook of two sheets. Numbers are numbers and texts are texts: nothing is computed when it
 * is opened. Waits for whoever reads `target`, so that the workbook is never in memory as a whole.
 *
 * @throws what destroys `target`.
 */
export async function writeWorkbook(
  { name, table, notes, createdAt }: NotedTable,
  target: PassThrough,
): Promise<void> {
  const workbook = new excel.stream.xlsx.WorkbookWriter({ stream: target, useStyles: true });
  workbook.creator = 'Kinvale';
  workbook.created = createdAt;
  workbook.modified = createdAt;
  const sheet = workbook.addWorksheet(name, { views: [{ state: 'frozen', ySplit: 1 }] });
  sheet.columns = table.headers.map((header) => ({ width: Math.max(12, header.length + 2) }));
  const titles = sheet.addRow([...table.headers]);
  titles.font = { bold: true };
  titles.commit();
  let written = 0;
  for (const row of table.rows) {
    sheet.addRow([...row]).commit();
    written++;
    if (written % rowsInPart === 0) await turn(target);
  }
  sheet.commit();
  const about = workbook.addWorksheet(notes.name);
  about.columns = [{ width: 26 }, { width: 100 }];
  for (const [label, text] of notes.lines) {
    const line = about.addRow([label, text]);
    line.getCell(1).font = { bold: true };
    if (text instanceof Date) line.getCell(2).numFmt = 'yyyy-mm-dd hh:mm';
    line.commit();
  }
  about.commit();
  await workbook.commit();
}

/** Lets other work go on, and the reader catch up. */
async function turn(target: PassThrough): Promise<void> {
  await setImmediate();
  if (target.destroyed) throw target.errored ?? new Error('the workbook has no reader any more');
  if (target.writableNeedDrain) await once(target, 'drain');
}
