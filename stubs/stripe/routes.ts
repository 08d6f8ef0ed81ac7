import { customerRoutes } from './customers';
import { invoiceRoutes } from './invoices';
import { priceRoutes } from './prices';
import { productRoutes } from './products';
import type { Route } from './route';
import { notInStub } from './stripe-failure';
import { subscriptionRoutes } from './subscriptions';

/** Operations that Stripe has and the product will call one day: 501 rather than a false 404. */
const later: readonly Route[] = (
  [
    ['delete', '/v1/customers/:id'],
    ['post', '/v1/subscriptions/:id'],
    ['delete', '/v1/subscriptions/:id'],
    ['get', '/v1/subscription_items/:id'],
    ['post', '/v1/subscription_items/:id'],
    ['post', '/v1/invoices/:id/finalize'],
    ['post', '/v1/invoices/:id/pay'],
    ['post', '/v1/invoices/:id/void'],
    ['post', '/v1/invoices/:id/mark_uncollectible'],
    ['post', '/v1/checkout/sessions'],
    ['post', '/v1/billing_portal/sessions'],
    ['get', '/v1/events'],
    ['post', '/v1/webhook_endpoints'],
    ['post', '/v1/payment_methods/:id/attach'],
    ['post', '/v1/test_helpers/test_clocks'],
  ] as const
).map(([method, path]) => ({
  method,
  path,
  run: () => {
    throw notInStub('path', `${method.toUpperCase()} ${path}`);
  },
}));

export const routes: readonly Route[] = [
  ...customerRoutes,
  ...productRoutes,
  ...priceRoutes,
  ...subscriptionRoutes,
  ...invoiceRoutes,
  ...later,
];
