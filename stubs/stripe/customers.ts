import { createCustomer, listCustomers, retrieveCustomer, updateCustomer } from './customer-params';
import { readParams, type Read } from './form-params';
import { invoicePrefix, shortId } from './ids';
import { pageOf } from './page';
import { attachTestCard, requireAttached } from './payment-methods';
import type { Call, Route } from './route';
import type { StubState } from './store';
import { badRequest, noSuch } from './stripe-failure';
import type { WireCustomer } from './wire';

/** The customer of that id, or Stripe's 404. */
export function customerOf(state: StubState, id: string, param = 'id'): WireCustomer {
  if (!Object.hasOwn(state.customers, id)) throw noSuch('customer', id, param);
  return state.customers[id];
}

export const customerRoutes: readonly Route[] = [
  { method: 'post', path: '/v1/customers', run: create },
  {
    method: 'get',
    path: '/v1/customers',
    run: ({ form, state }) => {
      const wanted = readParams(listCustomers, form);
      const found = Object.values(state.customers).filter(
        (customer) => wanted.email == null || customer.email === wanted.email,
      );
      return pageOf(found, wanted, '/v1/customers');
    },
  },
  {
    method: 'get',
    path: '/v1/customers/:id',
    run: ({ form, ids, state }) => {
      readParams(retrieveCustomer, form);
      return customerOf(state, ids['id']);
    },
  },
  { method: 'post', path: '/v1/customers/:id', run: update },
];

function create({ form, state, now }: Call): WireCustomer {
  const given = readParams(createCustomer, form);
  const customer = emptyCustomer(now);
  state.customers[customer.id] = customer;
  const card = given.payment_method
    ? attachTestCard(state, customer.id, given.payment_method)
    : undefined;
  const wanted = given.invoice_settings?.default_payment_method;
  const isCardJustAttached = card !== undefined && wanted === given.payment_method;
  write(customer, given, state, isCardJustAttached ? card : wanted);
  return customer;
}

function update({ form, ids, state }: Call): WireCustomer {
  const given = readParams(updateCustomer, form);
  const customer = customerOf(state, ids['id']);
  write(customer, given, state, given.invoice_settings?.default_payment_method);
  return customer;
}

/** Writes what was sent and leaves the rest; an empty value unsets. */
function write(
  customer: WireCustomer,
  given: Read<typeof updateCustomer>,
  state: StubState,
  defaultCard: string | null | undefined,
): void {
  if (given.email != null && !/^[^@\s]+@[^@\s]+$/.test(given.email)) {
    throw badRequest(`Invalid email address: ${given.email}`, 'email', 'email_invalid');
  }
  if (given.email !== undefined) customer.email = given.email;
  if (given.name !== undefined) customer.name = given.name;
  if (given.phone !== undefined) customer.phone = given.phone;
  if (given.description !== undefined) customer.description = given.description;
  if (given.preferred_locales !== undefined) {
    customer.preferred_locales = given.preferred_locales ?? [];
  }
  if (given.address !== undefined) {
    customer.address = given.address === null ? null : { ...emptyAddress, ...given.address };
  }
  if (given.metadata !== undefined) {
    customer.metadata = mergedMetadata(customer.metadata, given.metadata);
  }
  if (defaultCard !== undefined) {
    if (defaultCard !== null) requireAttached(state, customer.id, defaultCard);
    customer.invoice_settings.default_payment_method = defaultCard;
  }
}

/** Stripe's merge: a sent key replaces, an empty value removes the key, an empty map removes all. */
function mergedMetadata(
  before: Record<string, string>,
  sent: Record<string, string> | null,
): Record<string, string> {
  if (sent === null) return {};
  return Object.fromEntries(Object.entries({ ...before, ...sent }).filter(([, v]) => v !== ''));
}

const emptyAddress = {
  city: null,
  country: null,
  line1: null,
  line2: null,
  postal_code: null,
  state: null,
};

function emptyCustomer(now: number): WireCustomer {
  return {
    id: shortId('cus_'),
    object: 'customer',
    address: null,
    balance: 0,
    created: now,
    currency: null,
    default_source: null,
    delinquent: false,
    description: null,
    discount: null,
    email: null,
    invoice_prefix: invoicePrefix(),
    invoice_settings: {
      custom_fields: null,
      default_payment_method: null,
      footer: null,
      rendering_options: null,
    },
    livemode: false,
    metadata: {},
    name: null,
    next_invoice_sequence: 1,
    phone: null,
    preferred_locales: [],
    shipping: null,
    tax_exempt: 'none',
    test_clock: null,
  };
}
