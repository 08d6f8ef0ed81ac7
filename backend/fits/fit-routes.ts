import express, { type Router } from 'express';
import { apiRoutes, FigureKey, type FitsReply, StartFit } from '../contract';
import { signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { idParameter, register } from '../http/register';
import { toFitReply, toFitSummary } from './fit-replies';
import type { FitService } from './fit-service';
import { toLineageReply } from './lineage-reply';
import type { LineageService } from './lineage-service';

export function fitRoutes(fits: FitService, lineage: LineageService, now: () => Date): Router {
  const router = express.Router();

  register(router, apiRoutes.listFits, async (req, res) => {
    const found = await fits.list(signedInMember(req).workspaceId);
    const reply: FitsReply = { fits: found.map(toFitSummary) };
    res.json(reply);
  });

  register(router, apiRoutes.startFit, async (req, res) => {
    const started = await fits.start(signedInMember(req), parse(StartFit, req.body));
    res
      .status(202)
      .location(apiRoutes.readFit.path.replace(':fitId', started.fit.id))
      .json(toFitReply(started));
  });

  register(router, apiRoutes.readFit, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    res.json(toFitReply(await fits.find(workspaceId, idParameter(req, 'fitId'))));
  });

  register(router, apiRoutes.cancelFit, async (req, res) => {
    await fits.cancel(signedInMember(req), idParameter(req, 'fitId'), now());
    res.status(204).end();
  });

  register(router, apiRoutes.readLineage, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    const figure = parse(FigureKey, req.params['figure']);
    res.json(toLineageReply(await lineage.trace(workspaceId, idParameter(req, 'fitId'), figure)));
  });

  return router;
}
