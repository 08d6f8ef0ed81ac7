import type Stripe from 'stripe';
import { products } from './catalogue';
import { listOf, readParams, text, type Shape } from './form-params';
import type { Route } from './route';
import { noSuch } from './stripe-failure';

const retrieve = { expand: listOf(text) } satisfies Shape<Stripe.ProductRetrieveParams>;

export const productRoutes: readonly Route[] = [
  {
    method: 'get',
    path: '/v1/products/:id',
    run: ({ form, ids }) => {
      readParams(retrieve, form);
      const found = products.find((product) => product.id === ids['id']);
      if (found === undefined) throw noSuch('product', ids['id']);
      return found;
    },
  },
];
