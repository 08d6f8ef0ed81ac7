import type { PlacedText, Plot, Point } from './figure-types';
import { type Box, leastCrowded } from './label-places';
import { wordsWidth } from './text-width';

/** A name that would like to stand beside a mark. */
export interface NameWish {
  readonly text: string;
  readonly at: Point;
}

interface NameBox extends Box {
  readonly place: PlacedText;
}

const size = 12;

function around({ text, at }: NameWish): NameBox[] {
  const long = wordsWidth(text, size);
  const places: readonly PlacedText[] = [
    { text, x: at.x + 9, y: at.y + 4, anchor: 'start' },
    { text, x: at.x - 9, y: at.y + 4, anchor: 'end' },
    { text, x: at.x, y: at.y - 12, anchor: 'middle' },
    { text, x: at.x, y: at.y + 20, anchor: 'middle' },
    { text, x: at.x, y: at.y - 12, anchor: 'end' },
    { text, x: at.x, y: at.y + 20, anchor: 'end' },
  ];
  const shift = { start: 0, middle: -long / 2, end: -long };
  return places.map((place) => {
    const left = place.x + shift[place.anchor];
    return {
      place,
      left: left - 2,
      right: left + long + 2,
      top: place.y - size,
      bottom: place.y + 4,
    };
  });
}

function overlap(a: Box, b: Box): boolean {
  return a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;
}

/** The stretch of ground that a placed text takes. */
export function boxOf({ text, x, y, anchor }: PlacedText): Box {
  const long = wordsWidth(text, size);
  const left = x - (anchor === 'start' ? 0 : anchor === 'middle' ? long / 2 : long);
  return { left: left - 2, right: left + long + 2, top: y - size, bottom: y + 4 };
}

/**
 * Places names beside their marks, those first wished for first; one for which there is no room is null.
 *
 * @param ground.within  edges that no name crosses.
 * @param ground.taken  ground that other words stand on.
 * @param ground.crowd  points of marks and lines, which a name keeps off.
 * @param ground.mostCovered  how many of them a name may cover.
 */
export function roomForNames(
  wishes: readonly NameWish[],
  ground: {
    readonly within: Plot;
    readonly taken: readonly Box[];
    readonly crowd: readonly Point[];
    readonly mostCovered: number;
  },
): (PlacedText | null)[] {
  const { within, crowd, mostCovered } = ground;
  const taken = [...ground.taken];
  return wishes.map((wish) => {
    const free = around(wish).filter(
      (box) =>
        box.left >= within.left &&
        box.right <= within.right &&
        box.top >= within.top &&
        box.bottom <= within.bottom &&
        !taken.some((other) => overlap(box, other)),
    );
    if (free.length === 0) return null;
    const best = leastCrowded(free, crowd);
    const covered = crowd.filter(
      ({ x, y }) => x >= best.left && x <= best.right && y >= best.top && y <= best.bottom,
    ).length;
    if (covered > mostCovered) return null;
    taken.push(best);
    return best.place;
  });
}
