import * as z from 'zod';
import { IntervalEstimate } from './fits';

export const PlanYear = z.strictObject({
  year: z.number().int().min(1800).max(2400),
  /** One value a regressor of the fit, in its order, in the panel's unit. */
  values: z.array(z.number()).min(1).max(12),
});
export type PlanYear = z.infer<typeof PlanYear>;

/** Planned regressors of the own company, for 1 to 5 years in a row after the last observed one. */
export const Plan = z.array(PlanYear).min(1).max(5);
export type Plan = z.infer<typeof Plan>;

const name = z.string().trim().min(1, 'expected a name').max(120);
const note = z.string().trim().max(2000);

export const SaveScenario = z.strictObject({
  fitId: z.uuid(),
  name,
  note,
  plan: Plan,
  /** Whether the person's draft of a new plan stays: this one was not made from it. */
  keepsDraft: z.boolean().default(false),
});
export type SaveScenario = z.infer<typeof SaveScenario>;

export const ChangeScenario = z.strictObject({
  name,
  note,
  plan: Plan,
  /** The version the change started from; another one stored meanwhile is a conflict. */
  version: z.number().int(),
});
export type ChangeScenario = z.infer<typeof ChangeScenario>;

export const ScenarioYear = z.object({
  year: z.number().int(),
  expected: IntervalEstimate,
  /** Against the base: the last actual values held. */
  difference: IntervalEstimate,
  familiar: z.enum(['inside', 'edge', 'outside']),
});
export type ScenarioYear = z.infer<typeof ScenarioYear>;

export const ScenarioReply = z.object({
  id: z.uuid(),
  fitId: z.uuid(),
  name: z.string(),
  note: z.string(),
  version: z.number().int(),
  plan: Plan,
  years: z.array(ScenarioYear),
  createdBy: z.string(),
  updatedBy: z.string(),
  updatedAt: z.iso.datetime(),
});
export type ScenarioReply = z.infer<typeof ScenarioReply>;

export const ScenariosReply = z.object({ scenarios: z.array(ScenarioReply) });
export type ScenariosReply = z.infer<typeof ScenariosReply>;

/** An unsaved plan of one person on one fit; `scenarioId` null for a new one. */
export const SaveDraft = z.strictObject({
  scenarioId: z.uuid().nullable(),
  name: z.string().max(120),
  note: z.string().max(2000),
  plan: Plan,
});
export type SaveDraft = z.infer<typeof SaveDraft>;

export const DraftReply = z.object({
  draft: SaveDraft.extend({ updatedAt: z.iso.datetime() }).nullable(),
});
export type DraftReply = z.infer<typeof DraftReply>;

/** Query of a draft: of a saved scenario, or of a new one where it is absent. */
export const DraftOf = z.strictObject({ scenario: z.uuid().optional() });
export type DraftOf = z.infer<typeof DraftOf>;
