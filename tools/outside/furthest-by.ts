/** The member of a group that lies furthest, and how many there are. */
export interface Furthest<Item> {
  readonly key: string;
  readonly count: number;
  readonly furthest: Item;
}

/** Groups items by a key, in the order of their first ones, and takes the furthest of each; what is no number lies furthest. */
export function furthestBy<Item extends { readonly difference: number }>(
  items: readonly Item[],
  keyOf: (item: Item) => string,
): Furthest<Item>[] {
  const groups = new Map<string, Furthest<Item>>();
  for (const item of items) {
    const key = keyOf(item);
    const group = groups.get(key);
    const isFurther = group === undefined || distance(item) > distance(group.furthest);
    const furthest = isFurther ? item : group.furthest;
    groups.set(key, { key, count: (group?.count ?? 0) + 1, furthest });
  }
  return [...groups.values()];
}

function distance({ difference }: { readonly difference: number }): number {
  return Number.isNaN(difference) ? Infinity : difference;
}
