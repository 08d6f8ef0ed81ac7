import type Stripe from 'stripe';
import type { Period } from './billing-period';
import { shortId } from './ids';
import type { Wire, WirePrice, WireSubscriptionItem } from './wire';

interface NewItem {
  readonly subscription: string;
  readonly price: WirePrice;
  readonly quantity: number;
  readonly metadata: Record<string, string>;
  readonly created: number;
  readonly period: Period;
}

/** One line of a subscription; its period is the item's own, as current versions of the API have it. */
export function newItem(item: NewItem): WireSubscriptionItem {
  return {
    id: shortId('si_'),
    object: 'subscription_item',
    billing_thresholds: null,
    created: item.created,
    current_period_end: item.period.end,
    current_period_start: item.period.start,
    current_trial: null,
    discounts: [],
    metadata: item.metadata,
    plan: planOf(item.price),
    price: item.price,
    quantity: item.quantity,
    subscription: item.subscription,
    tax_rates: [],
  };
}

/** The older view of a price, which the API still sends beside it. */
function planOf(price: WirePrice): Wire<Stripe.Plan> {
  return {
    id: price.id,
    object: 'plan',
    active: price.active,
    amount: price.unit_amount,
    amount_decimal: price.unit_amount_decimal,
    billing_scheme: price.billing_scheme,
    created: price.created,
    currency: price.currency,
    interval: price.recurring?.interval ?? 'month',
    interval_count: price.recurring?.interval_count ?? 1,
    livemode: false,
    metadata: price.metadata,
    meter: null,
    nickname: price.nickname,
    product: price.product,
    tiers_mode: null,
    transform_usage: null,
    trial_period_days: null,
    usage_type: 'licensed',
  };
}
