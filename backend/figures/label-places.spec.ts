import { alongLine, leastCrowded, spreadApart } from './label-places';
import { clippedWords, wordsWidth, wrappedWords } from './text-width';
import { placedTicks, valueScale } from './value-axis';

describe('label places', () => {
  it('leaves labels alone that stand apart', () => {
    expect(spreadApart([50, 10, 90], 20, [0, 100])).toEqual([50, 10, 90]);
  });

  it('moves labels apart in their order, and back from the end', () => {
    const places = spreadApart([95, 96, 97], 20, [0, 100]);
    expect(places).toEqual([60, 80, 100]);
  });

  it('keeps the distance even when there are too many', () => {
    const places = spreadApart([1, 1, 1, 1], 50, [0, 100]);
    for (let k = 1; k < places.length; k++) expect(places[k] - places[k - 1]).toBe(50);
    expect(places[0]).toBe(0);
  });

  it('has nothing to do without labels', () => {
    expect(spreadApart([], 20, [0, 100])).toEqual([]);
  });

  it('prefers the place that hides least of a line, counted along it and not at its corners only', () => {
    const crowd = alongLine([
      { x: 0, y: 0 },
      { x: 100, y: 0 },
    ]);
    const on = { left: 40, right: 60, top: -5, bottom: 5 };
    const off = { left: 40, right: 60, top: 20, bottom: 30 };
    expect(leastCrowded([on, off], crowd)).toBe(off);
    expect(leastCrowded([off, on], crowd)).toBe(off);
  });

  it('clips a name to its column, and leaves one that fits', () => {
    expect(clippedWords('Velmara', 200)).toBe('Velmara');
    const clipped = clippedWords('Velmara Cold Chain Logistics', 80);
    expect(clipped.endsWith('…')).toBeTrue();
    expect(wordsWidth(clipped)).toBeLessThanOrEqual(80);
  });

  it('wraps a text into lines that fit, and loses no word', () => {
    const text = 'Velmara stands 2,100 (700 to 3,400) above its peers, place 2 to 5 of 14';
    const lines = wrappedWords(text, 160, 15);
    expect(lines.length).toBeGreaterThan(2);
    expect(lines.join(' ')).toBe(text);
    for (const line of lines) expect(wordsWidth(line, 15)).toBeLessThanOrEqual(160);
    expect(wrappedWords('', 160)).toEqual([]);
  });

  it('opens a scale around values that are all equal, and around none', () => {
    const equal = valueScale([7, null, 7], [0, 100], 4);
    expect(equal(7)).toBeGreaterThan(0);
    expect(equal(7.1)).toBeGreaterThan(equal(7));
    expect(valueScale([], [0, 100], 4)(0)).toBe(50);
    const ticks = placedTicks(valueScale([0, 10], [0, 100], 5), 5, (value) => String(value));
    expect(ticks.map((tick) => tick.position)).toEqual([0, 20, 40, 60, 80, 100]);
  });
});
