import Stripe from 'stripe';
import { Unavailable } from '../errors/app-error';
import {
  type BillingInterval,
  type BoughtSeats,
  type Invoice,
  type Money,
  type NextInvoice,
  type Plan,
  type SeatKind,
  seatKinds,
} from './plan';

export interface StripeGatewayOptions {
  readonly secretKey: string;
  /** Scheme, host and port to call instead of the provider's own. */
  readonly apiUrl?: string;
}

export interface TrialRequest {
  readonly customerId: string;
  readonly workspaceId: string;
  readonly quantities: Readonly<Record<SeatKind, number>>;
  readonly trialDays: number;
}

/** The version that the SDK's types describe; an update of the SDK that moves on does not compile. */
const apiVersion: Stripe.LatestApiVersion = '2026-10-28.endive';
const timeoutMs = 10_000;
const listedInvoices = 24;
const intervals: readonly BillingInterval[] = ['month', 'year'];

/** Statuses after which another period follows by itself. */
const renewing: readonly string[] = ['trialing', 'active', 'past_due'];

/** The payment provider. The only place that knows its SDK; its failures leave as `billing-unavailable`. */
export class StripeGateway {
  readonly #stripe: Stripe;

  constructor(options: StripeGatewayOptions) {
    this.#stripe = new Stripe(options.secretKey, {
      apiVersion,
      maxNetworkRetries: 2,
      timeout: timeoutMs,
      telemetry: false,
      ...(options.apiUrl === undefined ? {} : address(new URL(options.apiUrl))),
    });
  }

  /** Makes a customer, or finds the one made under this key. */
  async createCustomer(
    workspace: { readonly id: string; readonly name: string },
    idempotencyKey: string,
  ): Promise<string> {
    const customer = await answered(() =>
      this.#stripe.customers.create(
        { name: workspace.name, metadata: { workspace: workspace.id } },
        { idempotencyKey },
      ),
    );
    return customer.id;
  }

  /**
   * Starts a monthly trial without a card, or finds the one started under this key. Where no payment method has come by
   * its end, the subscription pauses.
   */
  async createTrial(request: TrialRequest, idempotencyKey: string): Promise<string> {
    const prices = await this.#monthlyPrices();
    const subscription = await answered(() =>
      this.#stripe.subscriptions.create(
        {
          customer: request.customerId,
          items: seatKinds.map((kind) => ({
            price: prices[kind],
            quantity: request.quantities[kind],
          })),
          trial_period_days: request.trialDays,
          trial_settings: { end_behavior: { missing_payment_method: 'pause' } },
          metadata: { workspace: request.workspaceId },
        },
        { idempotencyKey },
      ),
    );
    return subscription.id;
  }

  async readPlan(subscriptionId: string): Promise<Plan> {
    const subscription = await answered(() =>
      this.#stripe.subscriptions.retrieve(subscriptionId, { expand: ['customer'] }),
    );
    return toPlan(subscription);
  }

  /** The next invoice as things stand; null when the provider expects none. */
  async previewNextInvoice(subscriptionId: string): Promise<NextInvoice | null> {
    const invoice = await answered(async () => {
      try {
        return await this.#stripe.invoices.createPreview({ subscription: subscriptionId });
      } catch (error) {
        if (error instanceof Stripe.errors.StripeError && error.code === 'invoice_upcoming_none')
          return null;
        throw error;
      }
    });
    if (invoice === null) return null;
    return {
      dueAt: toDate(invoice.next_payment_attempt ?? invoice.period_end),
      total: toMoney(invoice.total, invoice.currency),
      lines: invoice.lines.data.map((line) => ({
        description: line.description ?? '',
        amount: toMoney(line.amount, line.currency),
      })),
    };
  }

  /** The newest invoices, newest first. */
  async listInvoices(customerId: string): Promise<readonly Invoice[]> {
    const { data } = await answered(() =>
      this.#stripe.invoices.list({ customer: customerId, limit: listedInvoices }),
    );
    return data.map((invoice) => ({
      id: invoice.id,
      number: invoice.number,
      status: invoice.status ?? 'draft',
      createdAt: toDate(invoice.created),
      total: toMoney(invoice.total, invoice.currency),
    }));
  }

  async #monthlyPrices(): Promise<Readonly<Record<SeatKind, string>>> {
    const { data } = await answered(() =>
      this.#stripe.prices.list({
        active: true,
        lookup_keys: seatKinds.map((kind) => lookupKey(kind, 'month')),
      }),
    );
    const priceOf = (kind: SeatKind): string => {
      const key = lookupKey(kind, 'month');
      const price = data.find((entry) => entry.lookup_key === key);
      if (price === undefined)
        throw new Error(`expected an active price with the lookup key ${key}; found none`);
      return price.id;
    };
    return { analyst: priceOf('analyst'), reading: priceOf('reading') };
  }
}

function toPlan(subscription: Stripe.Subscription): Plan {
  const items = subscription.items.data;
  const first = items[0];
  if (first === undefined)
    throw new Error(`expected items in the subscription ${subscription.id}; found none`);
  const periodEnd = first.current_period_end;
  const cancelsAt =
    subscription.cancel_at ?? (subscription.cancel_at_period_end ? periodEnd : null);
  const isRenewing = renewing.includes(subscription.status) && cancelsAt === null;
  return {
    status: subscription.status,
    interval: toInterval(first.price),
    trialEndsAt:
      subscription.status === 'trialing' && subscription.trial_end !== null
        ? toDate(subscription.trial_end)
        : null,
    renewsAt: isRenewing ? toDate(periodEnd) : null,
    cancelsAt: cancelsAt === null ? null : toDate(cancelsAt),
    hasPaymentMethod: hasPaymentMethod(subscription),
    seats: items.flatMap((item) => toBoughtSeats(item)),
  };
}

/** Items of other things than seats are none of the Seats page's. */
function toBoughtSeats({ price, quantity }: Stripe.SubscriptionItem): readonly BoughtSeats[] {
  const interval = toInterval(price);
  const kind = seatKinds.find((seat) => price.lookup_key === lookupKey(seat, interval));
  if (kind === undefined) return [];
  const unitPrice = price.unit_amount === null ? null : toMoney(price.unit_amount, price.currency);
  return [{ kind, quantity: quantity ?? 0, unitPrice }];
}

/** A method of the subscription's own, or else the customer's. */
function hasPaymentMethod(subscription: Stripe.Subscription): boolean {
  const { customer } = subscription;
  if (subscription.default_payment_method !== null || subscription.default_source !== null)
    return true;
  if (typeof customer === 'string' || customer.deleted === true) return false;
  return (
    customer.invoice_settings.default_payment_method !== null || customer.default_source !== null
  );
}

function lookupKey(kind: SeatKind, interval: BillingInterval): string {
  return `${kind}_seat_${interval}ly`;
}

function toInterval(price: Stripe.Price): BillingInterval {
  const interval = intervals.find((known) => known === price.recurring?.interval);
  if (interval === undefined)
    throw new Error(`expected a monthly or yearly price; found ${price.id}`);
  return interval;
}

function toMoney(amount: number, currency: string): Money {
  return { amount, currency: currency.toUpperCase() };
}

function toDate(unixSeconds: number): Date {
  return new Date(unixSeconds * 1000);
}

function address(url: URL): Pick<Stripe.StripeConfig, 'host' | 'port' | 'protocol'> {
  const protocol = url.protocol === 'http:' ? 'http' : 'https';
  const port = url.port === '' ? (protocol === 'http' ? 80 : 443) : Number(url.port);
  return { host: url.hostname, port, protocol };
}

/** @throws {Unavailable} `billing-unavailable` when the provider does not answer or refuses. */
async function answered<T>(call: () => Promise<T>): Promise<T> {
  try {
    return await call();
  } catch (error) {
    if (!(error instanceof Stripe.errors.StripeError)) throw error;
    throw new Unavailable(
      'The payment provider did not answer as expected. Nothing was changed; try again in a moment.',
      'billing-unavailable',
      10,
      { cause: error },
    );
  }
}
