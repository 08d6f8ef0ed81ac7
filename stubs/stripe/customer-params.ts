import type Stripe from 'stripe';
import { listOf, metadata, nested, text, unsupported, type Shape } from './form-params';
import { pageParams } from './page';

const address = nested({
  city: text,
  country: text,
  line1: text,
  line2: text,
  postal_code: text,
  state: text,
} satisfies Shape<Stripe.AddressParam>);

const invoiceSettings = nested({
  custom_fields: unsupported,
  default_payment_method: text,
  footer: unsupported,
  rendering_options: unsupported,
} satisfies Shape<Stripe.CustomerCreateParams.InvoiceSettings>);

const both = {
  address,
  balance: unsupported,
  business_name: unsupported,
  cash_balance: unsupported,
  description: text,
  email: text,
  expand: listOf(text),
  individual_name: unsupported,
  invoice_prefix: unsupported,
  invoice_settings: invoiceSettings,
  metadata,
  name: text,
  next_invoice_sequence: unsupported,
  phone: text,
  preferred_locales: listOf(text),
  shipping: unsupported,
  source: unsupported,
  tax: unsupported,
  tax_exempt: unsupported,
  validate: unsupported,
};

export const createCustomer = {
  ...both,
  payment_method: text,
  tax_id_data: unsupported,
  test_clock: unsupported,
} satisfies Shape<Stripe.CustomerCreateParams>;

export const updateCustomer = {
  ...both,
  default_source: unsupported,
} satisfies Shape<Stripe.CustomerUpdateParams>;

export const retrieveCustomer = {
  expand: listOf(text),
} satisfies Shape<Stripe.CustomerRetrieveParams>;

export const listCustomers = {
  ...pageParams,
  created: unsupported,
  email: text,
  expand: listOf(text),
  test_clock: unsupported,
} satisfies Shape<Stripe.CustomerListParams>;
