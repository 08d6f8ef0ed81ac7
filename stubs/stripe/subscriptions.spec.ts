import Stripe from 'stripe';
import {
  failureOf,
  payingCustomer,
  priceId,
  second,
  startStub,
  type RunningStub,
} from './testing/running-stub';

describe('subscriptions in the Stripe stub', () => {
  let stub: RunningStub;
  let stripe: Stripe;
  let now: number;
  let analyst: string;
  let reading: string;

  beforeEach(async () => {
    now = second;
    stub = await startStub({ now: () => now });
    stripe = stub.stripe;
    analyst = await priceId(stripe, 'analyst_seat_monthly');
    reading = await priceId(stripe, 'reading_seat_monthly');
  });
  afterEach(() => stub.stop());

  it('starts one with two items, each with its own period, and a paid first invoice', async () => {
    const { id: customer } = await payingCustomer(stripe);
    const made = await stripe.subscriptions.create({
      customer,
      items: [
        { price: analyst, quantity: 3 },
        { price: reading, quantity: 5 },
      ],
      metadata: { workspace: 'w1' },
      expand: ['latest_invoice', 'customer'],
    });
    expect(made.id).toMatch(/^sub_1[0-9A-Za-z]{23}$/);
    expect(made.status).toBe('active');
    expect(made.billing_mode.type).toBe('flexible');
    expect(made.items.data.map((item) => [item.price.lookup_key, item.quantity])).toEqual([
      ['analyst_seat_monthly', 3],
      ['reading_seat_monthly', 5],
    ]);
    for (const item of made.items.data) {
      expect(item.id).toMatch(/^si_[0-9A-Za-z]{14}$/);
      expect(item.current_period_start).toBe(second);
      expect(item.current_period_end).toBe(Date.UTC(2026, 1, 28, 9, 30) / 1000);
    }
    expect('current_period_end' in made).toBeFalse();
    const invoice = made.latest_invoice as Stripe.Invoice;
    expect(invoice.status).toBe('paid');
    expect(invoice.total).toBe(3 * 8_900 + 5 * 1_900);
    expect((made.customer as Stripe.Customer).email).toBe('billing@velmara.example');
  });

  it('starts a trial without a card, with an invoice over nothing', async () => {
    const { id: customer } = await stripe.customers.create();
    const made = await stripe.subscriptions.create({
      customer,
      items: [{ price: analyst }],
      trial_period_days: 14,
      trial_settings: { end_behavior: { missing_payment_method: 'pause' } },
      billing_mode: { type: 'flexible' },
      expand: ['latest_invoice'],
    });
    expect(made.status).toBe('trialing');
    expect(made.trial_end).toBe(second + 14 * 86_400);
    expect(made.items.data[0].current_period_end).toBe(second + 14 * 86_400);
    expect(made.items.data[0].quantity).toBe(1);
    expect((made.latest_invoice as Stripe.Invoice).total).toBe(0);

    now = second + 15 * 86_400;
    expect((await stripe.subscriptions.retrieve(made.id)).status).toBe('paused');
  });

  it('lists by customer and status, without cancelled ones unless asked', async () => {
    const { id: customer } = await stripe.customers.create();
    const trial = await stripe.subscriptions.create({
      customer,
      items: [{ price: analyst }],
      trial_period_days: 7,
      trial_settings: { end_behavior: { missing_payment_method: 'cancel' } },
    });
    const { id: other } = await payingCustomer(stripe);
    const active = await stripe.subscriptions.create({
      customer: other,
      items: [{ price: reading }],
    });
    const ids = async (params: Stripe.SubscriptionListParams): Promise<string[]> =>
      (await stripe.subscriptions.list(params)).data.map(({ id }) => id);
    expect(await ids({})).toEqual([active.id, trial.id]);
    expect(await ids({ customer })).toEqual([trial.id]);
    expect(await ids({ status: 'active' })).toEqual([active.id]);

    now = second + 8 * 86_400;
    expect(await ids({})).toEqual([active.id]);
    expect(await ids({ status: 'canceled' })).toEqual([trial.id]);
    expect(await ids({ status: 'ended', customer })).toEqual([trial.id]);
    expect(await ids({ status: 'all' })).toEqual([active.id, trial.id]);
  });

  it('refuses, as Stripe does, what cannot be billed', async () => {
    const { id: customer } = await stripe.customers.create();
    const { id: paying } = await payingCustomer(stripe);
    const refused: [Stripe.SubscriptionCreateParams, number, string | undefined][] = [
      [{ customer, items: [{ price: analyst }] }, 400, undefined],
      [{ items: [{ price: analyst }] }, 400, 'customer'],
      [{ customer: paying }, 400, 'items'],
      [{ customer: 'cus_none', items: [{ price: analyst }] }, 404, 'customer'],
      [{ customer: paying, items: [{ price: 'price_none' }] }, 404, 'items[0][price]'],
      [
        { customer: paying, items: [{ price: analyst }, { price: analyst }] },
        400,
        'items[1][price]',
      ],
      [{ customer: paying, items: [{ price: analyst, quantity: -1 }] }, 400, 'items[0][quantity]'],
      [{ customer: paying, currency: 'usd', items: [{ price: analyst }] }, 400, 'currency'],
    ];
    for (const [params, status, param] of refused) {
      const failure = await failureOf(stripe.subscriptions.create(params));
      expect(failure).toBeInstanceOf(Stripe.errors.StripeInvalidRequestError);
      expect([failure.statusCode, failure.param]).toEqual([status, param]);
    }
    expect((await stripe.subscriptions.list({ status: 'all' })).data).toEqual([]);
  });

  it('answers 501 with the name of what it does not do', async () => {
    const { id: customer } = await payingCustomer(stripe);
    const { id: cardless } = await stripe.customers.create();
    const yearly = await priceId(stripe, 'reading_seat_yearly');
    const items = [{ price: analyst }];
    const cases: [Stripe.SubscriptionCreateParams, string][] = [
      [{ customer, items, discounts: [{ coupon: 'half' }] }, 'discounts[0][coupon]'],
      [{ customer, items: [{ price: analyst, tax_rates: ['txr_1'] }] }, 'items[0][tax_rates][0]'],
      [{ customer, items: [{ price: analyst }, { price: yearly }] }, 'items[1][price]'],
      [{ customer, items, billing_mode: { type: 'classic' } }, 'billing_mode[type]'],
      [{ customer, items, collection_method: 'send_invoice' }, 'collection_method'],
      [{ customer, items, payment_behavior: 'default_incomplete' }, 'payment_behavior'],
      [{ customer, items, cancel_at_period_end: true }, 'cancel_at_period_end'],
      [
        { customer: cardless, items, trial_period_days: 14 },
        'trial_settings[end_behavior][missing_payment_method]',
      ],
    ];
    for (const [params, param] of cases) {
      const failure = await failureOf(stripe.subscriptions.create(params));
      expect([failure.statusCode, failure.param]).toEqual([501, param]);
    }
  });
});
