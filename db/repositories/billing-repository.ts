import type { Kysely } from 'kysely';
import type { Database } from '../schema/database';

export interface BillingAccountRow {
  readonly customerId: string;
  readonly subscriptionId: string;
}

/** Which customer and subscription at the payment provider belong to the workspace. */
export class BillingRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  find(): Promise<BillingAccountRow | undefined> {
    return this.db
      .selectFrom('billingAccount')
      .select(['customerId', 'subscriptionId'])
      .where('workspaceId', '=', this.workspaceId)
      .executeTakeFirst();
  }

  /** Keeps the first account where two requests make one at the same time. */
  async insert(account: BillingAccountRow): Promise<void> {
    await this.db
      .insertInto('billingAccount')
      .values({ ...account, workspaceId: this.workspaceId })
      .onConflict((conflict) => conflict.column('workspaceId').doNothing())
      .execute();
  }
}
