import { periodFrom, type Period } from './billing-period';
import { prices } from './catalogue';
import { longId } from './ids';
import { badRequest, noSuch, notInStub } from './stripe-failure';
import { newItem } from './subscription-item';
import type { NewSubscription } from './subscription-params';
import { fullList, type WireCustomer, type WirePrice, type WireSubscription } from './wire';

interface ChosenItem {
  readonly price: WirePrice;
  readonly quantity: number;
  readonly metadata: Record<string, string>;
}

/** Builds the subscription that was asked for; its first invoice is the caller's to make. */
export function newSubscription(
  given: NewSubscription,
  customer: WireCustomer,
  now: number,
): WireSubscription {
  const chosen = chosenItems(given);
  const trialEnd = given.trial_period_days == null ? null : now + given.trial_period_days * 86_400;
  const atTrialEnd = missingCardBehaviour(given, customer, trialEnd);
  const anchor = trialEnd ?? now;
  const period: Period =
    trialEnd === null ? periodFrom(now, chosen[0].price, 0) : { start: now, end: trialEnd };
  const id = longId('sub_');
  const items = chosen.map((item) => newItem({ ...item, subscription: id, created: now, period }));
  return {
    ...untouchedParts(),
    id,
    object: 'subscription',
    billing_cycle_anchor: anchor,
    collection_method: 'charge_automatically',
    created: now,
    currency: 'eur',
    customer: customer.id,
    description: given.description ?? null,
    items: fullList(items, `/v1/subscription_items?subscription=${id}`),
    latest_invoice: null,
    livemode: false,
    metadata: given.metadata ?? {},
    start_date: now,
    status: trialEnd === null ? 'active' : 'trialing',
    trial_end: trialEnd,
    trial_settings: {
      end_behavior: { billing_cycle_anchor: null, missing_payment_method: atTrialEnd },
    },
    trial_start: trialEnd === null ? null : now,
  };
}

function chosenItems(given: NewSubscription): readonly ChosenItem[] {
  if (given.currency != null && given.currency.toLowerCase() !== 'eur') {
    throw badRequest(
      `The prices are in eur; found the currency ${given.currency}`,
      'currency',
      'currency_mismatch',
    );
  }
  if (!given.items || given.items.length === 0) {
    throw badRequest('Missing required param: items.', 'items', 'parameter_missing');
  }
  if (given.items.length > 20) {
    throw badRequest('A subscription holds at most 20 items.', 'items');
  }
  const chosen = given.items.map((item, index) => {
    const path = `items[${index}][price]`;
    if (!item.price)
      throw badRequest(`Missing required param: ${path}.`, path, 'parameter_missing');
    const price = prices.find((entry) => entry.id === item.price);
    if (price === undefined) throw noSuch('price', item.price, path);
    return { price, quantity: item.quantity ?? 1, metadata: item.metadata ?? {} };
  });
  chosen.forEach((item, index) => {
    const path = `items[${index}][price]`;
    if (chosen.findIndex((other) => other.price.id === item.price.id) < index) {
      throw badRequest(
        `Cannot add multiple subscription items with the same plan: ${item.price.id}`,
        path,
      );
    }
    if (item.price.recurring?.interval !== chosen[0].price.recurring?.interval) {
      throw notInStub(path, 'two intervals in one subscription');
    }
  });
  return chosen;
}

/** Without a card, only trials that end in a pause or in cancellation are within scope. */
function missingCardBehaviour(
  given: NewSubscription,
  customer: WireCustomer,
  trialEnd: number | null,
): 'pause' | 'cancel' | 'create_invoice' {
  const hasCard = customer.invoice_settings.default_payment_method !== null;
  const chosen =
    given.trial_settings?.end_behavior?.missing_payment_method ?? ('create_invoice' as const);
  if (hasCard) return chosen;
  if (trialEnd === null) {
    throw badRequest(
      'This customer has no attached payment source or default payment method. ' +
        'Please consider adding a default payment method.',
      undefined,
      'resource_missing',
    );
  }
  if (chosen === 'create_invoice') {
    throw notInStub('trial_settings[end_behavior][missing_payment_method]', 'create_invoice');
  }
  return chosen;
}

/** Parts that nothing in the stub changes yet. */
function untouchedParts() {
  return {
    application: null,
    application_fee_percent: null,
    automatic_tax: { disabled_reason: null, enabled: false, liability: null },
    billing_cycle_anchor_config: null,
    billing_mode: { flexible: { proration_discounts: 'included' }, type: 'flexible' },
    billing_schedules: [],
    billing_thresholds: null,
    cancel_at: null,
    cancel_at_period_end: false,
    canceled_at: null,
    cancellation_details: { comment: null, feedback: null, feedback_option: null, reason: null },
    customer_account: null,
    days_until_due: null,
    default_payment_method: null,
    default_source: null,
    default_tax_rates: [],
    discounts: [],
    ended_at: null,
    invoice_settings: {
      account_tax_ids: null,
      custom_fields: null,
      description: null,
      footer: null,
      issuer: { type: 'self' },
    },
    managed_payments: null,
    next_pending_invoice_item_invoice: null,
    on_behalf_of: null,
    pause_collection: null,
    payment_settings: {
      payment_method_options: null,
      payment_method_types: null,
      save_default_payment_method: 'off',
    },
    pending_invoice_item_interval: null,
    pending_setup_intent: null,
    pending_update: null,
    schedule: null,
    test_clock: null,
    transfer_data: null,
  } satisfies Partial<WireSubscription>;
}
