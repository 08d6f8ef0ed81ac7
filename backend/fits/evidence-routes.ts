import express, { type Router } from 'express';
import { apiRoutes, StartBootstrap } from '../contract';
import { signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { idParameter, register } from '../http/register';
import type { BootstrapService } from './bootstrap-service';
import { toBootstrap, toEvidenceReply, toEvidenceStateReply } from './evidence-reply';
import type { EvidenceService } from './evidence-service';

/** The evidence of a fit and the bootstraps asked for after it. */
export function evidenceRoutes(
  evidence: EvidenceService,
  bootstraps: BootstrapService,
  now: () => Date,
): Router {
  const router = express.Router();

  register(router, apiRoutes.readEvidence, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    res.json(toEvidenceReply(await evidence.find(workspaceId, idParameter(req, 'fitId'))));
  });

  register(router, apiRoutes.readEvidenceState, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    const found = await evidence.state(workspaceId, idParameter(req, 'fitId'));
    res.json(toEvidenceStateReply(found));
  });

  register(router, apiRoutes.startBootstrap, async (req, res) => {
    const fitId = idParameter(req, 'fitId');
    const { seed } = parse(StartBootstrap, req.body);
    const started = await bootstraps.start(signedInMember(req), fitId, seed);
    res
      .status(202)
      .location(apiRoutes.readEvidence.path.replace(':fitId', fitId))
      .json(toBootstrap(started));
  });

  register(router, apiRoutes.cancelBootstrap, async (req, res) => {
    await bootstraps.cancel(signedInMember(req), idParameter(req, 'fitId'), now());
    res.status(204).end();
  });

  return router;
}
