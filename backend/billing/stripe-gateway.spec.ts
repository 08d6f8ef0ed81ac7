import { inspect } from 'node:util';
import {
  failureOf,
  payingCustomer,
  priceId,
  startStub,
  type RunningStub,
} from '../../stubs/stripe/testing/running-stub';
import { AppError } from '../errors/app-error';
import { StripeGateway } from './stripe-gateway';

const made = Date.UTC(2026, 0, 31, 9, 30);

describe('the payment provider', () => {
  let stub: RunningStub;
  let gateway: StripeGateway;

  beforeEach(async () => {
    stub = await startStub({ now: () => made / 1000 });
    gateway = new StripeGateway({ secretKey: 'sk_test_spec', apiUrl: stub.url });
  });
  afterEach(() => stub.stop());

  it('reads a paid yearly plan: its seats, its price and when it renews', async () => {
    const { id: customer } = await payingCustomer(stub.stripe);
    const price = await priceId(stub.stripe, 'reading_seat_yearly');
    const { id } = await stub.stripe.subscriptions.create({
      customer,
      items: [{ price, quantity: 4 }],
    });
    expect(await gateway.readPlan(id)).toEqual({
      status: 'active',
      interval: 'year',
      trialEndsAt: null,
      renewsAt: new Date(Date.UTC(2027, 0, 31, 9, 30)),
      cancelsAt: null,
      hasPaymentMethod: true,
      seats: [{ kind: 'reading', quantity: 4, unitPrice: { amount: 19_000, currency: 'EUR' } }],
    });
    const [invoice] = await gateway.listInvoices(customer);
    expect(invoice.total).toEqual({ amount: 76_000, currency: 'EUR' });
    expect([invoice.status, invoice.createdAt]).toEqual(['paid', new Date(made)]);
  });

  it('turns a refusal into billing-unavailable, keeps its cause, and never prints the key', async () => {
    const refused = new StripeGateway({ secretKey: 'sk_live_wrong_1234567890', apiUrl: stub.url });
    const error: unknown = await refused
      .listInvoices('cus_none')
      .catch((caught: unknown) => caught);
    expect(error).toBeInstanceOf(AppError);
    expect((error as AppError).slug).toBe('billing-unavailable');
    expect((error as AppError).cause).toEqual(jasmine.objectContaining({ statusCode: 401 }));
    expect(inspect(error, { depth: 8 })).not.toContain('sk_live_wrong_1234567890');
  });

  it('names a subscription that is not there as unavailable, as the provider does', async () => {
    const cause = await failureOf(stub.stripe.subscriptions.retrieve('sub_none'));
    await expectAsync(gateway.readPlan('sub_none')).toBeRejectedWith(
      jasmine.objectContaining({
        slug: 'billing-unavailable',
        cause: jasmine.objectContaining({ message: cause.message }),
      }),
    );
  });
});
