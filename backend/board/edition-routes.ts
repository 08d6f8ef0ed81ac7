import express, { type Router } from 'express';
import {
  apiRoutes,
  ComposeEdition,
  type EditionsReply,
  FigureKey,
  PublishEdition,
  ReturnEdition,
  SignEdition,
  WriteComment,
} from '../contract';
import { toLineageReply } from '../fits/lineage-reply';
import type { LineageService } from '../fits/lineage-service';
import { signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { idParameter, register } from '../http/register';
import type { EditionDeskService } from './edition-desk-service';
import {
  toEditionHistoryReply,
  toEditionPreviewReply,
  toEditionReply,
  toEditionSummary,
  toEditionVerification,
} from './edition-replies';
import type { EditionService } from './edition-service';

export function editionRoutes(
  editions: EditionService,
  desk: EditionDeskService,
  lineage: LineageService,
): Router {
  const router = express.Router();

  register(router, apiRoutes.listEditions, async (req, res) => {
    const found = await editions.list(signedInMember(req));
    const reply: EditionsReply = { editions: found.map(toEditionSummary) };
    res.json(reply);
  });

  register(router, apiRoutes.publishEdition, async (req, res) => {
    const member = signedInMember(req);
    const id = await editions.publish(member, parse(PublishEdition, req.body));
    res.status(201).json(toEditionReply(await editions.find(member, id)));
  });

  register(router, apiRoutes.previewEdition, async (req, res) => {
    const request = parse(ComposeEdition, req.body);
    res.json(toEditionPreviewReply(await editions.preview(signedInMember(req), request)));
  });

  register(router, apiRoutes.readEditionHistory, async (req, res) => {
    res.json(toEditionHistoryReply(await desk.history(signedInMember(req))));
  });

  register(router, apiRoutes.readEdition, async (req, res) => {
    const member = signedInMember(req);
    const id = idParameter(req, 'editionId');
    // Express answers HEAD here, too: nobody sees anything with it.
    if (req.method === 'GET') await desk.noteView(member, id);
    res.json(toEditionReply(await editions.find(member, id)));
  });

  register(router, apiRoutes.verifyEdition, async (req, res) => {
    const found = await desk.verify(signedInMember(req), idParameter(req, 'editionId'));
    res.json(toEditionVerification(found));
  });

  register(router, apiRoutes.openWarning, async (req, res) => {
    const { warningId } = req.params;
    const id = idParameter(req, 'editionId');
    await desk.openWarning(signedInMember(req), id, String(warningId));
    res.status(204).end();
  });

  register(router, apiRoutes.commentEdition, async (req, res) => {
    const member = signedInMember(req);
    const id = idParameter(req, 'editionId');
    await desk.comment(member, id, parse(WriteComment, req.body));
    res.status(201).json(toEditionReply(await editions.find(member, id)));
  });

  register(router, apiRoutes.readEditionLineage, async (req, res) => {
    const member = signedInMember(req);
    const { row } = await editions.find(member, idParameter(req, 'editionId'));
    const figure = parse(FigureKey, req.params['figure']);
    res.json(toLineageReply(await lineage.trace(member.workspaceId, row.fitId, figure)));
  });

  register(router, apiRoutes.signEdition, async (req, res) => {
    const member = signedInMember(req);
    const id = idParameter(req, 'editionId');
    await editions.sign(member, id, parse(SignEdition, req.body).password);
    res.json(toEditionReply(await editions.find(member, id)));
  });

  register(router, apiRoutes.returnEdition, async (req, res) => {
    const member = signedInMember(req);
    const id = idParameter(req, 'editionId');
    await editions.sendBack(member, id, parse(ReturnEdition, req.body).comment);
    res.json(toEditionReply(await editions.find(member, id)));
  });

  return router;
}
