import { text, whole } from './form-params';
import { noSuch } from './stripe-failure';
import type { WireList } from './wire';

/** The parameters of every list, to spread into a route's shape. */
export const pageParams = { limit: whole(1, 100), starting_after: text, ending_before: text };

interface PageRequest {
  readonly limit?: number | null;
  readonly starting_after?: string | null;
  readonly ending_before?: string | null;
}

/**
 * One page of `oldestFirst`, newest first as Stripe lists: ten unless `limit` says otherwise,
 * from just after or just before the object that a cursor names.
 */
export function pageOf<T extends { readonly id: string }>(
  oldestFirst: readonly T[],
  request: PageRequest,
  url: string,
): WireList<T> {
  const all = [...oldestFirst].reverse();
  const limit = request.limit ?? 10;
  const place = (id: string, param: string): number => {
    const index = all.findIndex((entry) => entry.id === id);
    if (index < 0) throw noSuch('object', id, param);
    return index;
  };
  if (request.ending_before) {
    const end = place(request.ending_before, 'ending_before');
    const start = Math.max(0, end - limit);
    return { object: 'list', data: all.slice(start, end), has_more: start > 0, url };
  }
  const start = request.starting_after ? place(request.starting_after, 'starting_after') + 1 : 0;
  const data = all.slice(start, start + limit);
  return { object: 'list', data, has_more: start + limit < all.length, url };
}
