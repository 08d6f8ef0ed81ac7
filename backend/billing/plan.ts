/** Analyst seats build and publish; reading seats read and sign. */
export const seatKinds = ['analyst', 'reading'] as const;
export type SeatKind = (typeof seatKinds)[number];

export type BillingInterval = 'month' | 'year';

export interface Money {
  /** Integer minor units of the currency. */
  readonly amount: number;
  /** ISO 4217, upper case. */
  readonly currency: string;
}

/** Seats of one kind that a subscription pays for. */
export interface BoughtSeats {
  readonly kind: SeatKind;
  readonly quantity: number;
  /** For one seat and interval; null for a price without one amount a seat. */
  readonly unitPrice: Money | null;
}

/** A subscription as it stands at the payment provider. */
export interface Plan {
  /** The provider's word: `trialing`, `active`, `paused`, `past_due`, `canceled`, … */
  readonly status: string;
  readonly interval: BillingInterval;
  readonly trialEndsAt: Date | null;
  readonly renewsAt: Date | null;
  readonly cancelsAt: Date | null;
  readonly hasPaymentMethod: boolean;
  readonly seats: readonly BoughtSeats[];
}

export interface NextInvoice {
  readonly dueAt: Date;
  readonly total: Money;
  readonly lines: readonly { readonly description: string; readonly amount: Money }[];
}

export interface Invoice {
  readonly id: string;
  readonly number: string | null;
  readonly status: string;
  readonly createdAt: Date;
  readonly total: Money;
}
