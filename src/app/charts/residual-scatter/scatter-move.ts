/** Places of points in the two orders in which keys walk them. */
export interface ScatterOrders {
  /** From left to right. */
  readonly byFitted: readonly number[];
  /** From the lowest in the chart's pixels to the greatest: the highest residual first. */
  readonly byResidual: readonly number[];
}

const steps: Readonly<Record<string, readonly [order: keyof ScatterOrders, step: number]>> = {
  ArrowRight: ['byFitted', 1],
  ArrowLeft: ['byFitted', -1],
  ArrowDown: ['byResidual', 1],
  ArrowUp: ['byResidual', -1],
  PageDown: ['byResidual', 10],
  PageUp: ['byResidual', -10],
  Home: ['byFitted', -Infinity],
  End: ['byFitted', Infinity],
};

/**
 * Where a key leads among the points: left and right to the next fitted value, up and down to the next residual, Page
 * Up and Down by ten, Home and End to the ends. Null for other keys, and where there are no points.
 */
export function scatterMove(key: string, place: number, orders: ScatterOrders): number | null {
  if (!(key in steps) || orders.byFitted.length === 0) return null;
  const [name, step] = steps[key];
  const order = orders[name];
  const next = order.indexOf(place) + step;
  return order[Math.min(Math.max(next, 0), order.length - 1)];
}
