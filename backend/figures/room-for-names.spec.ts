import { boxOf, roomForNames } from './room-for-names';

const within = { left: 0, right: 400, top: 0, bottom: 300 };
const free = { within, taken: [], crowd: [], mostCovered: 0 };

describe('room for names', () => {
  it('puts a name to the right of its mark, at the edge to the left', () => {
    const [inside, atEdge] = roomForNames(
      [
        { text: 'Tolvane 2014', at: { x: 100, y: 100 } },
        { text: 'Ostrell 2009', at: { x: 396, y: 200 } },
      ],
      free,
    );
    expect(inside).toEqual({ text: 'Tolvane 2014', x: 109, y: 104, anchor: 'start' });
    expect(atEdge?.anchor).toBe('end');
  });

  it('lets no two names overlap, and leaves out the one without room', () => {
    const at = { x: 200, y: 150 };
    const wishes = ['Tolvane', 'Ostrell', 'Kestrane', 'Quellix', 'Sundrell'];
    const placed = roomForNames(
      wishes.map((text) => ({ text, at })),
      free,
    );
    const boxes = placed.flatMap((name) => (name === null ? [] : [boxOf(name)]));
    expect(boxes.length).toBe(4);
    expect(placed[4]).toBeNull();
    boxes.forEach((a, place) =>
      boxes.slice(place + 1).forEach((b) => {
        const apart =
          a.right <= b.left || b.right <= a.left || a.bottom <= b.top || b.bottom <= a.top;
        expect(apart).toBeTrue();
      }),
    );
  });

  it('keeps off a crowd, and gives up a name that would cover too much of it', () => {
    const right = Array.from({ length: 5 }, (_, k) => ({ x: 112 + 6 * k, y: 100 }));
    const wish = [{ text: 'Tolvane', at: { x: 100, y: 100 } }];
    expect(roomForNames(wish, { ...free, crowd: right })[0]?.anchor).toBe('end');
    const everywhere = Array.from({ length: 4000 }, (_, k) => ({
      x: 4 * (k % 80),
      y: 6 * Math.floor(k / 80),
    }));
    expect(roomForNames(wish, { ...free, crowd: everywhere })[0]).toBeNull();
  });
});
