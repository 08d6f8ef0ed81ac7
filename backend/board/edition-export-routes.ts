import express, { type Request, type Router } from 'express';
import { apiRoutes, EditionExport } from '../contract';
import { NotFound } from '../errors/app-error';
import { signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { idParameter, register } from '../http/register';
import type { EditionDeskService } from './edition-desk-service';
import { toEditionReply } from './edition-replies';
import type { EditionService } from './edition-service';
import { editionPdf } from './pdf/edition-pdf';
import { editionWorkbook } from './workbook/edition-workbook';

type ExportFormat = 'pdf' | 'xlsx';

/** Editions taken out; each is noted on the edition. */
export function editionExportRoutes(
  editions: EditionService,
  desk: EditionDeskService,
  now: () => Date,
): Router {
  const router = express.Router();

  register(router, apiRoutes.exportEdition, async (req, res) => {
    const member = signedInMember(req);
    const id = idParameter(req, 'editionId');
    const format = formatOf(req);
    const { paper, unit } = parse(EditionExport, req.query);
    const reply = toEditionReply(await editions.find(member, id));
    const { edition, content, comments } = reply;
    res.attachment(`edition-${edition.number}.${format}`).type(types[format]);
    // Express answers HEAD here, too: nobody takes anything with it.
    if (req.method !== 'GET') {
      res.end();
      return;
    }
    const printedBy = await desk.noteExport(member, id, format);
    const shownUnit = unit ?? content.unit;
    if (format === 'pdf') {
      const setting = { paper, unit: shownUnit, printedBy, printedAt: now() };
      res.send(await editionPdf({ edition, content, comments }, setting));
      return;
    }
    const rows = await desk.rows(member, id);
    const setting = { unit: shownUnit, createdAt: now() };
    res.send(await editionWorkbook({ edition, content, rows }, setting));
  });

  return router;
}

const types: Readonly<Record<ExportFormat, string>> = {
  pdf: 'application/pdf',
  xlsx: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
};

function formatOf(req: Request): ExportFormat {
  const { format } = req.params;
  if (format !== 'pdf' && format !== 'xlsx')
    throw new NotFound('An edition can be had as pdf or as xlsx.');
  return format;
}
