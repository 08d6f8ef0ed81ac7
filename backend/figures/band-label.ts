import type { PlacedText, Plot, Point } from './figure-types';
import { alongLine, leastCrowded } from './label-places';
import { wordsWidth } from './text-width';

interface Banded {
  readonly year: number;
  readonly low: number | null;
  readonly high: number | null;
  readonly bandLow?: number | null;
  readonly bandHigh?: number | null;
}

/** Words over the years stand lower than the "plan" of the hairline. */
const firstBaseline = 28;

/** The band's name over its upper edge at the last planned year or under its lower one, whichever hides less. */
export function placedBandLabel(
  {
    plans,
    bandName,
  }: {
    readonly plans: readonly { readonly years: readonly Banded[] }[];
    readonly bandName?: string;
  },
  plot: Plot,
  place: (year: number, value: number) => Point,
  lines: readonly Point[],
): PlacedText | null {
  // What an interval at a higher level covers beyond the band is kept free as well.
  const banded = (plans.at(0)?.years ?? []).flatMap(({ year, low, high, bandLow, bandHigh }) =>
    bandLow == null || bandHigh == null
      ? []
      : [
          {
            year,
            low: Math.min(bandLow, low ?? bandLow),
            high: Math.max(bandHigh, high ?? bandHigh),
          },
        ],
  );
  const end = banded.at(-1);
  if (bandName === undefined || end === undefined) return null;
  const highest = Math.min(...banded.map(({ year, high }) => place(year, high).y));
  const lowest = Math.max(...banded.map(({ year, low }) => place(year, low).y));
  const { x } = place(end.year, end.high);
  const width = wordsWidth(bandName);
  const baselines = [Math.max(firstBaseline, highest - 6), Math.min(plot.bottom - 4, lowest + 14)];
  const boxes = baselines.map((y) => ({
    y,
    left: x - width,
    right: x,
    top: y - 12,
    bottom: y + 4,
  }));
  const { y } = leastCrowded(boxes, alongLine(lines));
  return { text: bandName, x, y, anchor: 'end' };
}
