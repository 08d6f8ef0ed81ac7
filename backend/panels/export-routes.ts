import { PassThrough, Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import express, { type Request, type Response, type Router } from 'express';
import { apiRoutes, PanelExportOptions } from '../contract';
import { NotFound } from '../errors/app-error';
import { signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { idParameter, register } from '../http/register';
import { exportFileName, toNotedTable } from './export-replies';
import type { ExportFormat, PanelExportService } from './panel-export-service';
import { panelTemplate } from './panel-template';
import { type DecimalSign, tableCsv } from './table-csv';
import { type NotedTable, writeWorkbook } from './table-workbook';

const types: Readonly<Record<ExportFormat, string>> = {
  csv: 'text/csv; charset=utf-8',
  xlsx: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
};

/** Panel versions as files, and an empty panel to fill in. */
export function exportRoutes(exports: PanelExportService): Router {
  const router = express.Router();

  register(router, apiRoutes.exportPanelVersion, async (req, res) => {
    const member = signedInMember(req);
    const id = idParameter(req, 'panelVersionId');
    const format = formatOf(req);
    const { decimalSign } = parse(PanelExportOptions, req.query);
    // Express answers HEAD here, too: nobody takes anything with it.
    if (req.method !== 'GET') {
      const version = await exports.version(member.workspaceId, id);
      res.attachment(exportFileName(version, format)).type(types[format]).end();
      return;
    }
    const panel = await exports.export(member, id, format);
    res.attachment(exportFileName(panel.version, format)).type(types[format]);
    await send(req, res, toNotedTable(panel), { format, decimalSign });
  });

  register(router, apiRoutes.downloadTemplate, async (req, res) => {
    const format = formatOf(req);
    res.attachment(`panel-template.${format}`).type(types[format]);
    await send(req, res, panelTemplate, { format, decimalSign: '.' });
  });

  return router;
}

function formatOf(req: Request): ExportFormat {
  const { format } = req.params;
  if (format !== 'csv' && format !== 'xlsx')
    throw new NotFound('A panel can be had as csv or as xlsx.');
  return format;
}

async function send(
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
