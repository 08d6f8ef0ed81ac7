import Stripe from 'stripe';
import { failureOf, second, startStub, type RunningStub } from './testing/running-stub';

describe('idempotency keys in the Stripe stub', () => {
  let stub: RunningStub;
  let stripe: Stripe;
  let now: number;

  beforeEach(async () => {
    now = second;
    stub = await startStub({ now: () => now });
    stripe = stub.stripe;
  });
  afterEach(() => stub.stop());

  const count = async (): Promise<number> => (await stripe.customers.list()).data.length;

  it('replays the first answer to the same key and parameters', async () => {
    const first = await stripe.customers.create({ name: 'Velmara' }, { idempotencyKey: 'k1' });
    await stripe.customers.update(first.id, { name: 'Velmara group' });
    const again = await stripe.customers.create({ name: 'Velmara' }, { idempotencyKey: 'k1' });
    expect(again.id).toBe(first.id);
    expect(again.name).toBe('Velmara');
    expect(first.lastResponse.headers['idempotent-replayed']).toBeUndefined();
    expect(again.lastResponse.headers['idempotent-replayed']).toBe('true');
    expect(await count()).toBe(1);
  });

  it('makes one customer of twenty parallel requests under one key', async () => {
    const made = await Promise.all(
      Array.from({ length: 20 }, () => stripe.customers.create({}, { idempotencyKey: 'k1' })),
    );
    expect(new Set(made.map(({ id }) => id)).size).toBe(1);
    expect(await count()).toBe(1);
  });

  it('refuses the key for other parameters or another operation', async () => {
    const { id } = await stripe.customers.create({ name: 'Velmara' }, { idempotencyKey: 'k1' });
    for (const call of [
      stripe.customers.create({ name: 'Tolvane' }, { idempotencyKey: 'k1' }),
      stripe.customers.update(id, { name: 'Velmara' }, { idempotencyKey: 'k1' }),
    ]) {
      const failure = await failureOf(call);
      expect(failure).toBeInstanceOf(Stripe.errors.StripeIdempotencyError);
      expect(failure.statusCode).toBe(400);
    }
  });

  it('does not keep a refusal, so that a corrected request may use the key', async () => {
    await failureOf(stripe.customers.create({ email: 'nobody' }, { idempotencyKey: 'k1' }));
    const made = await stripe.customers.create(
      { email: 'billing@velmara.example' },
      { idempotencyKey: 'k1' },
    );
    expect(made.email).toBe('billing@velmara.example');
  });

  it('forgets a key after a day', async () => {
    const first = await stripe.customers.create({}, { idempotencyKey: 'k1' });
    now += 86_400;
    const later = await stripe.customers.create({}, { idempotencyKey: 'k1' });
    expect(later.id).not.toBe(first.id);
  });
});
