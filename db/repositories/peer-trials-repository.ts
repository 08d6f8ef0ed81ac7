import { type Kysely, sql } from 'kysely';
import { withNamedErrors } from '../errors';
import type { Database } from '../schema/database';
import type { FitState } from './fits-repository';

export interface PeerTrialRow {
  readonly id: string;
  readonly panelVersionId: string;
  readonly request: object;
  readonly state: FitState;
  /** By group, as far as they are fitted. */
  readonly outcomes: object;
  readonly failure: string | null;
  readonly createdAt: Date;
}

/** Peer groups tried out before they are saved, and the fits kept for them. */
export class PeerTrialsRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  /** @throws {UniqueViolation} when the same request is queued, running or done. */
  async insert(trial: {
    readonly id: string;
    readonly panelVersionId: string;
    readonly request: object;
    readonly requestKey: string;
    readonly createdBy: string;
  }): Promise<void> {
    const { request, ...fields } = trial;
    await withNamedErrors(() =>
      this.db
        .insertInto('peerTrial')
        .values({
          ...fields,
          request: JSON.stringify(request),
          state: 'queued',
          workspaceId: this.workspaceId,
        })
        .execute(),
    );
  }

  find(id: string): Promise<PeerTrialRow | undefined> {
    return this.#trials().where('id', '=', id).executeTakeFirst();
  }

  findSame(requestKey: string): Promise<PeerTrialRow | undefined> {
    return this.#trials()
      .where('requestKey', '=', requestKey)
      .where('state', 'in', ['queued', 'running', 'done'])
      .executeTakeFirst();
  }

  /** Lets one transaction of the workspace at a time count its trials and add one. */
  async lockCount(): Promise<void> {
    const name = `peer trials of ${this.workspaceId}`;
    await sql`select pg_advisory_xact_lock(hashtextextended(${name}, 0))`.execute(this.db);
  }

  /** How many are queued or running. */
  async unfinished(): Promise<number> {
    const { count } = await this.db
      .selectFrom('peerTrial')
      .select(({ fn }) => fn.countAll<number>().as('count'))
      .where('workspaceId', '=', this.workspaceId)
      .where('state', 'in', ['queued', 'running'])
      .executeTakeFirstOrThrow();
    return count;
  }

  /** Takes a queued or interrupted one up; false when it ended meanwhile. */
  markRunning(id: string): Promise<boolean> {
    return this.#changeUnfinished(id, { state: 'running' });
  }

  saveOutcomes(id: string, outcomes: object): Promise<boolean> {
    return this.#changeUnfinished(id, { outcomes: JSON.stringify(outcomes) });
  }

  finish(id: string, outcomes: object, at: Date): Promise<boolean> {
    const ended = { state: 'done', outcomes: JSON.stringify(outcomes), finishedAt: at } as const;
    return this.#changeUnfinished(id, ended);
  }

  fail(id: string, failure: string, at: Date): Promise<boolean> {
    return this.#changeUnfinished(id, { state: 'failed', failure, finishedAt: at });
  }

  cancel(id: string, at: Date): Promise<boolean> {
    return this.#changeUnfinished(id, { state: 'cancelled', finishedAt: at });
  }

  /** What a fit of this hash came to, where it is kept. */
  async fitted(hash: string): Promise<object | undefined> {
    const found = await this.db
      .selectFrom('trialFit')
      .select('outcome')
      .where('workspaceId', '=', this.workspaceId)
      .where('hash', '=', hash)
      .executeTakeFirst();
    return found?.outcome;
  }

  /** Keeps what a fit came to; one that is kept already stays. */
  async keepFitted(hash: string, outcome: object): Promise<void> {
    await this.db
      .insertInto('trialFit')
      .values({ workspaceId: this.workspaceId, hash, outcome: JSON.stringify(outcome) })
      .onConflict((conflict) => conflict.columns(['workspaceId', 'hash']).doNothing())
      .execute();
  }

  /** How many different groups were fitted before they were saved, or without being saved at all. */
  async countFitted(): Promise<number> {
    const { count } = await this.db
      .selectFrom('trialFit')
      .select(({ fn }) => fn.countAll<number>().as('count'))
      .where('workspaceId', '=', this.workspaceId)
      .executeTakeFirstOrThrow();
    return count;
  }

  async #changeUnfinished(
    id: string,
    change: {
      readonly state?: FitState;
      readonly outcomes?: string;
      readonly failure?: string;
      readonly finishedAt?: Date;
    },
  ): Promise<boolean> {
    const result = await this.db
      .updateTable('peerTrial')
      .set(change)
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .where('state', 'in', ['queued', 'running'])
      .executeTakeFirst();
    return result.numUpdatedRows > 0n;
  }

  #trials() {
    return this.db
      .selectFrom('peerTrial')
      .select(['id', 'panelVersionId', 'request', 'state', 'outcomes', 'failure', 'createdAt'])
      .where('workspaceId', '=', this.workspaceId);
  }
}
