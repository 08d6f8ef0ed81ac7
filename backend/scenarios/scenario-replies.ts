import type {
  DraftReply,
  ScenarioCopyReply,
  ScenarioReply,
  ScenarioVersion as ScenarioVersionReply,
} from '../contract';
import type { EvaluatedYear, PlannedYear } from './evaluate-plan';
import type { PlanReading } from './plan-reading';
import type { PlanUncertaintyRanges, RegressorRule } from './plan-types';
import type { Draft, Scenario, ScenarioCopy, ScenarioVersion } from './scenario-service';

export function toScenarioReply(scenario: Scenario): ScenarioReply {
  const { copiedFromId, copiedFromVersion, copiedFromName, copiedFromFitId } = scenario;
  return {
    id: scenario.id,
    fitId: scenario.fitId,
    name: scenario.name,
    note: scenario.note,
    version: scenario.version,
    ...toReading(scenario),
    years: toYears(scenario.years),
    copiedFrom:
      copiedFromId === null ||
      copiedFromVersion === null ||
      copiedFromName === null ||
      copiedFromFitId === null
        ? null
        : {
            id: copiedFromId,
            name: copiedFromName,
            version: copiedFromVersion,
            fitId: copiedFromFitId,
          },
    createdBy: scenario.createdByName,
    updatedBy: scenario.updatedByName,
    updatedAt: scenario.updatedAt.toISOString(),
  };
}

export function toScenarioVersionReply(version: ScenarioVersion): ScenarioVersionReply {
  return {
    version: version.version,
    name: version.name,
    note: version.note,
    ...toReading(version),
    years: toYears(version.years),
    createdBy: version.createdByName,
    createdAt: version.createdAt.toISOString(),
  };
}

export function toScenarioCopyReply({ scenario, changes, years }: ScenarioCopy): ScenarioCopyReply {
  return {
    scenario: toScenarioReply(scenario),
    changes: {
      droppedYears: [...changes.droppedYears],
      addedYears: [...changes.addedYears],
      heldRegressors: [...changes.heldRegressors],
      droppedRegressors: [...changes.droppedRegressors],
      droppedRules: [...changes.droppedRules],
      outlook: [...changes.outlook],
      years: years.map((year) => ({ ...year })),
    },
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
      ...toReading(draft),
      updatedAt: draft.updatedAt.toISOString(),
    },
  };
}

/** How a plan is read, as replies and editions show it. */
export function toReading({ plan, outlook, rules, uncertainty }: PlanReading) {
  return {
    plan: toPlan(plan),
    outlook,
    rules: rules.map(toRule),
    uncertainty: uncertainty && toUncertainty(uncertainty),
  };
}

export function toPlan(plan: readonly PlannedYear[]): ScenarioReply['plan'] {
  return plan.map(({ year, values }) => ({ year, values: [...values] }));
}

export function toYears(years: readonly EvaluatedYear[]): ScenarioReply['years'] {
  return years.map((year) => ({ ...year }));
}

function toRule({ rule, moves }: RegressorRule): ScenarioReply['rules'][number] {
  return { rule, moves: moves.map((move) => ({ ...move })) };
}

function toUncertainty({ seed, ranges }: PlanUncertaintyRanges): ScenarioReply['uncertainty'] {
  return { seed, ranges: ranges.map((ofYear) => [...ofYear]) };
}
