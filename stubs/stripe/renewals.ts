import { periodAfter } from './billing-period';
import { customerOf } from './customers';
import { longId } from './ids';
import { draftInvoice, payInFull } from './invoice';
import { invoiceLine } from './invoice-line';
import type { StubState } from './store';
import { idOf, type WireSubscription } from './wire';

/**
 * Lets time pass: each period that has ended is renewed and paid an hour later, as the one test
 * card always pays; a trial without a card ends as its trial settings say. Idle when nothing is due.
 */
export function passTime(state: StubState, now: number): void {
  for (const subscription of Object.values(state.subscriptions)) {
    while (isDue(subscription, now)) endPeriod(state, subscription);
  }
}

/** Whether {@link passTime} would change anything. */
export function isAnythingDue(state: StubState, now: number): boolean {
  return Object.values(state.subscriptions).some((subscription) => isDue(subscription, now));
}

function isDue(subscription: WireSubscription, now: number): boolean {
  const isRunning = subscription.status === 'active' || subscription.status === 'trialing';
  return isRunning && subscription.items.data[0].current_period_end <= now;
}

function endPeriod(state: StubState, subscription: WireSubscription): void {
  const customer = customerOf(state, idOf(subscription.customer));
  const end = subscription.items.data[0].current_period_end;
  if (customer.invoice_settings.default_payment_method !== null) {
    renew(state, subscription, end);
  } else if (subscription.trial_settings?.end_behavior.missing_payment_method === 'pause') {
    subscription.status = 'paused';
  } else {
    subscription.status = 'canceled';
    subscription.canceled_at = end;
    subscription.ended_at = end;
  }
}

function renew(state: StubState, subscription: WireSubscription, end: number): void {
  const customer = customerOf(state, idOf(subscription.customer));
  const id = longId('in_');
  const items = subscription.items.data;
  const invoice = draftInvoice({
    id,
    customer,
    subscription,
    lines: items.map((item) => {
      const period = periodAfter(subscription.billing_cycle_anchor, item.price, end);
      return invoiceLine({ item, invoice: id, period, isTrial: false, idPrefix: 'il_' });
    }),
    reason: 'subscription_cycle',
    created: end,
    periodStart: items[0].current_period_start,
    periodEnd: end,
  });
  payInFull(invoice, customer, end + 3_600);
  for (const item of items) {
    const period = periodAfter(subscription.billing_cycle_anchor, item.price, end);
    item.current_period_start = period.start;
    item.current_period_end = period.end;
  }
  subscription.status = 'active';
  subscription.latest_invoice = id;
  state.invoices[id] = invoice;
}
