import type { WirePrice, WireProduct } from './wire';

const made = Date.UTC(2026, 0, 5) / 1000;

function product(id: string, name: string, description: string): WireProduct {
  return {
    id,
    object: 'product',
    active: true,
    created: made,
    default_price: null,
    description,
    images: [],
    livemode: false,
    marketing_features: [],
    metadata: {},
    name,
    package_dimensions: null,
    shippable: null,
    statement_descriptor: null,
    tax_code: null,
    tax_details: null,
    type: 'service',
    unit_label: 'seat',
    updated: made,
    url: null,
  };
}

interface SeatPrice {
  readonly id: string;
  readonly lookupKey: string;
  readonly product: WireProduct;
  readonly interval: 'month' | 'year';
  /** Euro cents for one seat and period. */
  readonly cents: number;
}

function price(seat: SeatPrice): WirePrice {
  return {
    id: seat.id,
    object: 'price',
    active: true,
    billing_scheme: 'per_unit',
    created: made,
    currency: 'eur',
    custom_unit_amount: null,
    livemode: false,
    lookup_key: seat.lookupKey,
    metadata: {},
    nickname: null,
    product: seat.product.id,
    recurring: {
      interval: seat.interval,
      interval_count: 1,
      meter: null,
      trial_period_days: null,
      usage_type: 'licensed',
    },
    tax_behavior: 'unspecified',
    tiers_mode: null,
    transform_quantity: null,
    type: 'recurring',
    unit_amount: seat.cents,
    unit_amount_decimal: String(seat.cents),
  };
}

const analystSeat = product(
  'prod_StubAnalystSea',
  'Analyst seat',
  'Builds panels, runs fits and scenarios, publishes editions',
);
const readingSeat = product(
  'prod_StubReadingSea',
  'Reading seat',
  'Reads and signs editions: for the CFO and for readers',
);

/** Every product of the invented price list. */
export const products: readonly WireProduct[] = [analystSeat, readingSeat];

/** Every price of the invented price list; a year costs ten months. */
export const prices: readonly WirePrice[] = [
  price({
    id: 'price_1StubAnalystMonthly00000',
    lookupKey: 'analyst_seat_monthly',
    product: analystSeat,
    interval: 'month',
    cents: 8_900,
  }),
  price({
    id: 'price_1StubAnalystYearly000000',
    lookupKey: 'analyst_seat_yearly',
    product: analystSeat,
    interval: 'year',
    cents: 89_000,
  }),
  price({
    id: 'price_1StubReadingMonthly00000',
    lookupKey: 'reading_seat_monthly',
    product: readingSeat,
    interval: 'month',
    cents: 1_900,
  }),
  price({
    id: 'price_1StubReadingYearly000000',
    lookupKey: 'reading_seat_yearly',
    product: readingSeat,
    interval: 'year',
    cents: 19_000,
  }),
];

/** The catalogue's product, which every price of ours has. */
export function productOf(price: WirePrice): WireProduct {
  const found = products.find((entry) => entry.id === price.product);
  if (found === undefined) throw new Error(`expected a product for ${price.id}; found none`);
  return found;
}
