import type { Kysely } from 'kysely';
import type { Database } from '../schema/database';

export interface ScenarioRow {
  readonly id: string;
  readonly fitId: string;
  readonly version: number;
  readonly name: string;
  readonly note: string;
  readonly plan: readonly object[];
  readonly years: readonly object[];
  readonly createdByName: string;
  readonly updatedByName: string;
  readonly updatedAt: Date;
  readonly deletedAt: Date | null;
}

export interface NewScenarioVersion {
  readonly name: string;
  readonly note: string;
  readonly plan: readonly object[];
  readonly years: readonly object[];
  readonly createdBy: string;
}

export interface DraftRow {
  readonly scenarioId: string | null;
  readonly name: string;
  readonly note: string;
  readonly plan: readonly object[];
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

  async insert(id: string, fitId: string, first: NewScenarioVersion): Promise<void> {
    await this.db
      .insertInto('scenario')
      .values({
        workspaceId: this.workspaceId,
        id,
        fitId,
        version: 1,
        createdBy: first.createdBy,
        deletedAt: null,
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
      .select(['scenarioId', 'name', 'note', 'plan', 'updatedAt'])
      .where('workspaceId', '=', this.workspaceId)
      .where('fitId', '=', key.fitId)
      .where('personId', '=', key.personId)
      .where('scenarioId', 'is not distinct from', key.scenarioId)
      .executeTakeFirst();
  }

  async saveDraft(
    key: DraftKey,
    draft: { readonly name: string; readonly note: string; readonly plan: readonly object[] },
    at: Date,
  ): Promise<void> {
    const plan = JSON.stringify(draft.plan);
    await this.db
      .insertInto('scenarioDraft')
      .values({ ...key, ...draft, plan, workspaceId: this.workspaceId, updatedAt: at })
      .onConflict((conflict) =>
        conflict
          .columns(['workspaceId', 'fitId', 'personId', 'scenarioId'])
          .doUpdateSet({ name: draft.name, note: draft.note, plan, updatedAt: at }),
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
        plan: JSON.stringify(row.plan),
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
      .select([
        'scenario.id',
        'scenario.fitId',
        'scenario.version',
        'scenarioVersion.name',
        'scenarioVersion.note',
        'scenarioVersion.plan',
        'scenarioVersion.years',
        'creator.name as createdByName',
        'updater.name as updatedByName',
        'scenarioVersion.createdAt as updatedAt',
        'scenario.deletedAt',
      ])
      .where('scenario.workspaceId', '=', this.workspaceId);
  }
}
