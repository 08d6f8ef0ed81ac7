import { area, line, max } from 'd3';
import { placedBandLabel } from './band-label';
import {
  type EndLabel,
  type Fold,
  dodge,
  endLabels,
  endLabelsWidth,
  oneLine,
  seriesLabels,
} from './expected-path-labels';
import type { FigureFormats, PlacedText, PlacedTick, Plot, Point, Stretch } from './figure-types';
import { planMarkPath } from './mark-paths';
import { figuresWidth } from './text-width';
import { placedTicks, valueScale } from './value-axis';
import { placedYears, yearScale } from './year-axis';

/** An expected value of a plan year with its interval, and the band of the market value itself where it is asked for. */
export interface ExpectedYear {
  readonly year: number;
  readonly estimate: number;
  readonly low: number | null;
  readonly high: number | null;
  readonly bandLow?: number | null;
  readonly bandHigh?: number | null;
}

export interface ExpectedPlan {
  readonly name: string;
  readonly years: readonly ExpectedYear[];
}

export interface ExpectedPathData {
  /** What happened, with what the model expected of it. */
  readonly ownYears: readonly {
    readonly year: number;
    readonly actual: number;
    readonly fitted: number;
  }[];
  /** The last actual values held; empty draws none. */
  readonly base: readonly { readonly year: number; readonly estimate: number }[];
  /** The first one is in question: its interval is an area. The others carry theirs at the last year. */
  readonly plans: readonly ExpectedPlan[];
  /** What the band is called beside it: `80 % band of the market value`. */
  readonly bandName?: string;
}

export interface ExpectedPathPoint extends Point {
  readonly kind: 'own' | 'base' | 'plan';
  readonly year: number;
  /** Which of the plans; 0 for the others. */
  readonly plan: number;
  readonly actual: string;
  readonly expected: string;
  readonly bounds: string;
  /** Of the market value's band: `1,200 to 3,900`; empty where there is none. */
  readonly band: string;
}

/** A year of one of the lines, as it is chosen: of what happened, of the base, or of the plan with this index. */
export interface ExpectedPathChoice {
  readonly kind: 'actual' | 'base' | 'plan';
  /** Which of the plans; 0 for the others. */
  readonly plan: number;
  readonly year: number;
}

export interface PlacedPlan {
  readonly name: string;
  readonly path: string;
  readonly mark: string;
  readonly points: readonly Point[];
  /** The interval at the last year, top to bottom, with the place of its estimate. */
  readonly interval: (Stretch & Point) | null;
}

export interface ExpectedPathLayout {
  readonly width: number;
  readonly height: number;
  readonly yearsY: number;
  readonly plot: Plot;
  readonly yTicks: readonly PlacedTick[];
  readonly years: readonly PlacedTick[];
  readonly actualPath: string;
  readonly actualPoints: readonly Point[];
  readonly fittedPath: string;
  readonly planX: number | null;
  readonly planLabel: PlacedText | null;
  readonly basePath: string;
  /** Areas of the first plan: the band of the market value, within it the interval of the expected value. */
  readonly bandArea: string;
  readonly bandLabel: PlacedText | null;
  readonly intervalArea: string;
  readonly plans: readonly PlacedPlan[];
  readonly seriesLabels: readonly (PlacedText & { readonly series: 'actual' | 'expected' })[];
  readonly endLabels: readonly EndLabel[];
  /** Every year of every line, own years first, in the order in which arrow keys visit them. */
  readonly points: readonly ExpectedPathPoint[];
}

type Seen = number | null | undefined;

function valuesOf({ ownYears, base, plans }: ExpectedPathData): Seen[] {
  return [
    ...ownYears.flatMap(({ actual, fitted }) => [actual, fitted]),
    ...base.map(({ estimate }) => estimate),
    ...plans.flatMap(({ years }) =>
      years.flatMap((year) => [year.estimate, year.low, year.high, year.bandLow, year.bandHigh]),
    ),
  ];
}

/** Actual and expected value until now, then what each plan would make of it. */
export function expectedPathLayout(
  data: ExpectedPathData,
  width: number,
  formats: FigureFormats,
): ExpectedPathLayout {
  const { ownYears, base, plans } = data;
  const yearsY = width < 480 ? 254 : 314;
  const [top, bottom] = [24, yearsY - 22];
  const y = valueScale(valuesOf(data), [bottom, top], 5);
  const yTicks = placedTicks(y, 5, formats.tick);
  const left = (max(yTicks, (tick) => figuresWidth(tick.label)) ?? 0) + 16;
  // Long names fold onto two lines before they take the room of the lines they name.
  const isFolded = width < 560 || endLabelsWidth(data, oneLine, formats) > width * 0.22;
  const fold: Fold = isFolded ? { isFolded, nameWidth: Math.max(84, width * 0.2) } : oneLine;
  const labelsWidth = endLabelsWidth(data, fold, formats) + dodge * Math.max(0, plans.length - 1);
  const plot = { left, right: Math.max(left + 60, width - labelsWidth - 16), top, bottom };

  const labelsX = plot.right + dodge * Math.max(0, plans.length - 1);
  const years = [
    ...new Set([...ownYears, ...base, ...plans.flatMap((plan) => plan.years)].map((at) => at.year)),
  ].sort((a, b) => a - b);
  const x = yearScale(years, [plot.left, plot.right]);
  const last = ownYears.at(-1);
  const through = line<Point>()
    .x((point) => point.x)
    .y((point) => point.y);
  const place = (year: number, value: number): Point => ({ x: x(year), y: y(value) });
  const actual = ownYears.map((own) => place(own.year, own.actual));
  const fitted = ownYears.map((own) => place(own.year, own.fitted));
  const start = last === undefined ? [] : [place(last.year, last.fitted)];
  const isPlanned = base.length > 0 || plans.length > 0;
  const planX = last !== undefined && isPlanned ? x(last.year) : null;

  return {
    width,
    height: yearsY + 6,
    yearsY,
    plot,
    yTicks,
    years: years.length === 0 ? [] : placedYears(years, x, last?.year),
    actualPath: through(actual) ?? '',
    actualPoints: actual,
    fittedPath: through(fitted) ?? '',
    planX,
    planLabel: planX === null ? null : { text: 'plan', x: planX + 6, y: 14, anchor: 'start' },
    basePath:
      base.length === 0
        ? ''
        : (through([...start, ...base.map((at) => place(at.year, at.estimate))]) ?? ''),
    bandArea: areaOf(plans.at(0), x, y, (at) => [at.bandLow, at.bandHigh]),
    bandLabel: placedBandLabel(data, plot, place, [...actual, ...fitted]),
    intervalArea: areaOf(plans.at(0), x, y, (at) => [at.low, at.high]),
    plans: plans.map((plan, index) => {
      const points = plan.years.map((at) => place(at.year, at.estimate));
      return {
        name: plan.name,
        path: through([...start, ...points]) ?? '',
        mark: planMarkPath(index, 3.5),
        points,
        interval: intervalAtEnd(plan, index, x, y),
      };
    }),
    seriesLabels: seriesLabels(actual, fitted, { ...plot, right: (planX ?? plot.right) - 4 }),
    endLabels: endLabels(data, fold, plot, labelsX, y, formats),
    points: pointsOf(data, place, formats),
  };
}

function areaOf(
  plan: ExpectedPlan | undefined,
  x: (year: number) => number,
  y: (value: number) => number,
  bounds: (year: ExpectedYear) => readonly [Seen, Seen],
): string {
  const known = (plan?.years ?? []).flatMap((at) => {
    const [low, high] = bounds(at);
    return low == null || high == null ? [] : [{ x: x(at.year), low: y(low), high: y(high) }];
  });
  const between = area<(typeof known)[number]>()
    .x((at) => at.x)
    .y0((at) => at.low)
    .y1((at) => at.high);
  return between(known) ?? '';
}

/** Intervals of plans that end in the same year stand a little apart, or they would hide each other. */
function intervalAtEnd(
  plan: ExpectedPlan,
  index: number,
  x: (year: number) => number,
  y: (value: number) => number,
): PlacedPlan['interval'] {
  const end = plan.years.at(-1);
  if (end?.low == null || end.high == null) return null;
  return { x: x(end.year) + dodge * index, y: y(end.estimate), from: y(end.high), to: y(end.low) };
}

function pointsOf(
  { ownYears, base, plans }: ExpectedPathData,
  place: (year: number, value: number) => Point,
  formats: FigureFormats,
): ExpectedPathPoint[] {
  return [
    ...ownYears.map((own) => ({
      kind: 'own' as const,
      plan: 0,
      year: own.year,
      ...place(own.year, own.actual),
      actual: formats.value(own.actual),
      expected: formats.value(own.fitted),
      bounds: '',
      band: '',
    })),
    ...base.map((at) => ({
      kind: 'base' as const,
      plan: 0,
      year: at.year,
      ...place(at.year, at.estimate),
      actual: '',
      expected: formats.value(at.estimate),
      bounds: '',
      band: '',
    })),
    ...plans.flatMap((plan, index) =>
      plan.years.map((at) => ({
        kind: 'plan' as const,
        plan: index,
        year: at.year,
        ...place(at.year, at.estimate),
        actual: '',
        expected: formats.value(at.estimate),
        bounds: formats.bounds(at),
        band: bandOf(at, formats),
      })),
    ),
  ];
}

function bandOf({ estimate, bandLow, bandHigh }: ExpectedYear, formats: FigureFormats): string {
  return bandLow == null || bandHigh == null
    ? ''
    : formats.bounds({ estimate, low: bandLow, high: bandHigh });
}
