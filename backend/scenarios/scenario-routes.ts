import express, { type Request, type Router } from 'express';
import {
  apiRoutes,
  ChangeScenario,
  CopyScenario,
  DraftOf,
  SaveDraft,
  SaveScenario,
  type ScenariosReply,
  type ScenarioVersionsReply,
} from '../contract';
import { signedInMember } from '../http/member';
import { parse } from '../http/parse';
import { idParameter, register } from '../http/register';
import {
  toDraftReply,
  toScenarioCopyReply,
  toScenarioReply,
  toScenarioVersionReply,
} from './scenario-replies';
import type { ScenarioService } from './scenario-service';

export function scenarioRoutes(scenarios: ScenarioService): Router {
  const router = express.Router();
  const scenarioId = (req: Request): string => idParameter(req, 'scenarioId');
  const fitId = (req: Request): string => idParameter(req, 'fitId');

  register(router, apiRoutes.listScenarios, async (req, res) => {
    const found = await scenarios.list(signedInMember(req).workspaceId, fitId(req));
    const reply: ScenariosReply = { scenarios: found.map(toScenarioReply) };
    res.json(reply);
  });

  register(router, apiRoutes.readDraft, async (req, res) => {
    const { scenario } = parse(DraftOf, req.query);
    const draft = await scenarios.findDraft(signedInMember(req), fitId(req), scenario ?? null);
    res.json(toDraftReply(draft));
  });

  register(router, apiRoutes.saveDraft, async (req, res) => {
    const { scenarioId: of, ...text } = parse(SaveDraft, req.body);
    res.json(toDraftReply(await scenarios.saveDraft(signedInMember(req), fitId(req), of, text)));
  });

  register(router, apiRoutes.discardDraft, async (req, res) => {
    const { scenario } = parse(DraftOf, req.query);
    await scenarios.discardDraft(signedInMember(req), fitId(req), scenario ?? null);
    res.status(204).end();
  });

  register(router, apiRoutes.saveScenario, async (req, res) => {
    const { fitId: of, keepsDraft, ...text } = parse(SaveScenario, req.body);
    const member = signedInMember(req);
    const saved = await scenarios.save(member, of, text);
    if (!keepsDraft) await scenarios.discardDraft(member, of, null);
    res.status(201).json(toScenarioReply(saved));
  });

  register(router, apiRoutes.readScenario, async (req, res) => {
    const found = await scenarios.find(signedInMember(req).workspaceId, scenarioId(req));
    res.json(toScenarioReply(found));
  });

  register(router, apiRoutes.listScenarioVersions, async (req, res) => {
    const found = await scenarios.versions(signedInMember(req).workspaceId, scenarioId(req));
    const reply: ScenarioVersionsReply = { versions: found.map(toScenarioVersionReply) };
    res.json(reply);
  });

  register(router, apiRoutes.changeScenario, async (req, res) => {
    const { version, ...text } = parse(ChangeScenario, req.body);
    const changed = await scenarios.change(signedInMember(req), scenarioId(req), version, text);
    res.json(toScenarioReply(changed));
  });

  register(router, apiRoutes.deleteScenario, async (req, res) => {
    await scenarios.remove(signedInMember(req), scenarioId(req));
    res.status(204).end();
  });

  register(router, apiRoutes.restoreScenario, async (req, res) => {
    res.json(toScenarioReply(await scenarios.restore(signedInMember(req), scenarioId(req))));
  });

  register(router, apiRoutes.copyScenario, async (req, res) => {
    const { fitId: onto } = parse(CopyScenario, req.body ?? {});
    const member = signedInMember(req);
    const id = scenarioId(req);
    const copy =
      onto === undefined
        ? await scenarios.copy(member, id)
        : await scenarios.copyOnto(member, id, onto);
    res.status(201).json(toScenarioCopyReply(copy));
  });

  return router;
}
