import { once } from 'node:events';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import Stripe from 'stripe';
import { createStripeStub, type StripeStubOptions } from '../stripe-stub';

/** A stub that listens on a free port, and the real SDK pointed at it. */
export interface RunningStub {
  readonly stripe: Stripe;
  readonly url: string;
  readonly stop: () => Promise<void>;
}

export async function startStub(options: StripeStubOptions = {}): Promise<RunningStub> {
  const server = createServer(createStripeStub(options));
  // Exclusive: spec processes that run at once would share one port.
  server.listen({ port: 0, host: '127.0.0.1', exclusive: true });
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  return {
    stripe: sdkFor(port),
    url: `http://127.0.0.1:${port}`,
    stop: async () => {
      server.close();
      server.closeAllConnections();
      await once(server, 'close');
    },
  };
}

export function sdkFor(port: number): Stripe {
  return new Stripe('sk_test_local', {
    host: '127.0.0.1',
    port,
    protocol: 'http',
    telemetry: false,
  });
}

/** The price of that lookup key, asked of the stub itself. */
export async function priceId(stripe: Stripe, lookupKey: string): Promise<string> {
  const { data } = await stripe.prices.list({ lookup_keys: [lookupKey] });
  return data[0].id;
}

/** The error that a call of the SDK ends in; fails the spec if it succeeds. */
export async function failureOf(call: Promise<unknown>): Promise<Stripe.errors.StripeError> {
  try {
    await call;
  } catch (error) {
    if (error instanceof Stripe.errors.StripeError) return error;
    throw error;
  }
  throw new Error('expected the call to fail; it succeeded');
}

export const second = Date.UTC(2026, 0, 31, 9, 30) / 1000;

/** A customer whose card always pays. */
export function payingCustomer(stripe: Stripe): Promise<Stripe.Customer> {
  return stripe.customers.create({
    name: 'Velmara finance',
    email: 'billing@velmara.example',
    payment_method: 'pm_card_visa',
    invoice_settings: { default_payment_method: 'pm_card_visa' },
  });
}
