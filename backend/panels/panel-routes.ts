import express, { type Router } from 'express';
import {
  apiRoutes,
  CommitImport,
  ImportMapping,
  type PanelCompaniesReply,
  type PanelVersionsReply,
} from '../contract';
import { signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { idParameter, register } from '../http/register';
import type { ImportService } from './import-service';
import { toImportReply, toPanelVersionReply, toPanelVersionSummary } from './panel-replies';
import type { PanelService } from './panel-service';
import type { SamplePanel } from './sample-panel';
import { uploadedFile, uploadFile } from './upload-file';

/** Imports and panel versions. */
export function panelRoutes(
  imports: ImportService,
  panels: PanelService,
  sample: SamplePanel,
): Router {
  const router = express.Router();

  register(
    router,
    apiRoutes.uploadFile,
    async (req, res) => {
      const { name, bytes } = uploadedFile(req);
      const draft = await imports.upload(signedInMember(req), name, bytes);
      res.status(201).json(toImportReply(draft));
    },
    uploadFile,
  );

  register(router, apiRoutes.useSample, async (req, res) => {
    const member = signedInMember(req);
    const draft = await imports.upload(member, sample.name, sample.bytes);
    const checked = await imports.check(member.workspaceId, draft.id, sample.mapping);
    res.status(201).json(toImportReply(checked));
  });

  register(router, apiRoutes.readImport, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    res.json(toImportReply(await imports.find(workspaceId, idParameter(req, 'importId'))));
  });

  register(router, apiRoutes.checkImport, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    const mapping = parse(ImportMapping, req.body);
    const draft = await imports.check(workspaceId, idParameter(req, 'importId'), mapping);
    res.json(toImportReply(draft));
  });

  register(router, apiRoutes.commitImport, async (req, res) => {
    const member = signedInMember(req);
    const { note } = parse(CommitImport, req.body);
    const id = await imports.commit(member, idParameter(req, 'importId'), note);
    const version = await panels.version(member.workspaceId, id);
    res.status(201).json(toPanelVersionSummary(version));
  });

  register(router, apiRoutes.discardImport, async (req, res) => {
    await imports.discard(signedInMember(req).workspaceId, idParameter(req, 'importId'));
    res.status(204).end();
  });

  register(router, apiRoutes.listPanelVersions, async (req, res) => {
    const versions = await panels.list(signedInMember(req).workspaceId);
    const reply: PanelVersionsReply = { versions: versions.map(toPanelVersionSummary) };
    res.json(reply);
  });

  register(router, apiRoutes.readPanelVersion, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    const found = await panels.rows(workspaceId, idParameter(req, 'panelVersionId'));
    res.json(toPanelVersionReply(found.version, found.rows));
  });

  register(router, apiRoutes.readPanelCompanies, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    const found = await panels.companies(workspaceId, idParameter(req, 'panelVersionId'));
    const reply: PanelCompaniesReply = { companies: [...found] };
    res.json(reply);
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
