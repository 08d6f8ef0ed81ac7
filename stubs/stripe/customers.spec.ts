import Stripe from 'stripe';
import { failureOf, payingCustomer, startStub, type RunningStub } from './testing/running-stub';
import { idOf } from './wire';

describe('customers in the Stripe stub', () => {
  let stub: RunningStub;
  let stripe: Stripe;

  beforeEach(async () => {
    stub = await startStub();
    stripe = stub.stripe;
  });
  afterEach(() => stub.stop());

  it('creates, retrieves and updates a customer, leaving what was not sent', async () => {
    const made = await stripe.customers.create({
      name: 'Velmara',
      email: 'billing@velmara.example',
      address: { line1: 'Quay 1', city: 'Ostmark' },
      metadata: { workspace: 'w1', plan: 'yearly' },
    });
    expect(made.id).toMatch(/^cus_[0-9A-Za-z]{14}$/);
    expect(made.livemode).toBeFalse();

    await stripe.customers.update(made.id, { phone: '+99 1', metadata: { plan: '' } });

    const found = (await stripe.customers.retrieve(made.id)) as Stripe.Customer;
    expect(found.name).toBe('Velmara');
    expect(found.phone).toBe('+99 1');
    expect(found.address?.line1).toBe('Quay 1');
    expect(found.address?.country).toBeNull();
    expect(found.metadata).toEqual({ workspace: 'w1' });
  });

  it('unsets a field that is sent empty', async () => {
    const { id } = await stripe.customers.create({ phone: '+99 1', metadata: { a: '1' } });
    const updated = await stripe.customers.update(id, { phone: '', metadata: '' });
    expect(updated.phone).toBeNull();
    expect(updated.metadata).toEqual({});
  });

  it('attaches the test card that always pays under an id of its own', async () => {
    const customer = await payingCustomer(stripe);
    expect(customer.invoice_settings.default_payment_method).toMatch(/^pm_1[0-9A-Za-z]{23}$/);
  });

  it('refuses a default payment method that belongs to another customer', async () => {
    const other = await payingCustomer(stripe);
    const { id } = await stripe.customers.create({ name: 'Velmara' });
    const card = idOf(other.invoice_settings.default_payment_method);
    const failure = await failureOf(
      stripe.customers.update(id, { invoice_settings: { default_payment_method: card } }),
    );
    expect(failure).toBeInstanceOf(Stripe.errors.StripeInvalidRequestError);
    expect(failure.param).toBe('invoice_settings[default_payment_method]');
  });

  it('answers 501 for a test card that declines, and 404 for one that does not exist', async () => {
    const declined = await failureOf(
      stripe.customers.create({ payment_method: 'pm_card_chargeCustomerFail' }),
    );
    expect([declined.statusCode, declined.param]).toEqual([501, 'payment_method']);
    const unknown = await failureOf(stripe.customers.create({ payment_method: 'pm_none' }));
    expect([unknown.statusCode, unknown.code]).toEqual([404, 'resource_missing']);
  });

  it('keeps nothing of a refused creation', async () => {
    await failureOf(stripe.customers.create({ name: 'Velmara', payment_method: 'pm_none' }));
    expect((await stripe.customers.list()).data).toEqual([]);
  });

  it('answers 404 for an unknown customer', async () => {
    const failure = await failureOf(stripe.customers.retrieve('cus_none'));
    expect(failure).toBeInstanceOf(Stripe.errors.StripeInvalidRequestError);
    expect(failure.code).toBe('resource_missing');
    expect(failure.message).toBe("No such customer: 'cus_none'");
  });

  it('lists newest first in pages that the SDK walks through by itself', async () => {
    const made: string[] = [];
    for (let index = 0; index < 5; index += 1) made.push((await stripe.customers.create()).id);
    const page = await stripe.customers.list({ limit: 2 });
    expect(page.data.map(({ id }) => id)).toEqual([made[4], made[3]]);
    expect(page.has_more).toBeTrue();

    const walked: string[] = [];
    for await (const customer of stripe.customers.list({ limit: 2 })) walked.push(customer.id);
    expect(walked).toEqual([...made].reverse());

    const before = await stripe.customers.list({ limit: 2, ending_before: made[1] });
    expect(before.data.map(({ id }) => id)).toEqual([made[3], made[2]]);
    expect(before.has_more).toBeTrue();
  });
});
