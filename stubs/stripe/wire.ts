import type Stripe from 'stripe';

/** A type of the SDK as it travels in JSON: exact decimals are strings there. */
export type Wire<T> = T extends string | number | boolean | null | undefined
  ? T
  : T extends Stripe.Decimal
    ? string
    : T extends readonly (infer E)[]
      ? Wire<E>[]
      : T extends object
        ? { [K in keyof T]: Wire<T[K]> }
        : T;

export type WireCustomer = Wire<Stripe.Customer>;
export type WireInvoice = Wire<Stripe.Invoice>;
export type WireInvoiceLine = Wire<Stripe.InvoiceLineItem>;
export type WirePrice = Wire<Stripe.Price>;
export type WireProduct = Wire<Stripe.Product>;
export type WireSubscription = Wire<Stripe.Subscription>;
export type WireSubscriptionItem = Wire<Stripe.SubscriptionItem>;

/** The id of a reference that may have been expanded. */
export function idOf(reference: string | { readonly id: string } | null): string {
  if (reference === null) throw new Error('expected a reference; found null');
  return typeof reference === 'string' ? reference : reference.id;
}

export interface WireList<T> {
  object: 'list';
  data: T[];
  has_more: boolean;
  url: string;
}

/** A whole list in one page, as it stands inside a subscription or an invoice. */
export function fullList<T>(data: T[], url: string): WireList<T> {
  return { object: 'list', data, has_more: false, url };
}
