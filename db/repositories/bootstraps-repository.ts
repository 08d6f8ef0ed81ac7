import type { Kysely } from 'kysely';
import { withNamedErrors } from '../errors';
import type { Database } from '../schema/database';
import type { FitState } from './fits-repository';

export interface BootstrapRow {
  readonly id: string;
  readonly fitId: string;
  readonly seed: number;
  readonly state: FitState;
  readonly progress: object | null;
  readonly result: object | null;
  readonly failure: string | null;
}

/** Bootstraps asked for after a fit, each kept with it. */
export class BootstrapsRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  /** @throws {UniqueViolation} when one is under way, or one with the same seed is done. */
  async insert(bootstrap: {
    readonly id: string;
    readonly fitId: string;
    readonly seed: number;
    readonly createdBy: string;
  }): Promise<void> {
    await withNamedErrors(() =>
      this.db
        .insertInto('fitBootstrap')
        .values({ ...bootstrap, state: 'queued', workspaceId: this.workspaceId })
        .execute(),
    );
  }

  find(id: string): Promise<BootstrapRow | undefined> {
    return this.#bootstraps().where('id', '=', id).executeTakeFirst();
  }

  /** Of a fit, the newest first. */
  ofFit(fitId: string): Promise<BootstrapRow[]> {
    return this.#bootstraps()
      .where('fitId', '=', fitId)
      .orderBy('createdAt', 'desc')
      .orderBy('id')
      .execute();
  }

  /** Takes a queued or interrupted one up; false when it ended meanwhile. */
  markRunning(id: string): Promise<boolean> {
    return this.#changeUnfinished(id, { state: 'running' });
  }

  saveProgress(id: string, progress: object): Promise<boolean> {
    return this.#changeUnfinished(id, { progress: JSON.stringify(progress) });
  }

  finish(id: string, result: object, at: Date): Promise<boolean> {
    const ended = { state: 'done', progress: null, finishedAt: at } as const;
    return this.#changeUnfinished(id, { ...ended, result: JSON.stringify(result) });
  }

  fail(id: string, failure: string, at: Date): Promise<boolean> {
    return this.#changeUnfinished(id, { state: 'failed', failure, progress: null, finishedAt: at });
  }

  cancel(id: string, at: Date): Promise<boolean> {
    return this.#changeUnfinished(id, { state: 'cancelled', progress: null, finishedAt: at });
  }

  async #changeUnfinished(
    id: string,
    change: {
      readonly state?: FitState;
      readonly progress?: string | null;
      readonly result?: string;
      readonly failure?: string;
      readonly finishedAt?: Date;
    },
  ): Promise<boolean> {
    const result = await this.db
      .updateTable('fitBootstrap')
      .set(change)
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .where('state', 'in', ['queued', 'running'])
      .executeTakeFirst();
    return result.numUpdatedRows > 0n;
  }

  #bootstraps() {
    return this.db
      .selectFrom('fitBootstrap')
      .select(['id', 'fitId', 'seed', 'state', 'progress', 'result', 'failure'])
      .where('workspaceId', '=', this.workspaceId);
  }
}
