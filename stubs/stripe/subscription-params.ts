import type Stripe from 'stripe';
import {
  listOf,
  metadata,
  nested,
  text,
  unsupported,
  whole,
  word,
  type Read,
  type Shape,
} from './form-params';
import { pageParams } from './page';

const item = nested({
  billing_thresholds: unsupported,
  current_trial: unsupported,
  discounts: unsupported,
  metadata,
  plan: unsupported,
  price: text,
  price_data: unsupported,
  quantity: whole(0, 999_999),
  tax_rates: unsupported,
} satisfies Shape<Stripe.SubscriptionCreateParams.Item>);

const billingMode = nested({
  flexible: unsupported,
  type: word(['flexible'], ['classic']),
} satisfies Shape<Stripe.SubscriptionCreateParams.BillingMode>);

const trialSettings = nested({
  end_behavior: nested({
    billing_cycle_anchor: unsupported,
    missing_payment_method: word(['pause', 'cancel', 'create_invoice']),
  } satisfies Shape<Stripe.SubscriptionCreateParams.TrialSettings.EndBehavior>),
} satisfies Shape<Stripe.SubscriptionCreateParams.TrialSettings>);

export const createSubscription = {
  add_invoice_items: unsupported,
  application_fee_percent: unsupported,
  automatic_tax: unsupported,
  backdate_start_date: unsupported,
  billing_cycle_anchor: unsupported,
  billing_cycle_anchor_config: unsupported,
  billing_mode: billingMode,
  billing_schedules: unsupported,
  billing_thresholds: unsupported,
  cancel_at: unsupported,
  cancel_at_period_end: unsupported,
  collection_method: word(['charge_automatically'], ['send_invoice']),
  currency: text,
  customer: text,
  customer_account: unsupported,
  days_until_due: unsupported,
  default_payment_method: unsupported,
  default_source: unsupported,
  default_tax_rates: unsupported,
  description: text,
  discounts: unsupported,
  expand: listOf(text),
  invoice_settings: unsupported,
  items: listOf(item),
  metadata,
  off_session: unsupported,
  on_behalf_of: unsupported,
  payment_behavior: word(
    ['allow_incomplete', 'error_if_incomplete'],
    ['default_incomplete', 'pending_if_incomplete'],
  ),
  payment_settings: unsupported,
  pending_invoice_item_interval: unsupported,
  proration_behavior: unsupported,
  transfer_data: unsupported,
  trial_end: unsupported,
  trial_from_plan: unsupported,
  trial_period_days: whole(1, 730),
  trial_settings: trialSettings,
} satisfies Shape<Stripe.SubscriptionCreateParams>;

export type NewSubscription = Read<typeof createSubscription>;

export const retrieveSubscription = {
  expand: listOf(text),
} satisfies Shape<Stripe.SubscriptionRetrieveParams>;

export const listSubscriptions = {
  ...pageParams,
  automatic_tax: unsupported,
  collection_method: unsupported,
  created: unsupported,
  current_period_end: unsupported,
  current_period_start: unsupported,
  customer: text,
  customer_account: unsupported,
  expand: listOf(text),
  plan: unsupported,
  price: unsupported,
  status: word([
    'active',
    'all',
    'canceled',
    'ended',
    'incomplete',
    'incomplete_expired',
    'past_due',
    'paused',
    'trialing',
    'unpaid',
  ]),
  test_clock: unsupported,
} satisfies Shape<Stripe.SubscriptionListParams>;
