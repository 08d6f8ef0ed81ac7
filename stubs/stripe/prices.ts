import type Stripe from 'stripe';
import { prices } from './catalogue';
import { flag, listOf, readParams, text, unsupported, word, type Shape } from './form-params';
import { pageOf, pageParams } from './page';
import type { Route } from './route';
import { noSuch } from './stripe-failure';

const retrieve = { expand: listOf(text) } satisfies Shape<Stripe.PriceRetrieveParams>;
const list = {
  ...pageParams,
  active: flag,
  created: unsupported,
  currency: text,
  expand: listOf(text),
  lookup_keys: listOf(text),
  product: text,
  recurring: unsupported,
  type: word(['recurring', 'one_time']),
} satisfies Shape<Stripe.PriceListParams>;

export const priceRoutes: readonly Route[] = [
  {
    method: 'get',
    path: '/v1/prices',
    run: ({ form }) => {
      const wanted = readParams(list, form);
      const found = prices.filter(
        (price) =>
          (wanted.active == null || price.active === wanted.active) &&
          (wanted.currency == null || price.currency === wanted.currency.toLowerCase()) &&
          (wanted.lookup_keys == null || wanted.lookup_keys.includes(price.lookup_key ?? '')) &&
          (wanted.product == null || price.product === wanted.product) &&
          (wanted.type == null || price.type === wanted.type),
      );
      return pageOf(found, wanted, '/v1/prices');
    },
  },
  {
    method: 'get',
    path: '/v1/prices/:id',
    run: ({ form, ids }) => {
      readParams(retrieve, form);
      const found = prices.find((price) => price.id === ids['id']);
      if (found === undefined) throw noSuch('price', ids['id'], 'price');
      return found;
    },
  },
];
