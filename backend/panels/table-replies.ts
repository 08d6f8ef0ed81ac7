import { PassThrough, Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';
import { NotFound } from '../errors/app-error';
import type { ExportFormat } from './panel-export-service';
import { type DecimalSign, tableCsv } from './table-csv';
import { type NotedTable, writeWorkbook } from './table-workbook';

export const fileTypes: Readonly<Record<ExportFormat, string>> = {
  csv: 'text/csv; charset=utf-8',
  xlsx: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
};

/** @throws {NotFound} for any other `:format` of the path than csv and xlsx. */
export function formatOf(req: Request): ExportFormat {
  const { format } = req.params;
  if (format !== 'csv' && format !== 'xlsx')
    throw new NotFound('A table can be had as csv or as xlsx.');
  return format;
}

/** Answers with a table as a file, made while it is read; a reader who goes away is no error. */
export async function sendTable(
  req: Request,
  res: Response,
  noted: NotedTable,
  { format, decimalSign }: { readonly format: ExportFormat; readonly decimalSign: DecimalSign },
): Promise<void> {
  try {
    if (format === 'csv') {
      await pipeline(Readable.from(tableCsv(noted.table, decimalSign)), res);
      return;
    }
    const bytes = new PassThrough();
    await Promise.all([pipeline(bytes, res), writeWorkbook(noted, bytes)]);
  } catch (error) {
    if (!isPrematureClose(error)) throw error;
    req.log.info({ path: req.path }, 'a download was broken off');
  }
}

/** The reader went away before the last byte. */
function isPrematureClose(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === 'ERR_STREAM_PREMATURE_CLOSE';
}
