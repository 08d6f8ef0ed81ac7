import express, { type Router } from 'express';
import { apiRoutes, type DeskReply } from '../contract';
import { toFitSummary } from '../fits/fit-replies';
import { signedInMember } from '../http/member';
import { register } from '../http/register';
import { toPanelVersionSummary } from '../panels/panel-replies';
import { toPeerGroupSummary } from '../peers/peer-replies';
import type { DeskService } from './desk-service';

export function deskRoutes(desk: DeskService): Router {
  const router = express.Router();

  register(router, apiRoutes.readDesk, async (req, res) => {
    const found = await desk.read(signedInMember(req).workspaceId);
    const reply: DeskReply = {
      panelVersion: found.panelVersion ? toPanelVersionSummary(found.panelVersion) : null,
      peerGroup: found.peerGroup ? toPeerGroupSummary(found.peerGroup) : null,
      fit: found.fit ? toFitSummary(found.fit) : null,
      editionsWaiting: found.editionsWaiting,
    };
    res.json(reply);
  });

  return router;
}
