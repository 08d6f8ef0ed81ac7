import express, { type Router } from 'express';
import { apiRoutes, PanelExportOptions } from '../contract';
import { signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { idParameter, register } from '../http/register';
import { exportFileName, toNotedTable } from './export-replies';
import type { PanelExportService } from './panel-export-service';
import { panelTemplate } from './panel-template';
import { fileTypes, formatOf, sendTable } from './table-replies';

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
      res.attachment(exportFileName(version, format)).type(fileTypes[format]).end();
      return;
    }
    const panel = await exports.export(member, id, format);
    res.attachment(exportFileName(panel.version, format)).type(fileTypes[format]);
    await sendTable(req, res, toNotedTable(panel), { format, decimalSign });
  });

  register(router, apiRoutes.downloadTemplate, async (req, res) => {
    const format = formatOf(req);
    res.attachment(`panel-template.${format}`).type(fileTypes[format]);
    await sendTable(req, res, panelTemplate, { format, decimalSign: '.' });
  });

  return router;
}
