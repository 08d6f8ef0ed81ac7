import type { Kysely } from 'kysely';
import type { Database } from '../schema/database';

/** Either the evidence of a fit or why there is none. */
export interface EvidenceRow {
  readonly evidence: object | null;
  readonly failure: string | null;
}

export class EvidenceRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  find(fitId: string): Promise<EvidenceRow | undefined> {
    return this.db
      .selectFrom('fitEvidence')
      .select(['evidence', 'failure'])
      .where('workspaceId', '=', this.workspaceId)
      .where('fitId', '=', fitId)
      .executeTakeFirst();
  }

  /** Whether there is evidence, without reading it; undefined where neither it nor its failure is there. */
  async isThere(fitId: string): Promise<boolean | undefined> {
    const found = await this.db
      .selectFrom('fitEvidence')
      .select(({ eb }) => eb('evidence', 'is not', null).as('isThere'))
      .where('workspaceId', '=', this.workspaceId)
      .where('fitId', '=', fitId)
      .executeTakeFirst();
    return found === undefined ? undefined : Boolean(found.isThere);
  }

  /** Keeps what came first: two servers that worked the same fit found the same. */
  async insert(fitId: string, evidence: object): Promise<void> {
    await this.#insert(fitId, { evidence: JSON.stringify(evidence), failure: null });
  }

  async insertFailure(fitId: string, failure: string): Promise<void> {
    await this.#insert(fitId, { evidence: null, failure });
  }

  async #insert(
    fitId: string,
    kept: { readonly evidence: string | null; readonly failure: string | null },
  ): Promise<void> {
    await this.db
      .insertInto('fitEvidence')
      .values({ workspaceId: this.workspaceId, fitId, ...kept })
      .onConflict((conflict) => conflict.columns(['workspaceId', 'fitId']).doNothing())
      .execute();
  }
}
