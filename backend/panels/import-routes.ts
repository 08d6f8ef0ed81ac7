import express, { type Router } from 'express';
import { apiRoutes, CommitImport, ImportMapping, TableReading } from '../contract';
import { signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { idParameter, register } from '../http/register';
import type { ImportCommitService } from './import-commit-service';
import { toImportReply, toOpenImportsReply } from './import-replies';
import type { ImportService } from './import-service';
import type { SamplePanel } from './sample-panel';
import { uploadedFile, uploadFile } from './upload-file';

/** Files on their way to a panel version. */
export function importRoutes(
  imports: ImportService,
  commits: ImportCommitService,
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
    const mapping = parse(ImportMapping, sample.mapping);
    const checked = await imports.check(member.workspaceId, draft.id, mapping);
    res.status(201).json(toImportReply(checked));
  });

  register(router, apiRoutes.listImports, async (req, res) => {
    const open = await imports.listOpen(signedInMember(req).workspaceId);
    res.json(toOpenImportsReply(open));
  });

  register(router, apiRoutes.readImport, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    res.json(toImportReply(await imports.find(workspaceId, idParameter(req, 'importId'))));
  });

  register(router, apiRoutes.readImportAs, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    const reading = parse(TableReading, req.body);
    const draft = await imports.readAs(workspaceId, idParameter(req, 'importId'), reading);
    res.json(toImportReply(draft));
  });

  register(router, apiRoutes.checkImport, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    const mapping = parse(ImportMapping, req.body);
    const draft = await imports.check(workspaceId, idParameter(req, 'importId'), mapping);
    res.json(toImportReply(draft));
  });

  register(router, apiRoutes.commitImport, async (req, res) => {
    const { note } = parse(CommitImport, req.body);
    const id = idParameter(req, 'importId');
    const draft = await commits.start(signedInMember(req), id, note);
    res.status(202).location(`/api/imports/${id}`).json(toImportReply(draft));
  });

  register(router, apiRoutes.cancelCommit, async (req, res) => {
    await commits.cancel(signedInMember(req), idParameter(req, 'importId'));
    res.status(204).end();
  });

  register(router, apiRoutes.discardImport, async (req, res) => {
    await imports.discard(signedInMember(req), idParameter(req, 'importId'));
    res.status(204).end();
  });

  return router;
}
