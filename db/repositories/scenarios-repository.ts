import type { Kysely } from 'kysely';
import type { Database } from '../schema/database';

/** How a plan is read; null where it was stored before there was a choice. */
interface StoredReading {
  readonly plan: readonly object[];
  readonly outlook: object | null;
  readonly rules: readonly object[] | null;
  readonly uncertainty: object | null;
}

export interface ScenarioRow extends StoredReading {
  readonly id: string;
  readonly fitId: string;
  readonly version: number;
  readonly name: string;
  readonly note: string;
  readonly years: readonly object[];
  readonly createdByName: string;
  readonly updatedByName: string;
  readonly updatedAt: Date;
  readonly deletedAt: Date | null;
  /** The scenario that this one was copied from, as the copy found it. */
  readonly copiedFromId: string | null;
  readonly copiedFromVersion: number | null;
  readonly copiedFromName: string | null;
  readonly copiedFromFitId: string | null;
}

export interface ScenarioVersionRow extends StoredReading {
  readonly version: number;
  readonly name: string;
  readonly note: string;
  readonly years: readonly object[];
  readonly createdByName: string;
  readonly createdAt: Date;
}

export interface NewScenarioVersion extends StoredReading {
  readonly name: string;
  readonly note: string;
  readonly years: readonly object[];
  readonly createdBy: string;
}

interface NewDraft extends StoredReading {
  readonly name: string;
  readonly note: string;
}

export interface DraftRow extends NewDraft {
  readonly scenarioId: string | null;
  readonly updatedAt: Date;
}

/** Whose draft: of one person, on one fit, of one scenario or of a new one. */
export interface DraftKey {
  readonly fitId: string;
  readonly personId: string;
  readonly scenarioId: string | null;
}

export class ScenariosRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  async insert(
    id: string,
    fitId: string,
    first: NewScenarioVersion,
    copiedFrom: { readonly id: string; readonly version: number } | null,
  ): Promise<void> {
    await this.db
      .insertInto('scenario')
      .values({
        workspaceId: this.workspaceId,
        id,
        fitId,
        version: 1,
        createdBy: first.createdBy,
        deletedAt: null,
        copiedFromId: copiedFrom?.id ?? null,
        copiedFromVersion: copiedFrom?.version ?? null,
      })
      .execute();
    await this.insertVersion(id, 1, first);
  }

  /** Adds a version on top of `parent`; false when another came first or the scenario is gone. */
  async addVersion(id: string, parent: number, next: NewScenarioVersion): Promise<boolean> {
    const result = await this.db
      .updateTable('scenario')
      .set({ version: parent + 1 })
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .where('version', '=', parent)
      .where('deletedAt', 'is', null)
      .executeTakeFirst();
    if (result.numUpdatedRows === 0n) return false;
    await this.insertVersion(id, parent + 1, next);
    return true;
  }

  find(id: string): Promise<ScenarioRow | undefined> {
    return this.scenarios().where('scenario.id', '=', id).executeTakeFirst();
  }

  listByFit(fitId: string): Promise<ScenarioRow[]> {
    return this.scenarios()
      .where('scenario.fitId', '=', fitId)
      .where('scenario.deletedAt', 'is', null)
      .orderBy('scenario.createdAt')
      .execute();
  }

  /** Every version of one, newest first. */
  listVersions(id: string): Promise<ScenarioVersionRow[]> {
    return this.db
      .selectFrom('scenarioVersion')
      .innerJoin('person', 'person.id', 'scenarioVersion.createdBy')
      .select([
        'scenarioVersion.version',
        'scenarioVersion.name',
        'scenarioVersion.note',
        'scenarioVersion.plan',
        'scenarioVersion.outlook',
        'scenarioVersion.rules',
        'scenarioVersion.uncertainty',
        'scenarioVersion.years',
        'person.name as createdByName',
        'scenarioVersion.createdAt',
      ])
      .where('scenarioVersion.workspaceId', '=', this.workspaceId)
      .where('scenarioVersion.scenarioId', '=', id)
      .orderBy('scenarioVersion.version', 'desc')
      .execute();
  }

  async setDeleted(id: string, deletedAt: Date | null): Promise<boolean> {
    const result = await this.db
      .updateTable('scenario')
      .set({ deletedAt })
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .executeTakeFirst();
    return result.numUpdatedRows > 0n;
  }

  findDraft(key: DraftKey): Promise<DraftRow | undefined> {
    return this.db
      .selectFrom('scenarioDraft')
      .select([
        'scenarioId',
        'name',
        'note',
        'plan',
        'outlook',
        'rules',
        'uncertainty',
        'updatedAt',
      ])
      .where('workspaceId', '=', this.workspaceId)
      .where('fitId', '=', key.fitId)
      .where('personId', '=', key.personId)
      .where('scenarioId', 'is not distinct from', key.scenarioId)
      .executeTakeFirst();
  }

  async saveDraft(key: DraftKey, draft: NewDraft, at: Date): Promise<void> {
    const kept = { name: draft.name, note: draft.note, ...asJson(draft), updatedAt: at };
    await this.db
      .insertInto('scenarioDraft')
      .values({ ...key, ...kept, workspaceId: this.workspaceId })
      .onConflict((conflict) =>
        conflict.columns(['workspaceId', 'fitId', 'personId', 'scenarioId']).doUpdateSet(kept),
      )
      .execute();
  }

  async removeDraft(key: DraftKey): Promise<void> {
    await this.db
      .deleteFrom('scenarioDraft')
      .where('workspaceId', '=', this.workspaceId)
      .where('fitId', '=', key.fitId)
      .where('personId', '=', key.personId)
      .where('scenarioId', 'is not distinct from', key.scenarioId)
      .execute();
  }

  private async insertVersion(id: string, version: number, row: NewScenarioVersion): Promise<void> {
    await this.db
      .insertInto('scenarioVersion')
      .values({
        ...row,
        workspaceId: this.workspaceId,
        scenarioId: id,
        version,
        ...asJson(row),
        years: JSON.stringify(row.years),
      })
      .execute();
  }

  private scenarios() {
    return this.db
      .selectFrom('scenario')
      .innerJoin('scenarioVersion', (join) =>
        join
          .onRef('scenarioVersion.workspaceId', '=', 'scenario.workspaceId')
          .onRef('scenarioVersion.scenarioId', '=', 'scenario.id')
          .onRef('scenarioVersion.version', '=', 'scenario.version'),
      )
      .innerJoin('person as creator', 'creator.id', 'scenario.createdBy')
      .innerJoin('person as updater', 'updater.id', 'scenarioVersion.createdBy')
      .leftJoin('scenario as origin', (join) =>
        join
          .onRef('origin.workspaceId', '=', 'scenario.workspaceId')
          .onRef('origin.id', '=', 'scenario.copiedFromId'),
      )
      .leftJoin('scenarioVersion as originVersion', (join) =>
        join
          .onRef('originVersion.workspaceId', '=', 'scenario.workspaceId')
          .onRef('originVersion.scenarioId', '=', 'scenario.copiedFromId')
          .onRef('originVersion.version', '=', 'scenario.copiedFromVersion'),
      )
      .select([
        'scenario.id',
        'scenario.fitId',
        'scenario.version',
        'scenarioVersion.name',
        'scenarioVersion.note',
        'scenarioVersion.plan',
        'scenarioVersion.outlook',
        'scenarioVersion.rules',
        'scenarioVersion.uncertainty',
        'scenarioVersion.years',
        'scenario.copiedFromId',
        'scenario.copiedFromVersion',
        'originVersion.name as copiedFromName',
        'origin.fitId as copiedFromFitId',
        'creator.name as createdByName',
        'updater.name as updatedByName',
        'scenarioVersion.createdAt as updatedAt',
        'scenario.deletedAt',
      ])
      .where('scenario.workspaceId', '=', this.workspaceId);
  }
}

function asJson({ plan, outlook, rules, uncertainty }: StoredReading) {
  return {
    plan: JSON.stringify(plan),
    outlook: outlook && JSON.stringify(outlook),
    rules: rules && JSON.stringify(rules),
    uncertainty: uncertainty && JSON.stringify(uncertainty),
  };
}
