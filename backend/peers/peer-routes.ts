import express, { type Router } from 'express';
import { apiRoutes, type PeerGroupsReply, SavePeerGroup } from '../contract';
import { signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { idParameter, register } from '../http/register';
import { toPeerGroupReply, toPeerGroupSummary } from './peer-replies';
import type { PeerService } from './peer-service';

export function peerRoutes(peers: PeerService): Router {
  const router = express.Router();

  register(router, apiRoutes.listPeerGroups, async (req, res) => {
    const versions = await peers.list(signedInMember(req).workspaceId);
    const reply: PeerGroupsReply = { versions: versions.map(toPeerGroupSummary) };
    res.json(reply);
  });

  register(router, apiRoutes.savePeerGroup, async (req, res) => {
    const saved = await peers.save(signedInMember(req), parse(SavePeerGroup, req.body));
    res.status(201).json(toPeerGroupReply(saved));
  });

  register(router, apiRoutes.readPeerGroup, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    res.json(toPeerGroupReply(await peers.find(workspaceId, idParameter(req, 'peerGroupId'))));
  });

  return router;
}
