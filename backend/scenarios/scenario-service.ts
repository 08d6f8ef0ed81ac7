import { randomUUID } from 'node:crypto';
import type {
  DraftRow,
  NewScenarioVersion,
  ScenarioRow,
  ScenarioVersionRow,
} from '../../db/repositories/scenarios-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { Conflict, Invalid, NotFound } from '../errors/app-error';
import { findFinishedFit } from '../fits/fit-service';
import type { IntervalEstimate, PredictionBasis } from '../stats/prediction';
import { assertPlan } from './assert-plan';
import { copyOntoFit, type CopyChanges } from './copy-onto-fit';
import { evaluatePlan, type EvaluatedYear } from './evaluate-plan';
import { type AskedReading, type PlanReading, wholeReading } from './plan-reading';

export interface Actor {
  readonly personId: string;
  readonly workspaceId: string;
}

export interface ScenarioText extends AskedReading {
  readonly name: string;
  readonly note: string;
}

type Columns = 'plan' | 'years' | 'outlook' | 'rules' | 'uncertainty';

/** A scenario's row with its JSON columns under their types, what earlier ones lack filled. */
export interface Scenario extends Omit<ScenarioRow, Columns>, PlanReading {
  readonly years: readonly EvaluatedYear[];
}

export interface ScenarioVersion extends Omit<ScenarioVersionRow, Columns>, PlanReading {
  readonly years: readonly EvaluatedYear[];
}

export interface Draft extends Omit<DraftRow, Columns>, PlanReading {}

/** A copy onto another fit, with what it could not take over and the figures on both. */
export interface ScenarioCopy {
  readonly scenario: Scenario;
  readonly changes: CopyChanges;
  /** Years that both have. */
  readonly years: readonly {
    readonly year: number;
    readonly before: IntervalEstimate;
    readonly after: IntervalEstimate;
  }[];
}

export class ScenarioService {
  constructor(
    private readonly repositories: Repositories,
    private readonly now: () => Date,
  ) {}

  /** @throws {NotFound} */
  async list(workspaceId: string, fitId: string): Promise<readonly Scenario[]> {
    return this.repositories.inWorkspace(workspaceId, async (tx) => {
      const basis = await findBasis(tx, fitId);
      return (await tx.scenarios.listByFit(fitId)).map((row) => toScenario(row, basis));
    });
  }

  /** Every stored version, newest first. @throws {NotFound} */
  async versions(workspaceId: string, id: string): Promise<readonly ScenarioVersion[]> {
    return this.repositories.inWorkspace(workspaceId, async (tx) => {
      const { fitId } = await findScenario(tx, id);
      const basis = await findBasis(tx, fitId);
      return (await tx.scenarios.listVersions(id)).map((row) => ({
        ...row,
        ...storedReading(row, basis),
        years: row.years as readonly EvaluatedYear[],
      }));
    });
  }

  /** @throws {NotFound} */
  async find(workspaceId: string, id: string): Promise<Scenario> {
    return this.repositories.inWorkspace(workspaceId, (tx) => findScenario(tx, id));
  }

  /**
   * Saves a new scenario with the figures that this server computes for its plan.
   *
   * @throws {Invalid} as `assertPlan`.
   */
  async save(actor: Actor, fitId: string, text: ScenarioText): Promise<Scenario> {
    return this.repositories.inWorkspace(actor.workspaceId, (tx) =>
      insertScenario(tx, actor, fitId, text),
    );
  }

  /** Adds a version. @throws {Conflict} `stale-version` with the stored one when another came first. */
  async change(
    actor: Actor,
    id: string,
    parentVersion: number,
    text: ScenarioText,
  ): Promise<Scenario> {
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const current = await findScenario(tx, id);
      const next = await versionOn(tx, current.fitId, text, actor);
      if (!(await tx.scenarios.addVersion(id, parentVersion, next)))
        throw new Conflict(
          `${current.updatedByName} saved version ${current.version} of this scenario meanwhile. Save yours as a copy, or open theirs.`,
          'stale-version',
          { currentVersion: current.version },
        );
      await tx.scenarios.removeDraft({
        fitId: current.fitId,
        personId: actor.personId,
        scenarioId: id,
      });
      await record(tx, actor.personId, 'scenario-saved', id, { version: parentVersion + 1 });
      return findScenario(tx, id);
    });
  }

  /** Takes a scenario away; `restore` brings it back. @throws {NotFound} */
  async remove(actor: Actor, id: string): Promise<void> {
    await this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      await findScenario(tx, id);
      await tx.scenarios.setDeleted(id, this.now());
      await record(tx, actor.personId, 'scenario-deleted', id);
    });
  }

  /** @throws {NotFound} */
  async restore(actor: Actor, id: string): Promise<Scenario> {
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      if (!(await tx.scenarios.setDeleted(id, null)))
        throw new NotFound('There is no such scenario.');
      await record(tx, actor.personId, 'scenario-restored', id);
      return findScenario(tx, id);
    });
  }

  /** A copy on the same fit. @throws {NotFound} */
  async copy(actor: Actor, id: string): Promise<ScenarioCopy> {
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const source = await findScenario(tx, id);
      const text = { ...source, name: copyName(source.name) };
      const scenario = await insertScenario(tx, actor, source.fitId, text, source);
      return { scenario, changes: nothingChanged, years: [] };
    });
  }

  /** A copy on another fit. @throws {NotFound}; {Invalid} as `copyOntoFit` and `assertPlan`. */
  async copyOnto(actor: Actor, id: string, fitId: string): Promise<ScenarioCopy> {
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const source = await findScenario(tx, id);
      const from = await findBasis(tx, source.fitId);
      const onto = await findBasis(tx, fitId);
      if (from === null || onto === null) throw new Invalid(await unreadable(tx, fitId));
      const { reading, changes } = copyOntoFit(source, from, onto);
      const text = { ...reading, name: source.name, note: source.note };
      const scenario = await insertScenario(tx, actor, fitId, text, source);
      const years = scenario.years.flatMap(({ year, expected }) => {
        const before = source.years.find((each) => each.year === year);
        return before === undefined ? [] : [{ year, before: before.expected, after: expected }];
      });
      return { scenario, changes, years };
    });
  }

  /** The person's own unsaved plan, undefined when there is none. */
  async findDraft(
    actor: Actor,
    fitId: string,
    scenarioId: string | null,
  ): Promise<Draft | undefined> {
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const found = await tx.scenarios.findDraft({ fitId, personId: actor.personId, scenarioId });
      return found && { ...found, ...storedReading(found, await findBasis(tx, fitId)) };
    });
  }

  /** @throws {NotFound} for an unknown fit or scenario; {Invalid} as `save`. */
  async saveDraft(
    actor: Actor,
    fitId: string,
    scenarioId: string | null,
    text: ScenarioText,
  ): Promise<Draft> {
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const { reading } = await evaluateOn(tx, fitId, text);
      if (scenarioId !== null && (await findScenario(tx, scenarioId)).fitId !== fitId)
        throw new NotFound('There is no such scenario of this fit.');
      const key = { fitId, personId: actor.personId, scenarioId };
      const { name, note } = text;
      const updatedAt = this.now();
      await tx.scenarios.saveDraft(key, { name, note, ...reading }, updatedAt);
      return { name, note, ...reading, scenarioId, updatedAt };
    });
  }

  async discardDraft(actor: Actor, fitId: string, scenarioId: string | null): Promise<void> {
    await this.repositories.inWorkspace(actor.workspaceId, (tx) =>
      tx.scenarios.removeDraft({ fitId, personId: actor.personId, scenarioId }),
    );
  }
}

/** @throws {NotFound} for one that does not exist or was deleted. */
export async function findScenario(tx: WorkspaceRepositories, id: string): Promise<Scenario> {
  const found = await tx.scenarios.find(id);
  if (found?.deletedAt !== null) throw new NotFound('There is no such scenario.');
  return toScenario(found, await findBasis(tx, found.fitId));
}

async function insertScenario(
  tx: WorkspaceRepositories,
  actor: Actor,
  fitId: string,
  text: ScenarioText,
  source?: { readonly id: string; readonly version: number },
): Promise<Scenario> {
  const first = await versionOn(tx, fitId, text, actor);
  const id = randomUUID();
  await tx.scenarios.insert(id, fitId, first, source ?? null);
  await record(tx, actor.personId, 'scenario-saved', id, { version: 1 });
  return findScenario(tx, id);
}

/** A version as it is stored, with the figures that this server computes for its plan. */
async function versionOn(
  tx: WorkspaceRepositories,
  fitId: string,
  text: ScenarioText,
  actor: Actor,
): Promise<NewScenarioVersion> {
  const { reading, years } = await evaluateOn(tx, fitId, text);
  const { name, note } = text;
  return { name, note, ...reading, years, createdBy: actor.personId };
}

async function evaluateOn(
  tx: WorkspaceRepositories,
  fitId: string,
  asked: AskedReading,
): Promise<{ readonly reading: PlanReading; readonly years: readonly EvaluatedYear[] }> {
  const basis = await findBasis(tx, fitId);
  if (basis === null) throw new Invalid(await unreadable(tx, fitId));
  const reading = wholeReading(basis, asked);
  assertPlan(reading, basis);
  return { reading, years: evaluatePlan(basis, reading.plan, reading.outlook) };
}

/** What plans on a fit are read by; null where the fit reads none. @throws {NotFound} */
async function findBasis(
  tx: WorkspaceRepositories,
  fitId: string,
): Promise<PredictionBasis | null> {
  return (await findFinishedFit(tx, fitId)).result.prediction;
}

async function unreadable(tx: WorkspaceRepositories, fitId: string): Promise<string> {
  const { result } = await findFinishedFit(tx, fitId);
  return (
    result.predictionReason ?? 'The own company has no rows in this fit, so no plan can be read.'
  );
}

const nothingChanged: CopyChanges = {
  droppedYears: [],
  addedYears: [],
  heldRegressors: [],
  droppedRegressors: [],
  droppedRules: [],
  outlook: [],
};

function copyName(name: string): string {
  return `${name} (copy)`.slice(0, 120);
}

function toScenario(row: ScenarioRow, basis: PredictionBasis | null): Scenario {
  return {
    ...row,
    ...storedReading(row, basis),
    years: row.years as readonly EvaluatedYear[],
  };
}

function storedReading(
  row: Pick<ScenarioRow, 'plan' | 'outlook' | 'rules' | 'uncertainty'>,
  basis: PredictionBasis | null,
): PlanReading {
  // What a fit reads no plan for has no stored plan.
  if (basis === null) throw new Error('a plan is stored on a fit that reads none');
  return wholeReading(basis, row as AskedReading);
}
