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

/** How a plan is looked at: where it starts, what year effect its years have, and how sure its ranges are to be. */
export const PlanOutlook = z.strictObject({
  start: z.enum(['model-level', 'carry-the-gap']),
  /** A given one is in the model's scale and taken as known; of no account in a fit without year effects. */
  yearEffect: z.union([
    z.enum(['last', 'mean-of-last-three']),
    z.strictObject({ given: z.number() }),
  ]),
  /** Of the intervals of what the model estimates. */
  confidence: z.number().gt(0.5).lt(1),
  /** Of the band of the market value itself. */
  bandConfidence: z.number().gt(0.5).lt(1),
});
export type PlanOutlook = z.infer<typeof PlanOutlook>;

/** What fills one regressor over the years of a plan; see `applyRules` of the engine. */
export const PlanRule = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('hold') }),
  z.strictObject({ kind: z.literal('grow'), percent: z.number() }),
  z.strictObject({
    kind: z.literal('total'),
    total: z.number(),
    spread: z.enum(['even', 'rising', 'falling']),
  }),
  /** A share of another regressor's planned amount of the same year; `of` is its place. */
  z.strictObject({ kind: z.literal('share'), percent: z.number(), of: z.number().int().min(0) }),
]);
export type PlanRule = z.infer<typeof PlanRule>;

/** A lasting change of level from one planned year on: an equity raise above zero, a buyback below. */
export const PlanMove = z.strictObject({
  year: z.number().int().min(1800).max(2400),
  amount: z.number(),
});
export type PlanMove = z.infer<typeof PlanMove>;

/** How one regressor came to its planned amounts. */
export const RegressorPlan = z.strictObject({
  /** Null where the amounts were typed, pasted or moved by hand. */
  rule: PlanRule.nullable(),
  moves: z.array(PlanMove).max(5),
});
export type RegressorPlan = z.infer<typeof RegressorPlan>;

/** How far planned amounts may miss: the planned amount is the likely one. */
export const PlanUncertainty = z.strictObject({
  /** Of the draws. */
  seed: z.int().min(0),
  /** By year, then by regressor, in the order of the plan; null for an amount taken as certain. */
  ranges: z
    .array(z.array(z.strictObject({ low: z.number(), high: z.number() }).nullable()).max(12))
    .max(5),
});
export type PlanUncertainty = z.infer<typeof PlanUncertainty>;

const name = z.string().trim().min(1, 'expected a name').max(120);
const note = z.string().trim().max(2000);
/** All that a plan is read by, beside its name. */
const reading = {
  plan: Plan,
  outlook: PlanOutlook,
  /** One a regressor of the fit, in its order. */
  rules: z.array(RegressorPlan).min(1).max(12),
  uncertainty: PlanUncertainty.nullable(),
};

/** The same as a request may leave it out. */
const asked = {
  plan: Plan,
  /** Null for the usual one: model level, the last year effect, the fit's own confidence and 80 % for the band. */
  outlook: PlanOutlook.nullable().default(null),
  /** None where every amount was typed. */
  rules: z.array(RegressorPlan).max(12).default([]),
  uncertainty: PlanUncertainty.nullable().default(null),
};

export const SaveScenario = z.strictObject({
  fitId: z.uuid(),
  name,
  note,
  ...asked,
  /** Whether the person's draft of a new plan stays: this one was not made from it. */
  keepsDraft: z.boolean().default(false),
});
export type SaveScenario = z.infer<typeof SaveScenario>;

export const ChangeScenario = z.strictObject({
  name,
  note,
  ...asked,
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
  /** Of the market value itself, at the outlook's band level; missing in scenarios stored before bands were. */
  band: z
    .object({
      low: z.number().nullable(),
      high: z.number().nullable(),
      bandReason: z.string().optional(),
    })
    .optional(),
});
export type ScenarioYear = z.infer<typeof ScenarioYear>;

export const ScenarioReply = z.object({
  id: z.uuid(),
  fitId: z.uuid(),
  name: z.string(),
  note: z.string(),
  version: z.number().int(),
  ...reading,
  years: z.array(ScenarioYear),
  /** The scenario, perhaps of an older fit, that this one was copied from. */
  copiedFrom: z
    .object({
      id: z.uuid(),
      name: z.string(),
      version: z.number().int(),
      fitId: z.uuid(),
    })
    .nullable(),
  createdBy: z.string(),
  updatedBy: z.string(),
  updatedAt: z.iso.datetime(),
});
export type ScenarioReply = z.infer<typeof ScenarioReply>;

/** One stored version of a scenario, as it was. */
export const ScenarioVersion = z.object({
  version: z.number().int(),
  name: z.string(),
  note: z.string(),
  ...reading,
  years: z.array(ScenarioYear),
  createdBy: z.string(),
  createdAt: z.iso.datetime(),
});
export type ScenarioVersion = z.infer<typeof ScenarioVersion>;

/** Newest first. */
export const ScenarioVersionsReply = z.object({ versions: z.array(ScenarioVersion) });
export type ScenarioVersionsReply = z.infer<typeof ScenarioVersionsReply>;

/** A copy onto the same fit, or onto another one of the workspace. */
export const CopyScenario = z.strictObject({ fitId: z.uuid().optional() });
export type CopyScenario = z.infer<typeof CopyScenario>;

/** What a copy onto another fit could not take over as it was, and what the new fit says of it. */
export const ScenarioCopyReply = z.object({
  scenario: ScenarioReply,
  changes: z.object({
    /** Planned years that the new fit's panel holds as observed. */
    droppedYears: z.array(z.number().int()),
    /** Planned years between, which the plan did not have: held at the values before. */
    addedYears: z.array(z.number().int()),
    /** Regressors of the new fit that the plan had none of: held at the last observed value. */
    heldRegressors: z.array(z.string()),
    /** Regressors of the plan that the new fit does not have. */
    droppedRegressors: z.array(z.string()),
    /** Regressors whose rule gives other amounts on the new fit: the amounts stay, the rule does not. */
    droppedRules: z.array(z.string()),
    /** In words, where the outlook had to change. */
    outlook: z.array(z.string()),
    /** The expected value of years that both have. */
    years: z.array(
      z.object({
        year: z.number().int(),
        before: IntervalEstimate,
        after: IntervalEstimate,
      }),
    ),
  }),
});
export type ScenarioCopyReply = z.infer<typeof ScenarioCopyReply>;

export const ScenariosReply = z.object({ scenarios: z.array(ScenarioReply) });
export type ScenariosReply = z.infer<typeof ScenariosReply>;

/** An unsaved plan of one person on one fit; `scenarioId` null for a new one. */
export const SaveDraft = z.strictObject({
  scenarioId: z.uuid().nullable(),
  name: z.string().max(120),
  note: z.string().max(2000),
  ...asked,
});
export type SaveDraft = z.infer<typeof SaveDraft>;

export const DraftReply = z.object({
  draft: SaveDraft.extend({ ...reading, updatedAt: z.iso.datetime() }).nullable(),
});
export type DraftReply = z.infer<typeof DraftReply>;

/** Query of a draft: of a saved scenario, or of a new one where it is absent. */
export const DraftOf = z.strictObject({ scenario: z.uuid().optional() });
export type DraftOf = z.infer<typeof DraftOf>;
