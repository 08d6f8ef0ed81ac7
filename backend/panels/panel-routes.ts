import { setImmediate } from 'node:timers/promises';
import express, { type Router } from 'express';
import { apiRoutes, type PanelVersionsReply } from '../contract';
import { signedInMember } from '../http/member';
import { idParameter, register } from '../http/register';
import { toPanelCompaniesReply, toPanelVersionReply, toPanelVersionSummary } from './panel-replies';
import type { PanelService } from './panel-service';

/** Panel versions and the files that they were read from. */
export function panelRoutes(panels: PanelService): Router {
  const router = express.Router();

  register(router, apiRoutes.listPanelVersions, async (req, res) => {
    const versions = await panels.list(signedInMember(req).workspaceId);
    const reply: PanelVersionsReply = { versions: versions.map(toPanelVersionSummary) };
    res.json(reply);
  });

  register(router, apiRoutes.readPanelVersion, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    const found = await panels.rows(workspaceId, idParameter(req, 'panelVersionId'));
    const reply = toPanelVersionReply(found.version, found.rows);
    // Of 200,000 rows, each of both takes a good part of 100 ms: others are answered in between.
    await setImmediate();
    res.json(reply);
  });

  register(router, apiRoutes.readPanelCompanies, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    const found = await panels.companies(workspaceId, idParameter(req, 'panelVersionId'));
    res.json(toPanelCompaniesReply(found));
  });

  register(router, apiRoutes.downloadFile, async (req, res) => {
    const file = await panels.download(signedInMember(req), idParameter(req, 'fileId'));
    res
      .attachment(file.name)
      .setHeader('Content-Security-Policy', "default-src 'none'; sandbox")
      .type('application/octet-stream')
      .send(file.content);
  });

  return router;
}
