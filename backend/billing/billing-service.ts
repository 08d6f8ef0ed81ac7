import type { BillingAccountRow } from '../../db/repositories/billing-repository';
import type { Repositories } from '../../db/repositories/repositories';
import { Unavailable } from '../errors/app-error';
import type { JobQueue } from '../jobs/job-queue';
import { countSeats, type SeatCount } from './count-seats';
import type { Invoice, NextInvoice, Plan, SeatKind } from './plan';
import type { StripeGateway } from './stripe-gateway';

/** What a new workspace can use while its trial runs. */
export const trialSeats: Readonly<Record<SeatKind, number>> = { analyst: 3, reading: 5 };
export const trialDays = 14;

export interface BillingServiceDependencies {
  readonly repositories: Repositories;
  readonly gateway: StripeGateway;
  readonly queue: Pick<JobQueue, 'enqueue' | 'wake'>;
  readonly now: () => Date;
}

/** Who has access and what it costs, as the payment provider says at this moment. */
export interface SeatsView {
  readonly plan: Plan;
  readonly seats: readonly SeatCount[];
  readonly nextInvoice: NextInvoice | null;
  readonly invoices: readonly Invoice[];
  readonly readAt: Date;
}

/** The workspace's customer and subscription at the payment provider. */
export class BillingService {
  constructor(private readonly uses: BillingServiceDependencies) {}

  /**
   * Opens the workspace's account with a trial; one that is open stays as it is. Two at the same time, or one that was
   * cut off half way, come to the same customer and subscription by the provider's idempotency keys, which it keeps for
   * a day.
   *
   * @throws {Unavailable} `billing-unavailable`; trying again is safe.
   */
  async openAccount(workspaceId: string): Promise<void> {
    const { repositories, gateway } = this.uses;
    const found = await repositories.inWorkspace(workspaceId, async (tx) => ({
      account: await tx.billing.find(),
      workspace: await tx.members.workspace(),
    }));
    if (found.account !== undefined) return;
    if (found.workspace === undefined)
      throw new Error(`expected the workspace ${workspaceId} to open its billing; found none`);
    const customerId = await gateway.createCustomer(
      { id: workspaceId, name: found.workspace.name },
      `workspace:${workspaceId}:customer`,
    );
    const subscriptionId = await gateway.createTrial(
      { customerId, workspaceId, quantities: trialSeats, trialDays },
      `workspace:${workspaceId}:subscription`,
    );
    await repositories.inWorkspace(workspaceId, (tx) =>
      tx.billing.insert({ customerId, subscriptionId }),
    );
  }

  /** @throws {Unavailable} `billing-unavailable` when the account is not open yet or the provider does not answer. */
  async seats(workspaceId: string): Promise<SeatsView> {
    const { customerId, subscriptionId } = await this.#account(workspaceId);
    const { gateway, repositories } = this.uses;
    const [plan, nextInvoice, invoices] = await Promise.all([
      gateway.readPlan(subscriptionId),
      gateway.previewNextInvoice(subscriptionId),
      gateway.listInvoices(customerId),
    ]);
    const readAt = this.uses.now();
    const { members, invitations } = await repositories.inWorkspace(workspaceId, async (tx) => ({
      members: await tx.members.list(),
      invitations: await tx.members.openInvitations(),
    }));
    const invited = invitations.filter((invitation) => invitation.expiresAt > readAt);
    return {
      plan,
      seats: countSeats(plan.seats, members, invited),
      nextInvoice,
      invoices,
      readAt,
    };
  }

  /** Where no account is open, asks for it again: the first job may have given up while the provider was away. */
  async #account(workspaceId: string): Promise<BillingAccountRow> {
    const { queue, repositories } = this.uses;
    const account = await repositories.inWorkspace(workspaceId, async (tx) => {
      const found = await tx.billing.find();
      if (found === undefined) await queue.enqueue(tx, 'open-billing-account', workspaceId);
      return found;
    });
    if (account !== undefined) return account;
    queue.wake('open-billing-account');
    throw new Unavailable('Billing is being set up. Try again in a moment.', 'billing-unavailable');
  }
}
