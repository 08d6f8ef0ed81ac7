import express, { type Router } from 'express';
import {
  apiRoutes,
  CellPlace,
  DismissFlag,
  type FlagDismissalsReply,
  RestoreVersion,
  SaveCorrections,
} from '../contract';
import { signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { idParameter, register } from '../http/register';
import { toCellHistoryReply, toFlagDismissal, toPanelDifferencesReply } from './correction-replies';
import type { CorrectionService } from './correction-service';
import type { FlagDismissalService } from './flag-dismissal-service';
import type { PanelHistoryService } from './panel-history-service';
import { toPanelVersionSummary } from './panel-replies';

export interface CorrectionServices {
  readonly corrections: CorrectionService;
  readonly history: PanelHistoryService;
  readonly dismissals: FlagDismissalService;
}

/** Mending a panel, what its versions changed, and flags found to be right. */
export function correctionRoutes({ corrections, history, dismissals }: CorrectionServices): Router {
  const router = express.Router();

  register(router, apiRoutes.saveCorrections, async (req, res) => {
    const id = idParameter(req, 'panelVersionId');
    const saved = await corrections.save(signedInMember(req), id, parse(SaveCorrections, req.body));
    res.status(201).location(`/api/panel-versions/${saved.id}`).json(toPanelVersionSummary(saved));
  });

  register(router, apiRoutes.restorePanelVersion, async (req, res) => {
    const { note } = parse(RestoreVersion, req.body);
    const id = idParameter(req, 'panelVersionId');
    const saved = await corrections.restore(signedInMember(req), id, note);
    res.status(201).location(`/api/panel-versions/${saved.id}`).json(toPanelVersionSummary(saved));
  });

  register(router, apiRoutes.readPanelDifferences, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    const [id, otherId] = [idParameter(req, 'panelVersionId'), idParameter(req, 'otherId')];
    res.json(toPanelDifferencesReply(await history.differences(workspaceId, id, otherId)));
  });

  register(router, apiRoutes.readCellHistory, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    const id = idParameter(req, 'panelVersionId');
    const entries = await history.ofCell(workspaceId, id, parse(CellPlace, req.query));
    res.json(toCellHistoryReply(entries));
  });

  register(router, apiRoutes.listFlagDismissals, async (req, res) => {
    const { workspaceId } = signedInMember(req);
    const found = await dismissals.list(workspaceId, idParameter(req, 'panelId'));
    const reply: FlagDismissalsReply = { dismissals: found.map(toFlagDismissal) };
    res.json(reply);
  });

  register(router, apiRoutes.dismissFlag, async (req, res) => {
    const flag = parse(DismissFlag, req.body);
    const panelId = idParameter(req, 'panelId');
    const made = await dismissals.dismiss(signedInMember(req), panelId, flag);
    res.status(201).json(toFlagDismissal(made));
  });

  register(router, apiRoutes.takeBackDismissal, async (req, res) => {
    const [panelId, id] = [idParameter(req, 'panelId'), idParameter(req, 'dismissalId')];
    await dismissals.takeBack(signedInMember(req), panelId, id);
    res.status(204).end();
  });

  return router;
}
