/** Places of companies in the two orders in which keys walk them. */
export interface PlaneOrders {
  readonly byX: readonly number[];
  readonly byY: readonly number[];
}

const steps: Readonly<Record<string, readonly [order: keyof PlaneOrders, step: number]>> = {
  ArrowRight: ['byX', 1],
  ArrowLeft: ['byX', -1],
  ArrowDown: ['byY', 1],
  ArrowUp: ['byY', -1],
  PageDown: ['byX', 10],
  PageUp: ['byX', -10],
  Home: ['byX', -Infinity],
  End: ['byX', Infinity],
};

/**
 * The places a key leads over among the companies, the last of them where it ends: left and right in the order across,
 * up and down in the order upwards. Null for other keys, and where there are no companies.
 */
export function planeMove(
  key: string,
  place: number,
  orders: PlaneOrders,
): readonly number[] | null {
  if (!(key in steps) || orders.byX.length === 0) return null;
  const [name, step] = steps[key];
  const order = orders[name];
  const from = order.indexOf(place);
  const to = Math.min(Math.max(from + step, 0), order.length - 1);
  return to < from
    ? order.slice(to, from).reverse()
    : to > from
      ? order.slice(from + 1, to + 1)
      : [order[to]];
}
