import type { DraftReply, ScenarioReply } from '../contract';
import type { EvaluatedYear, PlannedYear } from './evaluate-plan';
import type { Draft, Scenario } from './scenario-service';

export function toScenarioReply(scenario: Scenario): ScenarioReply {
  return {
    id: scenario.id,
    fitId: scenario.fitId,
    name: scenario.name,
    note: scenario.note,
    version: scenario.version,
    plan: toPlan(scenario.plan),
    years: toYears(scenario.years),
    createdBy: scenario.createdByName,
    updatedBy: scenario.updatedByName,
    updatedAt: scenario.updatedAt.toISOString(),
  };
}

export function toDraftReply(draft: Draft | undefined): DraftReply {
  if (draft === undefined) return { draft: null };
  const { scenarioId, name, note } = draft;
  return {
    draft: {
      scenarioId,
      name,
      note,
      plan: toPlan(draft.plan),
      updatedAt: draft.updatedAt.toISOString(),
    },
  };
}

export function toPlan(plan: readonly PlannedYear[]): ScenarioReply['plan'] {
  return plan.map(({ year, values }) => ({ year, values: [...values] }));
}

export function toYears(years: readonly EvaluatedYear[]): ScenarioReply['years'] {
  return years.map((year) => ({ ...year }));
}
