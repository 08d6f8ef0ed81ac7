import type { WirePrice } from './wire';

/** Unix seconds; half-open. */
export interface Period {
  readonly start: number;
  readonly end: number;
}

/**
 * The period that starts `count` intervals after the anchor, counted in UTC from the anchor
 * itself, so that a subscription of the 31st comes back to the 31st after a short month.
 */
export function periodFrom(anchor: number, price: WirePrice, count: number): Period {
  return { start: stepped(anchor, price, count), end: stepped(anchor, price, count + 1) };
}

/** The period that follows one that ends at `end`. */
export function periodAfter(anchor: number, price: WirePrice, end: number): Period {
  let count = 0;
  while (stepped(anchor, price, count) < end) count += 1;
  return periodFrom(anchor, price, count);
}

function stepped(anchor: number, price: WirePrice, count: number): number {
  const recurring = price.recurring;
  if (recurring?.interval !== 'month' && recurring?.interval !== 'year') {
    throw new Error(`expected a monthly or yearly price; found ${price.id}`);
  }
  const months = (recurring.interval === 'year' ? 12 : 1) * recurring.interval_count * count;
  const from = new Date(anchor * 1000);
  const day = from.getUTCDate();
  const moved = new Date(anchor * 1000);
  moved.setUTCDate(1);
  moved.setUTCMonth(moved.getUTCMonth() + months);
  const lastDay = new Date(Date.UTC(moved.getUTCFullYear(), moved.getUTCMonth() + 1, 0));
  moved.setUTCDate(Math.min(day, lastDay.getUTCDate()));
  return moved.getTime() / 1000;
}
