import { customerOf } from './customers';
import { readParams } from './form-params';
import { longId } from './ids';
import { draftInvoice, payInFull } from './invoice';
import { invoiceLine } from './invoice-line';
import { newSubscription } from './new-subscription';
import { pageOf } from './page';
import type { Call, Route } from './route';
import type { StubState } from './store';
import { badRequest, noSuch } from './stripe-failure';
import { createSubscription, listSubscriptions, retrieveSubscription } from './subscription-params';
import type { WireSubscription } from './wire';

/** The subscription of that id, or Stripe's 404. */
export function subscriptionOf(state: StubState, id: string, param = 'id'): WireSubscription {
  if (!Object.hasOwn(state.subscriptions, id)) throw noSuch('subscription', id, param);
  return state.subscriptions[id];
}

export const subscriptionRoutes: readonly Route[] = [
  { method: 'post', path: '/v1/subscriptions', run: create },
  { method: 'get', path: '/v1/subscriptions', run: list },
  {
    method: 'get',
    path: '/v1/subscriptions/:id',
    run: ({ form, ids, state }) => {
      readParams(retrieveSubscription, form);
      return subscriptionOf(state, ids['id']);
    },
  },
];

function create({ form, state, now }: Call): WireSubscription {
  const given = readParams(createSubscription, form);
  if (!given.customer) {
    throw badRequest('Missing required param: customer.', 'customer', 'parameter_missing');
  }
  const customer = customerOf(state, given.customer, 'customer');
  const subscription = newSubscription(given, customer, now);
  const id = longId('in_');
  const isTrial = subscription.status === 'trialing';
  const invoice = draftInvoice({
    id,
    customer,
    subscription,
    lines: subscription.items.data.map((item) => {
      const period = { start: item.current_period_start, end: item.current_period_end };
      return invoiceLine({ item, invoice: id, period, isTrial, idPrefix: 'il_' });
    }),
    reason: 'subscription_create',
    created: now,
    periodStart: now,
    periodEnd: now,
  });
  payInFull(invoice, customer, now);
  subscription.latest_invoice = id;
  state.invoices[id] = invoice;
  state.subscriptions[subscription.id] = subscription;
  return subscription;
}

/** Without a status Stripe lists everything that is not cancelled. */
function list({ form, state }: Call) {
  const wanted = readParams(listSubscriptions, form);
  const hasStatus = (status: string): boolean => {
    if (wanted.status == null) return status !== 'canceled';
    if (wanted.status === 'all') return true;
    if (wanted.status === 'ended') return status === 'canceled' || status === 'incomplete_expired';
    return status === wanted.status;
  };
  const found = Object.values(state.subscriptions).filter(
    (entry) =>
      hasStatus(entry.status) && (wanted.customer == null || entry.customer === wanted.customer),
  );
  return pageOf(found, wanted, '/v1/subscriptions');
}
