import { type Kysely, sql } from 'kysely';
import { withNamedErrors } from '../errors';
import type { Database } from '../schema/database';

export type FitState = 'queued' | 'running' | 'done' | 'failed' | 'cancelled';

export interface FitRow {
  readonly id: string;
  readonly panelVersionId: string;
  readonly peerGroupId: string;
  readonly ownCompany: string;
  readonly specification: object;
  readonly state: FitState;
  readonly progress: object | null;
  readonly hash: string | null;
  /** The standing and the number of companies of the result: a whole result can be megabytes. */
  readonly standing: object | null;
  readonly companies: number | null;
  readonly failure: object | null;
  readonly createdAt: Date;
  readonly createdByName: string;
}

/** One fit alone: its engine is read out of its whole result, which a list is spared. */
export interface SingleFitRow extends FitRow {
  /** Version of the engine that computed the result. */
  readonly engine: string | null;
}

export class FitsRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  /** @throws {UniqueViolation} when the same fit is queued, running or done. */
  async insert(fit: {
    readonly id: string;
    readonly panelVersionId: string;
    readonly peerGroupId: string;
    readonly specification: object;
    readonly specificationKey: string;
    readonly createdBy: string;
  }): Promise<void> {
    await withNamedErrors(() =>
      this.db
        .insertInto('fit')
        .values({
          ...fit,
          specification: JSON.stringify(fit.specification),
          state: 'queued',
          workspaceId: this.workspaceId,
        })
        .execute(),
    );
  }

  findSame(peerGroupId: string, specificationKey: string): Promise<FitRow | undefined> {
    return this.fits()
      .where('fit.peerGroupId', '=', peerGroupId)
      .where('fit.specificationKey', '=', specificationKey)
      .where('fit.state', 'in', ['queued', 'running', 'done'])
      .executeTakeFirst();
  }

  find(id: string): Promise<SingleFitRow | undefined> {
    return this.fits()
      .select(sql<string | null>`fit.result ->> 'engine'`.as('engine'))
      .where('fit.id', '=', id)
      .executeTakeFirst();
  }

  /** The whole result; undefined for a fit that is not done. */
  async result(id: string): Promise<object | undefined> {
    const found = await this.db
      .selectFrom('fit')
      .select('result')
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .executeTakeFirst();
    return found?.result ?? undefined;
  }

  list(limit: number): Promise<FitRow[]> {
    return this.fits().orderBy('fit.createdAt', 'desc').limit(limit).execute();
  }

  /**
   * Lets one transaction of the workspace at a time count its fits and add one. Not a lock of the workspace's row: that
   * is held while a large panel is stored.
   */
  async lockCount(): Promise<void> {
    await sql`select pg_advisory_xact_lock(hashtextextended(${`fits of ${this.workspaceId}`}, 0))`.execute(
      this.db,
    );
  }

  /** How many are queued or running. */
  async unfinished(): Promise<number> {
    const { count } = await this.db
      .selectFrom('fit')
      .select(({ fn }) => fn.countAll<number>().as('count'))
      .where('workspaceId', '=', this.workspaceId)
      .where('state', 'in', ['queued', 'running'])
      .executeTakeFirstOrThrow();
    return count;
  }

  latestDone(): Promise<FitRow | undefined> {
    return this.fits()
      .where('fit.state', '=', 'done')
      .orderBy('fit.createdAt', 'desc')
      .limit(1)
      .executeTakeFirst();
  }

  /** Takes a queued or interrupted fit up; false when it ended meanwhile. */
  markRunning(id: string, progress: object): Promise<boolean> {
    return this.changeUnfinished(id, { state: 'running', progress: JSON.stringify(progress) });
  }

  saveProgress(id: string, progress: object): Promise<boolean> {
    return this.changeUnfinished(id, { progress: JSON.stringify(progress) });
  }

  finish(id: string, hash: string, result: object, at: Date): Promise<boolean> {
    return this.changeUnfinished(id, {
      state: 'done',
      hash,
      result: JSON.stringify(result),
      progress: null,
      finishedAt: at,
    });
  }

  fail(id: string, failure: object, at: Date): Promise<boolean> {
    return this.changeUnfinished(id, {
      state: 'failed',
      failure: JSON.stringify(failure),
      progress: null,
      finishedAt: at,
    });
  }

  cancel(id: string, at: Date): Promise<boolean> {
    return this.changeUnfinished(id, { state: 'cancelled', progress: null, finishedAt: at });
  }

  private async changeUnfinished(
    id: string,
    change: {
      readonly state?: FitState;
      readonly progress?: string | null;
      readonly hash?: string;
      readonly result?: string;
      readonly failure?: string;
      readonly finishedAt?: Date;
    },
  ): Promise<boolean> {
    const result = await this.db
      .updateTable('fit')
      .set(change)
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .where('state', 'in', ['queued', 'running'])
      .executeTakeFirst();
    return result.numUpdatedRows > 0n;
  }

  private fits() {
    return this.db
      .selectFrom('fit')
      .innerJoin('person', 'person.id', 'fit.createdBy')
      .innerJoin('peerGroupVersion', (join) =>
        join
          .onRef('peerGroupVersion.workspaceId', '=', 'fit.workspaceId')
          .onRef('peerGroupVersion.id', '=', 'fit.peerGroupId'),
      )
      .select([
        'fit.id',
        'fit.panelVersionId',
        'fit.peerGroupId',
        'peerGroupVersion.ownCompany',
        'fit.specification',
        'fit.state',
        'fit.progress',
        'fit.hash',
        sql<object | null>`fit.result -> 'standing'`.as('standing'),
        sql<number | null>`(fit.result #>> '{sample,companies}')::integer`.as('companies'),
        'fit.failure',
        'fit.createdAt',
        'person.name as createdByName',
      ])
      .where('fit.workspaceId', '=', this.workspaceId);
  }
}
