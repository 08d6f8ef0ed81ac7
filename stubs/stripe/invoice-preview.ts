import type Stripe from 'stripe';
import { periodAfter } from './billing-period';
import { customerOf } from './customers';
import { listOf, nested, readParams, text, unsupported, word, type Shape } from './form-params';
import { longId } from './ids';
import { draftInvoice } from './invoice';
import { invoiceLine } from './invoice-line';
import type { Call } from './route';
import { badRequest, notInStub, StripeFailure } from './stripe-failure';
import { subscriptionOf } from './subscriptions';
import { idOf, type WireInvoice } from './wire';

/** Everything that would change the subscription first is outside the stub's scope. */
const changes = nested({
  billing_cycle_anchor: unsupported,
  billing_mode: unsupported,
  billing_schedules: unsupported,
  cancel_at: unsupported,
  cancel_at_period_end: unsupported,
  cancel_now: unsupported,
  default_tax_rates: unsupported,
  items: unsupported,
  metadata: unsupported,
  pause: unsupported,
  proration_behavior: unsupported,
  proration_date: unsupported,
  resume_at: unsupported,
  start_date: unsupported,
  trial_end: unsupported,
} satisfies Shape<Stripe.InvoiceCreatePreviewParams.SubscriptionDetails>);

const createPreview = {
  automatic_tax: unsupported,
  currency: unsupported,
  customer: text,
  customer_account: unsupported,
  customer_details: unsupported,
  discounts: unsupported,
  expand: listOf(text),
  invoice_items: unsupported,
  issuer: unsupported,
  on_behalf_of: unsupported,
  preview_mode: word(['next'], ['recurring']),
  schedule: unsupported,
  schedule_details: unsupported,
  subscription: text,
  subscription_details: changes,
} satisfies Shape<Stripe.InvoiceCreatePreviewParams>;

/** The next renewal invoice as things stand: one line an item, quantity × unit amount. */
export function previewRenewal({ form, state }: Call): WireInvoice {
  const given = readParams(createPreview, form);
  if (!given.subscription) {
    throw notInStub('subscription', 'a preview without a subscription');
  }
  const subscription = subscriptionOf(state, given.subscription, 'subscription');
  const owner = idOf(subscription.customer);
  if (given.customer && given.customer !== owner) {
    throw badRequest(`The subscription does not belong to ${given.customer}`, 'customer');
  }
  if (subscription.status !== 'active' && subscription.status !== 'trialing') {
    throw new StripeFailure(
      404,
      'invalid_request_error',
      `No upcoming invoices for customer: ${owner}`,
      { code: 'invoice_upcoming_none' },
    );
  }
  const id = longId('upcoming_in_');
  const items = subscription.items.data;
  return draftInvoice({
    id,
    customer: customerOf(state, owner),
    subscription,
    lines: items.map((item) => {
      const anchor = subscription.billing_cycle_anchor;
      const period = periodAfter(anchor, item.price, item.current_period_end);
      return invoiceLine({ item, invoice: id, period, isTrial: false, idPrefix: 'il_tmp_' });
    }),
    reason: 'upcoming',
    created: items[0].current_period_end,
    periodStart: items[0].current_period_start,
    periodEnd: items[0].current_period_end,
  });
}
