import { randomUUID } from 'node:crypto';
import type { DraftRow, ScenarioRow } from '../../db/repositories/scenarios-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { Conflict, Invalid, NotFound } from '../errors/app-error';
import { findFinishedFit } from '../fits/fit-service';
import type { PredictionBasis } from '../stats';
import { evaluatePlan, type EvaluatedYear, type PlannedYear } from './evaluate-plan';

export interface Actor {
  readonly personId: string;
  readonly workspaceId: string;
}

export interface ScenarioText {
  readonly name: string;
  readonly note: string;
  readonly plan: readonly PlannedYear[];
}

/** A scenario's row with its JSON columns under their types. */
export interface Scenario extends Omit<ScenarioRow, 'plan' | 'years'> {
  readonly plan: readonly PlannedYear[];
  readonly years: readonly EvaluatedYear[];
}

export interface Draft extends Omit<DraftRow, 'plan'> {
  readonly plan: readonly PlannedYear[];
}

export class ScenarioService {
  constructor(
    private readonly repositories: Repositories,
    private readonly now: () => Date,
  ) {}

  /** @throws {NotFound} */
  async list(workspaceId: string, fitId: string): Promise<readonly Scenario[]> {
    return this.repositories.inWorkspace(workspaceId, async (tx) => {
      await findFinishedFit(tx, fitId);
      return (await tx.scenarios.listByFit(fitId)).map(toScenario);
    });
  }

  /** @throws {NotFound} */
  async find(workspaceId: string, id: string): Promise<Scenario> {
    return this.repositories.inWorkspace(workspaceId, (tx) => findScenario(tx, id));
  }

  /**
   * Saves a new scenario with the figures that this server computes for its plan.
   *
   * @throws {Invalid} for a plan that does not follow the last observed year, has the wrong number of values, or in log
   *   form one that is not above zero.
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
      const years = await evaluateOn(tx, current.fitId, text.plan);
      const next = { ...text, years, createdBy: actor.personId };
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

  /** @throws {NotFound} */
  async copy(actor: Actor, id: string): Promise<Scenario> {
    return this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      const { fitId, name, note, plan } = await findScenario(tx, id);
      return insertScenario(tx, actor, fitId, { name: `${name} (copy)`.slice(0, 120), note, plan });
    });
  }

  /** The person's own unsaved plan, undefined when there is none. */
  async findDraft(
    actor: Actor,
    fitId: string,
    scenarioId: string | null,
  ): Promise<Draft | undefined> {
    const found = await this.repositories.inWorkspace(actor.workspaceId, (tx) =>
      tx.scenarios.findDraft({ fitId, personId: actor.personId, scenarioId }),
    );
    return found && { ...found, plan: found.plan as readonly PlannedYear[] };
  }

  /** @throws {NotFound} for an unknown fit or scenario; {Invalid} as `save`. */
  async saveDraft(
    actor: Actor,
    fitId: string,
    scenarioId: string | null,
    text: ScenarioText,
  ): Promise<Draft> {
    await this.repositories.inWorkspace(actor.workspaceId, async (tx) => {
      await evaluateOn(tx, fitId, text.plan);
      if (scenarioId !== null && (await findScenario(tx, scenarioId)).fitId !== fitId)
        throw new NotFound('There is no such scenario of this fit.');
      const key = { fitId, personId: actor.personId, scenarioId };
      await tx.scenarios.saveDraft(key, text, this.now());
    });
    return { ...text, scenarioId, updatedAt: this.now() };
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
  return toScenario(found);
}

async function insertScenario(
  tx: WorkspaceRepositories,
  actor: Actor,
  fitId: string,
  text: ScenarioText,
): Promise<Scenario> {
  const years = await evaluateOn(tx, fitId, text.plan);
  const id = randomUUID();
  await tx.scenarios.insert(id, fitId, { ...text, years, createdBy: actor.personId });
  await record(tx, actor.personId, 'scenario-saved', id, { version: 1 });
  return findScenario(tx, id);
}

async function evaluateOn(
  tx: WorkspaceRepositories,
  fitId: string,
  plan: readonly PlannedYear[],
): Promise<readonly EvaluatedYear[]> {
  const { result } = await findFinishedFit(tx, fitId);
  if (result.prediction === null)
    throw new Invalid(
      result.predictionReason ?? 'The own company has no rows in this fit, so no plan can be read.',
    );
  assertPlan(plan, result.prediction);
  return evaluatePlan(result.prediction, plan);
}

function assertPlan(plan: readonly PlannedYear[], basis: PredictionBasis): void {
  const errors = plan.flatMap(({ year, values }, index) => {
    const expectedYear = basis.last.year + 1 + index;
    const found = [];
    if (year !== expectedYear)
      found.push({
        pointer: `/plan/${index}/year`,
        detail: `expected ${expectedYear}, the years after ${basis.last.year} in a row; found ${year}`,
      });
    if (values.length !== basis.regressors.length)
      found.push({
        pointer: `/plan/${index}/values`,
        detail: `expected ${basis.regressors.length} values, for ${basis.regressors.join(' and ')}; found ${values.length}`,
      });
    // Also of a last year that with a lag nothing reads yet.
    if (basis.form === 'log')
      values.forEach((value, regressor) => {
        if (!(value > 0))
          found.push({
            pointer: `/plan/${index}/values/${regressor}`,
            detail: `expected an amount above zero, for the fit reads logs; found ${value}`,
          });
      });
    return found;
  });
  if (errors.length > 0) throw new Invalid('The plan does not fit the fit.', errors);
}

function toScenario(row: ScenarioRow): Scenario {
  return {
    ...row,
    plan: row.plan as readonly PlannedYear[],
    years: row.years as readonly EvaluatedYear[],
  };
}
