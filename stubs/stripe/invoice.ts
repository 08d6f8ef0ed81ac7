import { fullList, type WireCustomer, type WireInvoice, type WireInvoiceLine } from './wire';

interface InvoiceRequest {
  readonly id: string;
  readonly customer: WireCustomer;
  readonly subscription: { readonly id: string; readonly metadata: Record<string, string> };
  readonly lines: readonly WireInvoiceLine[];
  readonly reason: 'subscription_create' | 'subscription_cycle' | 'upcoming';
  readonly created: number;
  readonly periodStart: number;
  readonly periodEnd: number;
}

/** An invoice not yet finalised, owed in full. */
export function draftInvoice(request: InvoiceRequest): WireInvoice {
  const { id, customer, subscription, created } = request;
  const total = request.lines.reduce((sum, line) => sum + line.amount, 0);
  return {
    ...untouchedParts(),
    id,
    object: 'invoice',
    amount_due: total,
    amount_paid: 0,
    amount_remaining: total,
    attempt_count: 0,
    attempted: false,
    auto_advance: true,
    automatically_finalizes_at: created + 3_600,
    billing_reason: request.reason,
    created,
    currency: 'eur',
    customer: customer.id,
    customer_address: customer.address ?? null,
    customer_email: customer.email,
    customer_name: customer.name ?? null,
    customer_phone: customer.phone ?? null,
    lines: fullList([...request.lines], `/v1/invoices/${id}/lines`),
    next_payment_attempt: created + 3_600,
    number: null,
    parent: {
      quote_details: null,
      subscription_details: { metadata: subscription.metadata, subscription: subscription.id },
      type: 'subscription_details',
    },
    period_end: request.periodEnd,
    period_start: request.periodStart,
    status: 'draft',
    subtotal: total,
    subtotal_excluding_tax: total,
    total,
    total_excluding_tax: total,
  };
}

/** Finalises and pays a draft at `at`, and takes the customer's next invoice number. */
export function payInFull(invoice: WireInvoice, customer: WireCustomer, at: number): void {
  const sequence = customer.next_invoice_sequence ?? 1;
  customer.next_invoice_sequence = sequence + 1;
  customer.currency = invoice.currency;
  invoice.number = `${customer.invoice_prefix ?? ''}-${String(sequence).padStart(4, '0')}`;
  invoice.status = 'paid';
  invoice.amount_paid = invoice.amount_due;
  invoice.amount_remaining = 0;
  invoice.attempted = true;
  invoice.attempt_count = invoice.total > 0 ? 1 : 0;
  invoice.auto_advance = false;
  invoice.automatically_finalizes_at = null;
  invoice.effective_at = at;
  invoice.ending_balance = 0;
  invoice.next_payment_attempt = null;
  invoice.status_transitions.finalized_at = at;
  invoice.status_transitions.paid_at = at;
  invoice.webhooks_delivered_at = at;
}

/** Parts that nothing in the stub changes yet; there are no hosted pages, so no addresses of them. */
function untouchedParts() {
  return {
    account_country: null,
    account_name: null,
    account_tax_ids: null,
    amount_overpaid: 0,
    amount_shipping: 0,
    application: null,
    automatic_tax: {
      disabled_reason: null,
      enabled: false,
      liability: null,
      provider: null,
      status: null,
    },
    collection_method: 'charge_automatically',
    custom_fields: null,
    customer_account: null,
    customer_shipping: null,
    customer_tax_exempt: 'none',
    customer_tax_ids: [],
    default_payment_method: null,
    default_source: null,
    default_tax_rates: [],
    description: null,
    discounts: [],
    due_date: null,
    effective_at: null,
    ending_balance: null,
    footer: null,
    from_invoice: null,
    hosted_invoice_url: null,
    invoice_pdf: null,
    issuer: { type: 'self' },
    last_finalization_error: null,
    latest_revision: null,
    livemode: false,
    metadata: {},
    on_behalf_of: null,
    payment_settings: {
      default_mandate: null,
      payment_method_options: null,
      payment_method_types: null,
    },
    post_payment_credit_notes_amount: 0,
    pre_payment_credit_notes_amount: 0,
    receipt_number: null,
    rendering: null,
    shipping_cost: null,
    shipping_details: null,
    starting_balance: 0,
    statement_descriptor: null,
    status_transitions: {
      finalized_at: null,
      marked_uncollectible_at: null,
      paid_at: null,
      voided_at: null,
    },
    test_clock: null,
    total_discount_amounts: [],
    total_pretax_credit_amounts: [],
    total_taxes: [],
    webhooks_delivered_at: null,
  } satisfies Partial<WireInvoice>;
}
