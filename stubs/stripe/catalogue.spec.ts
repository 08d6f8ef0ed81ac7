import type Stripe from 'stripe';
import { failureOf, priceId, startStub, type RunningStub } from './testing/running-stub';
import { idOf } from './wire';

describe('prices and products in the Stripe stub', () => {
  let stub: RunningStub;

  beforeAll(async () => {
    stub = await startStub();
  });
  afterAll(() => stub.stop());

  it('sells each kind of seat by the month and by the year, in euro', async () => {
    const { data } = await stub.stripe.prices.list({
      lookup_keys: [
        'analyst_seat_monthly',
        'analyst_seat_yearly',
        'reading_seat_monthly',
        'reading_seat_yearly',
      ],
      active: true,
    });
    expect(new Set(data.map((price) => price.lookup_key)).size).toBe(4);
    for (const price of data) {
      expect(price.id).toMatch(/^price_1[0-9A-Za-z]{23}$/);
      expect(price.currency).toBe('eur');
      expect(price.recurring?.usage_type).toBe('licensed');
      expect(price.unit_amount_decimal?.toNumber()).toBe(price.unit_amount ?? NaN);
    }
  });

  it('finds nothing under an unknown lookup key or among inactive prices', async () => {
    const { prices } = stub.stripe;
    expect((await prices.list({ lookup_keys: ['gold_seat'] })).data).toEqual([]);
    expect((await prices.list({ active: false })).data).toEqual([]);
  });

  it('retrieves a price and its product, together when asked to expand', async () => {
    const id = await priceId(stub.stripe, 'reading_seat_yearly');
    const price = await stub.stripe.prices.retrieve(id);
    const product = await stub.stripe.products.retrieve(idOf(price.product));
    expect(product.id).toMatch(/^prod_[0-9A-Za-z]{14}$/);
    expect(product.name).toBe('Reading seat');

    const whole = await stub.stripe.prices.retrieve(id, { expand: ['product'] });
    expect((whole.product as Stripe.Product).name).toBe('Reading seat');
  });

  it('answers 404 for an unknown price and 400 for a property that cannot be expanded', async () => {
    const unknown = await failureOf(stub.stripe.prices.retrieve('price_none'));
    expect(unknown.code).toBe('resource_missing');
    const id = await priceId(stub.stripe, 'reading_seat_yearly');
    const wrong = await failureOf(stub.stripe.prices.retrieve(id, { expand: ['currency'] }));
    expect(wrong.statusCode).toBe(400);
  });
});
