import { once } from 'node:events';
import type { PassThrough } from 'node:stream';
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
  for await (const rows of table.parts) {
    for (const row of rows) sheet.addRow([...row]).commit();
    await readerOf(target);
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

/** Waits until the reader has caught up. */
async function readerOf(target: PassThrough): Promise<void> {
  if (target.destroyed) throw target.errored ?? new Error('the workbook has no reader any more');
  if (target.writableNeedDrain) await once(target, 'drain');
}
