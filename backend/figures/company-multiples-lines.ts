import { ascending } from 'd3';
import type { PlacedText, Point } from './figure-types';
import { diamondAt } from './mark-paths';

/** Between a line and the figures at its ends. */
export const labelGap = 8;

/** One variable of one company over time. */
export interface CompanySeries {
  readonly company: string;
  readonly year: number;
  /** In the order of the variables; null where a figure is missing. */
  readonly values: readonly (number | null)[];
  /** Positions of the variables with a value that someone should look at. */
  readonly flagged?: readonly number[];
}

/** The rows of a company by year. */
export type YearRows = ReadonlyMap<number, CompanySeries>;

/** One year of one line; a year without a figure is there too, so that keys find it. */
export interface MultiplesPoint {
  readonly year: number;
  readonly value: number | null;
  readonly isFlagged: boolean;
  /** Where it is drawn; in the middle of the line's height where there is no figure. */
  readonly at: Point;
}

export interface MultiplesLine {
  /** Position among the variables. */
  readonly variable: number;
  /** The variable's name where no head says it; null elsewhere. */
  readonly name: PlacedText | null;
  /** Broken where a figure is missing. */
  readonly path: string;
  /** Figures without a neighbour, as dots. */
  readonly dots: string;
  readonly flags: string;
  /** Of the own company: its mark at the last figure. */
  readonly mark: string;
  /** First and last figure; none where the company has none. */
  readonly labels: readonly PlacedText[];
  readonly points: readonly MultiplesPoint[];
}

/** Where a line goes, CSS pixels. */
export interface LinePlace {
  readonly x: (year: number) => number;
  readonly y: (value: number) => number;
  readonly middle: number;
  readonly from: number;
  readonly to: number;
  readonly value: (value: number, variable: number) => string;
}

/** A line over the years with its marks; broken where a figure is missing. */
export function placedLine(
  line: {
    readonly variable: number;
    readonly name: PlacedText | null;
    readonly years: readonly [number, number];
    readonly ofYear: YearRows;
    readonly isOwn: boolean;
  },
  place: LinePlace,
): MultiplesLine {
  const { variable, ofYear, isOwn } = line;
  const [first, last] = line.years;
  const points = Array.from({ length: last - first + 1 }, (_, step): MultiplesPoint => {
    const year = first + step;
    const row = ofYear.get(year);
    const value = row?.values[variable] ?? null;
    return {
      year,
      value,
      isFlagged: row?.flagged?.includes(variable) ?? false,
      at: { x: place.x(year), y: value === null ? place.middle : place.y(value) },
    };
  });
  const drawn = points
    .filter(({ value }) => value !== null)
    .sort((a, b) => ascending(a.year, b.year));
  const runs = runsOf(drawn);
  const end = drawn.at(-1);
  return {
    variable,
    name: line.name,
    path: runs
      .filter((run) => run.length > 1)
      .map((run) => `M${run.map(({ at }) => `${short(at.x)},${short(at.y)}`).join('L')}`)
      .join(''),
    dots: runs
      .filter((run) => run.length === 1)
      .map(
        ([{ at }]) =>
          `M${short(at.x - 1.75)},${short(at.y)}a1.75,1.75 0 1 1 3.5,0a1.75,1.75 0 1 1 -3.5,0Z`,
      )
      .join(''),
    flags: points
      .filter(({ isFlagged }) => isFlagged)
      .map(({ at }) => `M${short(at.x - 5)},${short(at.y - 11)}h10l-5,9Z`)
      .join(''),
    mark: isOwn && end !== undefined ? diamondAt(end.at, 4.5) : '',
    labels: labelsOf(drawn, variable, place),
    points,
  };
}

/** Figures of consecutive years. */
function runsOf(drawn: readonly MultiplesPoint[]): readonly (readonly MultiplesPoint[])[] {
  const runs: MultiplesPoint[][] = [];
  for (const point of drawn) {
    const run = runs.at(-1);
    if (run?.at(-1)?.year === point.year - 1) run.push(point);
    else runs.push([point]);
  }
  return runs;
}

function labelsOf(
  drawn: readonly MultiplesPoint[],
  variable: number,
  { from, to, middle, value }: LinePlace,
): readonly PlacedText[] {
  const [first, last] = [drawn.at(0), drawn.at(-1)];
  if (first?.value == null || last?.value == null) return [];
  const y = middle + 4;
  return [
    { text: value(first.value, variable), x: from - labelGap, y, anchor: 'end' },
    { text: value(last.value, variable), x: to + labelGap, y, anchor: 'start' },
  ];
}

/** A tenth of a pixel is finer than anyone sees. */
function short(pixels: number): number {
  return Math.round(pixels * 10) / 10;
}
