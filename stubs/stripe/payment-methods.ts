import { longId } from './ids';
import type { StubState } from './store';
import { badRequest, noSuch, notInStub } from './stripe-failure';

/** Stripe's public test payment methods that behave otherwise than by succeeding. */
const later = [
  'pm_card_visa_chargeDeclined',
  'pm_card_visa_chargeDeclinedInsufficientFunds',
  'pm_card_chargeDeclinedExpiredCard',
  'pm_card_chargeDeclinedIncorrectCvc',
  'pm_card_chargeDeclinedProcessingError',
  'pm_card_chargeCustomerFail',
  'pm_card_authenticationRequiredOnSetup',
  'pm_card_authenticationRequired',
];

/** Attaches the test card that always pays, under an id of its own, and returns that id. */
export function attachTestCard(state: StubState, customer: string, testCard: string): string {
  if (later.includes(testCard)) throw notInStub('payment_method', `payment_method=${testCard}`);
  if (testCard !== 'pm_card_visa') throw noSuch('PaymentMethod', testCard, 'payment_method');
  const id = longId('pm_');
  state.paymentMethods[id] = { id, customer, testCard };
  return id;
}

/** Refuses a default payment method that is not attached to the customer. */
export function requireAttached(state: StubState, customer: string, id: string): void {
  if (state.paymentMethods[id]?.customer === customer) return;
  throw badRequest(
    `The customer does not have a payment method with the ID ${id}. ` +
      'The payment method must be attached to the customer.',
    'invoice_settings[default_payment_method]',
    'resource_missing',
  );
}
