import { eventually } from '../../db/testing/eventually';
import { SeatsReply } from '../contract';
import { Unavailable } from '../errors/app-error';
import { trialDays, trialSeats } from './billing-service';
import { workOpenBillingAccount } from './open-account-job';
import { toSeatsReply } from './seat-replies';
import { startBillingBench, type BillingBench } from './testing/billing-bench';

const dayMs = 86_400_000;

describe('billing', () => {
  let bench: BillingBench;

  beforeEach(async () => {
    bench = await startBillingBench();
  });
  afterEach(() => bench.close());

  /** Every subscription at the provider, cancelled ones among them, and its customer. */
  async function opened(): Promise<{ customers: number; subscriptions: number }> {
    const { stripe } = bench.stub;
    const customers = await stripe.customers.list();
    const subscriptions = await stripe.subscriptions.list({ status: 'all' });
    return { customers: customers.data.length, subscriptions: subscriptions.data.length };
  }

  it('opens one trial of fourteen days for a workspace, without a card', async () => {
    const workspaceId = await bench.newWorkspace();
    await bench.service().openAccount(workspaceId);

    const { plan, nextInvoice, invoices } = await bench.service().seats(workspaceId);
    const trialEnd = new Date(bench.nowMs + 14 * dayMs);
    expect(plan.status).toBe('trialing');
    expect(plan.trialEndsAt).toEqual(trialEnd);
    expect(plan.renewsAt).toEqual(trialEnd);
    expect(plan.hasPaymentMethod).toBeFalse();
    expect(nextInvoice?.total).toEqual({ amount: 3 * 8_900 + 5 * 1_900, currency: 'EUR' });
    expect(nextInvoice?.lines.map((line) => line.amount.amount)).toEqual([26_700, 9_500]);
    expect(invoices.map(({ status, total }) => [status, total.amount])).toEqual([['paid', 0]]);
    const [customer] = (await bench.stub.stripe.customers.list()).data;
    expect(customer.metadata).toEqual({ workspace: workspaceId });
    expect(customer.name).toBe('Velmara finance');
  });

  it('opens no second trial when the job runs twice', async () => {
    const workspaceId = await bench.newWorkspace();
    await bench.service().openAccount(workspaceId);
    await bench.service().openAccount(workspaceId);
    expect(await opened()).toEqual({ customers: 1, subscriptions: 1 });
  });

  it('opens no second trial when two servers run the job at the same time', async () => {
    const workspaceId = await bench.newWorkspace();
    const services = [bench.service(), bench.service(), bench.service()];
    await Promise.all(services.map((service) => service.openAccount(workspaceId)));
    expect(await opened()).toEqual({ customers: 1, subscriptions: 1 });
    const { plan } = await bench.service().seats(workspaceId);
    expect(plan.status).toBe('trialing');
  });

  it('comes to the same trial when the job was cut off before it kept the account', async () => {
    const workspaceId = await bench.newWorkspace();
    const customerId = await bench
      .gateway()
      .createCustomer(
        { id: workspaceId, name: 'Velmara finance' },
        `workspace:${workspaceId}:customer`,
      );
    const subscriptionId = await bench
      .gateway()
      .createTrial(
        { customerId, workspaceId, quantities: trialSeats, trialDays },
        `workspace:${workspaceId}:subscription`,
      );
    await bench.service().openAccount(workspaceId);
    expect(await opened()).toEqual({ customers: 1, subscriptions: 1 });
    const account = await bench.repositories.inWorkspace(workspaceId, (tx) => tx.billing.find());
    expect(account).toEqual({ customerId, subscriptionId });
  });

  it('keeps the trials of two workspaces apart', async () => {
    const [first, second] = [await bench.newWorkspace(), await bench.newWorkspace()];
    await Promise.all([first, second].map((id) => bench.service().openAccount(id)));
    expect(await opened()).toEqual({ customers: 2, subscriptions: 2 });
    await bench.addMember(first, ['analyst']);
    expect((await bench.service().seats(first)).seats[0].used).toBe(1);
    expect((await bench.service().seats(second)).seats[0].used).toBe(0);
  });

  it('counts members and open invitations against what was bought, expired ones not', async () => {
    const workspaceId = await bench.newWorkspace();
    await bench.service().openAccount(workspaceId);
    await bench.addMember(workspaceId, ['billing_admin', 'analyst']);
    await bench.addMember(workspaceId, ['cfo', 'reader']);
    const now = new Date(bench.nowMs);
    await bench.invite(workspaceId, ['analyst'], new Date(bench.nowMs + 1));
    await bench.invite(workspaceId, ['reader'], now);

    const view = await bench.service().seats(workspaceId);
    expect(view.seats.map(({ bought, used, invited, free }) => [bought, used, invited, free]))
      .withContext('analyst seats, then reading seats')
      .toEqual([
        [3, 1, 1, 1],
        [5, 1, 0, 4],
      ]);
    const reply = SeatsReply.parse(toSeatsReply(view));
    expect(reply.seats[1].unitPrice).toEqual({ amount: 1_900, currency: 'EUR' });
    expect(reply.readAt).toBe(now.toISOString());
  });

  it('says that a trial without a card has paused, and that no invoice is to come', async () => {
    const workspaceId = await bench.newWorkspace();
    await bench.service().openAccount(workspaceId);
    bench.nowMs += 15 * dayMs;
    const { plan, nextInvoice } = await bench.service().seats(workspaceId);
    expect(plan.status).toBe('paused');
    expect([plan.trialEndsAt, plan.renewsAt]).toEqual([null, null]);
    expect(nextInvoice).toBeNull();
  });

  it('names the provider as unavailable when it does not answer, and opens nothing', async () => {
    const workspaceId = await bench.newWorkspace();
    await bench.service().openAccount(workspaceId);
    const other = await bench.newWorkspace();
    await bench.stub.stop();
    const unavailable = jasmine.objectContaining({ slug: 'billing-unavailable', status: 503 });
    await expectAsync(bench.service().seats(workspaceId)).toBeRejectedWith(unavailable);
    await expectAsync(bench.service().openAccount(other)).toBeRejectedWith(unavailable);
    const account = await bench.repositories.inWorkspace(other, (tx) => tx.billing.find());
    expect(account).toBeUndefined();
  });

  it('says that billing is being set up until the queue has worked, and asks for it again', async () => {
    const workspaceId = await bench.newWorkspace();
    await expectAsync(bench.service().seats(workspaceId)).toBeRejectedWithError(
      Unavailable,
      'Billing is being set up. Try again in a moment.',
    );
    await bench.queue.work('open-billing-account', workOpenBillingAccount(bench.service()));
    const account = await eventually('a billing account', () =>
      bench.repositories.inWorkspace(workspaceId, (tx) => tx.billing.find()),
    );
    expect(account.customerId).toMatch(/^cus_/);
    expect((await bench.service().seats(workspaceId)).plan.status).toBe('trialing');
  });
});
