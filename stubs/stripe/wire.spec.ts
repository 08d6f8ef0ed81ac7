import Stripe from 'stripe';
import { failureOf, startStub, type RunningStub } from './testing/running-stub';

describe('the wire protocol of the Stripe stub', () => {
  let stub: RunningStub;
  const authorization = 'Bearer sk_test_local';

  beforeEach(async () => {
    stub = await startStub();
  });
  afterEach(() => stub.stop());

  it('refuses a request without a test key with 401', async () => {
    for (const headers of [new Headers(), new Headers({ authorization: 'Bearer sk_live_abc' })]) {
      const reply = await fetch(`${stub.url}/v1/prices`, { headers });
      expect(reply.status).toBe(401);
      expect(reply.headers.get('request-id')).toMatch(/^req_[0-9A-Za-z]{14}$/);
    }
  });

  it('is an authentication error to the SDK when the key is not for tests', async () => {
    const failure = await failureOf(stub.stripe.prices.list({}, { apiKey: 'sk_live_abc' }));
    expect(failure).toBeInstanceOf(Stripe.errors.StripeAuthenticationError);
  });

  it('names request and version, and echoes the idempotency key, in headers', async () => {
    const reply = await fetch(`${stub.url}/v1/customers`, {
      method: 'POST',
      headers: {
        authorization,
        'idempotency-key': 'one',
        'content-type': 'application/x-www-form-urlencoded',
      },
      body: 'metadata[workspace]=w1&address[city]=Ostmark',
    });
    expect(reply.headers.get('request-id')).toMatch(/^req_/);
    expect(reply.headers.get('stripe-version')).toBe('2026-10-28.endive');
    expect(reply.headers.get('idempotency-key')).toBe('one');
    const customer = (await reply.json()) as Stripe.Customer;
    expect(customer.metadata).toEqual({ workspace: 'w1' });
    expect(customer.address?.city).toBe('Ostmark');
  });

  it('answers an unknown route with 404', async () => {
    const reply = await fetch(`${stub.url}/v1/seats`, { headers: { authorization } });
    expect(reply.status).toBe(404);
    const { error } = (await reply.json()) as { error: { type: string; message: string } };
    expect(error.type).toBe('invalid_request_error');
    expect(error.message).toBe('Unrecognized request URL (GET: /v1/seats).');
  });

  it('refuses a parameter that Stripe does not know with 400 and its name', async () => {
    const params = { seats: '3' } as Stripe.CustomerCreateParams;
    const failure = await failureOf(stub.stripe.customers.create(params));
    expect(failure).toBeInstanceOf(Stripe.errors.StripeInvalidRequestError);
    expect(failure.code).toBe('parameter_unknown');
    expect(failure.param).toBe('seats');
  });

  it('answers what it does not do with 501 naming the innermost parameter, not to be retried', async () => {
    const failure = await failureOf(
      stub.stripe.customers.create({ shipping: { name: 'Velmara', address: { line1: 'Quay 1' } } }),
    );
    expect(failure).toBeInstanceOf(Stripe.errors.StripeAPIError);
    expect(failure.statusCode).toBe(501);
    expect(failure.param).toBe('shipping[name]');
    expect(failure.headers?.['stripe-should-retry']).toBe('false');
  });

  it('does not ignore an unsupported parameter that is sent empty', async () => {
    const failure = await failureOf(stub.stripe.customers.create({ business_name: '' }));
    expect(failure.statusCode).toBe(501);
    expect(failure.param).toBe('business_name');
  });

  it('says 501, not 404, for an operation of Stripe that it has yet to learn', async () => {
    const failure = await failureOf(stub.stripe.subscriptions.cancel('sub_1'));
    expect(failure.statusCode).toBe(501);
    expect(failure.message).toContain('DELETE /v1/subscriptions/:id');
  });

  it('refuses another version of the API, naming the header', async () => {
    const failure = await failureOf(stub.stripe.prices.list({}, { apiVersion: '2020-08-27' }));
    expect(failure.statusCode).toBe(501);
    expect(failure.param).toBe('Stripe-Version');
  });

  it('refuses a body that is no form', async () => {
    const reply = await fetch(`${stub.url}/v1/customers`, {
      method: 'POST',
      headers: { authorization, 'content-type': 'application/json' },
      body: '{"name":"Velmara"}',
    });
    expect(reply.status).toBe(400);
  });
});
