import type Stripe from 'stripe';
import {
  failureOf,
  payingCustomer,
  priceId,
  second,
  startStub,
  type RunningStub,
} from './testing/running-stub';
import { idOf } from './wire';

describe('invoices in the Stripe stub', () => {
  let stub: RunningStub;
  let stripe: Stripe;
  let now: number;
  let customer: Stripe.Customer;
  let subscription: Stripe.Subscription;

  beforeEach(async () => {
    now = second;
    stub = await startStub({ now: () => now });
    stripe = stub.stripe;
    customer = await payingCustomer(stripe);
    subscription = await stripe.subscriptions.create({
      customer: customer.id,
      metadata: { workspace: 'w1' },
      items: [
        { price: await priceId(stripe, 'analyst_seat_monthly'), quantity: 2 },
        { price: await priceId(stripe, 'reading_seat_monthly'), quantity: 4 },
      ],
    });
  });
  afterEach(() => stub.stop());

  it('retrieves the first invoice, which points to its subscription through its parent', async () => {
    const invoice = await stripe.invoices.retrieve(idOf(subscription.latest_invoice));
    expect(invoice.id).toMatch(/^in_1[0-9A-Za-z]{23}$/);
    expect(invoice.number).toMatch(/^[0-9A-Z]{8}-0001$/);
    expect(invoice.billing_reason).toBe('subscription_create');
    expect(invoice.parent?.subscription_details?.subscription).toBe(subscription.id);
    expect(invoice.parent?.subscription_details?.metadata).toEqual({ workspace: 'w1' });
    expect('subscription' in invoice).toBeFalse();
    expect([invoice.amount_due, invoice.amount_paid, invoice.amount_remaining]).toEqual([
      25_400, 25_400, 0,
    ]);
    expect(invoice.status_transitions.paid_at).toBe(second);
    const [line] = invoice.lines.data;
    expect(line.id).toMatch(/^il_1[0-9A-Za-z]{23}$/);
    expect(line.amount).toBe(17_800);
    expect(line.pricing?.unit_amount_decimal?.toNumber()).toBe(8_900);
    expect(line.parent?.subscription_item_details?.subscription_item).toBe(
      subscription.items.data[0].id,
    );
    const lines = await stripe.invoices.listLineItems(invoice.id);
    expect(lines.data.map(({ id }) => id)).toEqual(invoice.lines.data.map(({ id }) => id));
  });

  it('previews the next renewal without writing anything down', async () => {
    const preview = await stripe.invoices.createPreview({
      customer: customer.id,
      subscription: subscription.id,
    });
    const end = subscription.items.data[0].current_period_end;
    expect(preview.id).toMatch(/^upcoming_in_1/);
    expect(preview.status).toBe('draft');
    expect(preview.total).toBe(2 * 8_900 + 4 * 1_900);
    expect(preview.created).toBe(end);
    expect(preview.lines.data.map(({ id }) => id.startsWith('il_tmp_1'))).toEqual([true, true]);
    for (const line of preview.lines.data) {
      expect(line.period).toEqual({ start: end, end: Date.UTC(2026, 2, 31, 9, 30) / 1000 });
      expect(line.parent?.subscription_item_details?.proration).toBeFalse();
    }
    const { data } = await stripe.invoices.list({ subscription: subscription.id });
    expect(data.map(({ id }) => id)).toEqual([idOf(subscription.latest_invoice)]);
    const failure = await failureOf(stripe.invoices.retrieve(preview.id));
    expect(failure.code).toBe('resource_missing');
  });

  it('renews at each period end for exactly what the preview said', async () => {
    const preview = await stripe.invoices.createPreview({ subscription: subscription.id });
    now = Date.UTC(2026, 2, 31, 9, 29) / 1000;
    const renewed = await stripe.subscriptions.retrieve(subscription.id);
    expect(renewed.items.data[0].current_period_end).toBe(Date.UTC(2026, 2, 31, 9, 30) / 1000);
    const invoice = await stripe.invoices.retrieve(idOf(renewed.latest_invoice));
    expect(invoice.billing_reason).toBe('subscription_cycle');
    expect(invoice.number).toMatch(/-0002$/);
    expect(invoice.created).toBe(preview.created);
    expect(invoice.period_end).toBe(preview.period_end);
    expect(invoice.lines.data.map(({ amount, period }) => ({ amount, period }))).toEqual(
      preview.lines.data.map(({ amount, period }) => ({ amount, period })),
    );
  });

  it('catches up with every renewal that passed, once each', async () => {
    now = Date.UTC(2026, 5, 15) / 1000;
    const { data } = await stripe.invoices.list({ customer: customer.id });
    expect(data.map(({ created }) => new Date(created * 1000).toISOString().slice(0, 10))).toEqual([
      '2026-05-31',
      '2026-04-30',
      '2026-03-31',
      '2026-02-28',
      '2026-01-31',
    ]);
    expect((await stripe.invoices.list({ customer: customer.id })).data.length).toBe(5);
  });

  it('filters the list by customer, subscription and status', async () => {
    const count = async (params: Stripe.InvoiceListParams): Promise<number> =>
      (await stripe.invoices.list(params)).data.length;
    expect(await count({ customer: customer.id, status: 'paid' })).toBe(1);
    expect(await count({ status: 'open' })).toBe(0);
    expect(await count({ customer: 'cus_none' })).toBe(0);
  });

  it('answers 501 naming the change that a preview would have to price', async () => {
    const [item] = subscription.items.data;
    const cases: [Stripe.InvoiceCreatePreviewParams, string][] = [
      [
        { subscription_details: { items: [{ id: item.id, quantity: 5 }] } },
        'subscription_details[items][0][id]',
      ],
      [
        { subscription_details: { proration_date: second } },
        'subscription_details[proration_date]',
      ],
      [{ preview_mode: 'recurring' }, 'preview_mode'],
      [{ discounts: [{ coupon: 'half' }] }, 'discounts[0][coupon]'],
    ];
    for (const [params, param] of cases) {
      const failure = await failureOf(
        stripe.invoices.createPreview({ subscription: subscription.id, ...params }),
      );
      expect([failure.statusCode, failure.param]).toEqual([501, param]);
    }
  });

  it('has no upcoming invoice for a subscription that is paused', async () => {
    const { id } = await stripe.customers.create();
    const trial = await stripe.subscriptions.create({
      customer: id,
      items: [{ price: await priceId(stripe, 'analyst_seat_yearly') }],
      trial_period_days: 1,
      trial_settings: { end_behavior: { missing_payment_method: 'pause' } },
    });
    const preview = await stripe.invoices.createPreview({ subscription: trial.id });
    expect(preview.total).toBe(89_000);
    expect(preview.lines.data[0].period.start).toBe(trial.trial_end ?? NaN);
    now += 86_400;
    const failure = await failureOf(stripe.invoices.createPreview({ subscription: trial.id }));
    expect([failure.statusCode, failure.code]).toEqual([404, 'invoice_upcoming_none']);
  });
});
