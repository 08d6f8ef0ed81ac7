import express, { type Router } from 'express';
import { apiRoutes, StartPeerTrial } from '../../contract';
import { signedInMember } from '../../http/member';
import { parse } from '../../http/parse';
import { idParameter, register } from '../../http/register';
import { toPeerTrialReply } from './trial-replies';
import type { TrialService } from './trial-service';

/** Trials of peer groups that are not saved. */
export function trialRoutes(trials: TrialService, now: () => Date): Router {
  const router = express.Router();

  register(router, apiRoutes.startPeerTrial, async (req, res) => {
    const started = await trials.start(signedInMember(req), parse(StartPeerTrial, req.body));
    res
      .status(202)
      .location(apiRoutes.readPeerTrial.path.replace(':peerTrialId', started.id))
      .json(toPeerTrialReply(started));
  });

  register(router, apiRoutes.readPeerTrial, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    const found = await trials.find(workspaceId, idParameter(req, 'peerTrialId'));
    res.json(toPeerTrialReply(found));
  });

  register(router, apiRoutes.cancelPeerTrial, async (req, res) => {
    await trials.cancel(signedInMember(req), idParameter(req, 'peerTrialId'), now());
    res.status(204).end();
  });

  return router;
}
