import express, { type Router } from 'express';
import {
  apiRoutes,
  type EditionsReply,
  FigureKey,
  PublishEdition,
  ReturnEdition,
  SignEdition,
} from '../contract';
import { toLineageReply } from '../fits/lineage-reply';
import type { LineageService } from '../fits/lineage-service';
import { signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { idParameter, register } from '../http/register';
import { toEditionReply, toEditionSummary } from './edition-replies';
import type { EditionService } from './edition-service';

export function editionRoutes(editions: EditionService, lineage: LineageService): Router {
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

  register(router, apiRoutes.readEdition, async (req, res) => {
    const found = await editions.find(signedInMember(req), idParameter(req, 'editionId'));
    res.json(toEditionReply(found));
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
