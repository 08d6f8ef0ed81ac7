import type { Period } from './billing-period';
import { productOf } from './catalogue';
import { longId } from './ids';
import type { WireInvoiceLine, WireSubscriptionItem } from './wire';

interface LineRequest {
  readonly item: WireSubscriptionItem;
  readonly invoice: string;
  readonly period: Period;
  readonly isTrial: boolean;
  readonly idPrefix: 'il_' | 'il_tmp_';
}

/** One item over one period: quantity × unit amount, or nothing while a trial runs. */
export function invoiceLine({ item, invoice, period, isTrial, idPrefix }: LineRequest) {
  const quantity = item.quantity ?? 1;
  const unit = item.price.unit_amount ?? 0;
  const amount = isTrial ? 0 : quantity * unit;
  const product = productOf(item.price);
  const each = `€${(unit / 100).toFixed(2)} / ${item.price.recurring?.interval ?? ''}`;
  return {
    id: longId(idPrefix),
    object: 'line_item',
    amount,
    currency: item.price.currency,
    description: isTrial
      ? `Trial period for ${product.name}`
      : `${quantity} × ${product.name} (at ${each})`,
    discount_amounts: [],
    discountable: true,
    discounts: [],
    invoice,
    livemode: false,
    metadata: item.metadata,
    parent: {
      invoice_item_details: null,
      subscription_item_details: {
        invoice_item: null,
        proration: false,
        proration_details: { credited_items: null },
        subscription: item.subscription,
        subscription_item: item.id,
      },
      type: 'subscription_item_details',
    },
    period: { start: period.start, end: period.end },
    pretax_credit_amounts: [],
    pricing: {
      price_details: { price: item.price.id, product: product.id },
      type: 'price_details',
      unit_amount_decimal: isTrial ? '0' : item.price.unit_amount_decimal,
    },
    quantity,
    quantity_decimal: String(quantity),
    subscription: item.subscription,
    subtotal: amount,
    taxes: [],
  } satisfies WireInvoiceLine;
}
