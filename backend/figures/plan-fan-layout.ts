import { area, line, max } from 'd3';
import type { FigureFormats, PlacedTick, Plot, Point } from './figure-types';
import { spreadApart } from './label-places';
import { figuresWidth, wordsWidth } from './text-width';
import { placedTicks, valueScale } from './value-axis';
import { placedYears, yearScale } from './year-axis';

/** A planned year of a fan: its percentiles in the order of `percents`, null where there is none. */
export interface FanYear {
  readonly year: number;
  readonly percentiles: readonly (number | null)[];
}

export interface FanData {
  /** The percents of the draws that lie below each line, ascending and mirrored around 50. */
  readonly percents: readonly number[];
  readonly years: readonly FanYear[];
  /** The last actual value, which the fan opens from; null draws none. */
  readonly last: { readonly year: number; readonly actual: number } | null;
}

export interface FanPoint extends Point {
  readonly year: number;
  readonly percent: number;
  readonly value: string;
}

export interface FanLabel extends Point {
  /** `95 %`, or at the median `median`. */
  readonly text: string;
  readonly value: string;
  readonly valueX: number;
}

export interface FanLayout {
  readonly width: number;
  readonly height: number;
  readonly yearsY: number;
  readonly plot: Plot;
  readonly yTicks: readonly PlacedTick[];
  readonly years: readonly PlacedTick[];
  /** From the widest pair of percentiles to the narrowest. */
  readonly areas: readonly { readonly from: number; readonly to: number; readonly path: string }[];
  readonly medianPath: string;
  readonly lastPoint: Point | null;
  /** Upright lines over each year, from the lowest to the highest percentile. */
  readonly spans: readonly { readonly x: number; readonly from: number; readonly to: number }[];
  readonly labels: readonly FanLabel[];
  /** Every percentile of every year, year by year from the lowest, in the order in which arrow keys visit them. */
  readonly points: readonly FanPoint[];
}

/** A plan whose inputs are uncertain: where its draws lie, year by year, as nested areas around the median. */
export function planFanLayout(data: FanData, width: number, formats: FigureFormats): FanLayout {
  const { percents, years, last } = data;
  const yearsY = width < 480 ? 224 : 264;
  const [top, bottom] = [16, yearsY - 22];
  const seen = [last?.actual, ...years.flatMap(({ percentiles }) => percentiles)];
  const y = valueScale(seen, [bottom, top], 5);
  const yTicks = placedTicks(y, 5, formats.tick);
  const left = (max(yTicks, (tick) => figuresWidth(tick.label)) ?? 0) + 16;
  const end = years.at(-1);
  const values = (end?.percentiles ?? []).map((value) =>
    value === null ? null : formats.value(value),
  );
  const nameWidth = (max(percents, (percent) => wordsWidth(nameOf(percent))) ?? 0) + 6;
  const labelsWidth = nameWidth + (max(values, (value) => figuresWidth(value ?? '')) ?? 0) + 14;
  const plot: Plot = { left, right: Math.max(left + 60, width - labelsWidth), top, bottom };
  const all = [...(last === null ? [] : [last.year]), ...years.map(({ year }) => year)];
  const x = yearScale(all, [plot.left + 8, plot.right]);
  const known = years.filter(({ percentiles }) => percentiles.every((value) => value !== null));
  const at = ({ percentiles }: FanYear, index: number): number => y(percentiles[index] ?? 0);
  const middle = percents.indexOf(50);
  const through = line<Point>()
    .x((point) => point.x)
    .y((point) => point.y);
  const start = last === null ? [] : [{ x: x(last.year), y: y(last.actual) }];
  return {
    width,
    height: yearsY + 6,
    yearsY,
    plot,
    yTicks,
    years: all.length === 0 ? [] : placedYears(all, x),
    areas: percents.slice(0, middle).map((percent, low) => {
      const high = percents.length - 1 - low;
      const between = area<FanYear>()
        .x(({ year }) => x(year))
        .y0((year) => at(year, low))
        .y1((year) => at(year, high));
      return { from: percent, to: percents[high], path: between(known) ?? '' };
    }),
    medianPath:
      through([...start, ...known.map((year) => ({ x: x(year.year), y: at(year, middle) }))]) ?? '',
    lastPoint: start.at(0) ?? null,
    spans: known.map((year) => ({
      x: x(year.year),
      from: at(year, 0),
      to: at(year, percents.length - 1),
    })),
    labels: labelsOf(data, { plot, nameWidth, y }, formats),
    points: years.flatMap((year) =>
      year.percentiles.flatMap((value, index) =>
        value === null
          ? []
          : [
              {
                year: year.year,
                percent: percents[index],
                value: formats.value(value),
                x: x(year.year),
                y: y(value),
              },
            ],
      ),
    ),
  };
}

function nameOf(percent: number): string {
  return percent === 50 ? 'median' : `${percent} %`;
}

function labelsOf(
  { percents, years }: FanData,
  {
    plot,
    nameWidth,
    y,
  }: { readonly plot: Plot; readonly nameWidth: number; readonly y: (value: number) => number },
  formats: FigureFormats,
): FanLabel[] {
  const found = (years.at(-1)?.percentiles ?? []).flatMap((value, index) =>
    value === null ? [] : [{ percent: percents[index], value }],
  );
  const places = spreadApart(
    found.map(({ value }) => y(value)),
    15,
    [plot.top, plot.bottom],
  );
  return found.map(({ percent, value }, index) => ({
    text: nameOf(percent),
    value: formats.value(value),
    x: plot.right + 10,
    valueX: plot.right + 10 + nameWidth,
    y: places[index] + 4,
  }));
}
