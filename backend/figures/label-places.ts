import type { Point } from './figure-types';

/**
 * Moves labels apart along one direction, as little as needed, keeping their order.
 *
 * @param wanted  where each would like to stand, any order.
 * @param gap  least distance between two.
 * @param range  least and greatest place; a crowd too long for it runs over the end rather than overlap.
 * @returns one place a label, in the order of `wanted`.
 */
export function spreadApart(
  wanted: readonly number[],
  gap: number,
  [least, most]: readonly [number, number],
): number[] {
  const order = wanted.map((_, index) => index).sort((a, b) => wanted[a] - wanted[b]);
  const places = wanted.map((place) => Math.min(Math.max(place, least), most));
  for (let rank = 1; rank < order.length; rank++)
    places[order[rank]] = Math.max(places[order[rank]], places[order[rank - 1]] + gap);
  const overrun = order.length > 0 ? places[order[order.length - 1]] - most : 0;
  if (overrun > 0) {
    places[order[order.length - 1]] -= overrun;
    for (let rank = order.length - 2; rank >= 0; rank--)
      places[order[rank]] = Math.min(places[order[rank]], places[order[rank + 1]] - gap);
    const under = least - places[order[0]];
    if (under > 0) for (const index of order) places[index] += under;
  }
  return places;
}

export interface Box {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

/** The first of the boxes that covers the fewest points of `crowd`. */
export function leastCrowded<T extends Box>(boxes: readonly T[], crowd: readonly Point[]): T {
  let best = boxes[0];
  let fewest = Infinity;
  for (const box of boxes) {
    let covered = 0;
    for (const { x, y } of crowd)
      if (x >= box.left && x <= box.right && y >= box.top && y <= box.bottom) covered += 1;
    if (covered < fewest) [best, fewest] = [box, covered];
  }
  return best;
}

/** Points every few pixels along a broken line, so that a label can be kept off it. */
export function alongLine(points: readonly Point[], every = 6): Point[] {
  const along: Point[] = [];
  for (let index = 0; index < points.length; index++) {
    along.push(points[index]);
    if (index + 1 === points.length) break;
    const [from, to] = [points[index], points[index + 1]];
    const pieces = Math.ceil(Math.hypot(to.x - from.x, to.y - from.y) / every);
    for (let piece = 1; piece < pieces; piece++) {
      const share = piece / pieces;
      along.push({ x: from.x + (to.x - from.x) * share, y: from.y + (to.y - from.y) * share });
    }
  }
  return along;
}
