import type Stripe from 'stripe';
import { listOf, readParams, text, unsupported, word, type Shape } from './form-params';
import { previewRenewal } from './invoice-preview';
import { pageOf, pageParams } from './page';
import type { Route } from './route';
import type { StubState } from './store';
import { noSuch } from './stripe-failure';
import type { WireInvoice } from './wire';

const retrieve = { expand: listOf(text) } satisfies Shape<Stripe.InvoiceRetrieveParams>;
const lines = {
  ...pageParams,
  expand: listOf(text),
} satisfies Shape<Stripe.InvoiceListLineItemsParams>;
const list = {
  ...pageParams,
  collection_method: unsupported,
  created: unsupported,
  customer: text,
  customer_account: unsupported,
  due_date: unsupported,
  expand: listOf(text),
  status: word(['draft', 'open', 'paid', 'uncollectible', 'void']),
  subscription: text,
} satisfies Shape<Stripe.InvoiceListParams>;

/** The invoice of that id, or Stripe's 404. */
export function invoiceOf(state: StubState, id: string): WireInvoice {
  if (!Object.hasOwn(state.invoices, id)) throw noSuch('invoice', id);
  return state.invoices[id];
}

export const invoiceRoutes: readonly Route[] = [
  {
    method: 'get',
    path: '/v1/invoices',
    run: ({ form, state }) => {
      const wanted = readParams(list, form);
      const found = Object.values(state.invoices).filter(
        (invoice) =>
          (wanted.customer == null || invoice.customer === wanted.customer) &&
          (wanted.status == null || invoice.status === wanted.status) &&
          (wanted.subscription == null ||
            invoice.parent?.subscription_details?.subscription === wanted.subscription),
      );
      return pageOf(found, wanted, '/v1/invoices');
    },
  },
  { method: 'post', path: '/v1/invoices/create_preview', run: previewRenewal },
  {
    method: 'get',
    path: '/v1/invoices/:id',
    run: ({ form, ids, state }) => {
      readParams(retrieve, form);
      return invoiceOf(state, ids['id']);
    },
  },
  {
    method: 'get',
    path: '/v1/invoices/:id/lines',
    run: ({ form, ids, state }) => {
      const invoice = invoiceOf(state, ids['id']);
      const oldestFirst = [...invoice.lines.data].reverse();
      return pageOf(oldestFirst, readParams(lines, form), invoice.lines.url);
    },
  },
];
