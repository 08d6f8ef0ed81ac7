import { descending } from 'd3';
import type { PlacedText, PlacedTick, Plot, Point } from './figure-types';
import { diamondAt, circleAt } from './mark-paths';
import { roomForNames } from './room-for-names';
import { type ValueAxis, valuePlot } from './value-plot';

/** What is left of one row of the panel when the model has been taken away. */
export interface ResidualRow {
  readonly company: string;
  readonly year: number;
  readonly fileRow: number;
  readonly fitted: number;
  readonly residual: number;
  /** Externally studentised; null where the row determines itself. */
  readonly studentised: number | null;
}

export interface PlacedResidual extends Point {
  readonly row: ResidualRow;
  readonly isOwn: boolean;
}

export interface ResidualScatterLayout {
  readonly width: number;
  readonly height: number;
  readonly plot: Plot;
  readonly xTicks: readonly PlacedTick[];
  readonly yTicks: readonly PlacedTick[];
  readonly xTitle: PlacedText;
  readonly yTitle: PlacedText;
  readonly zeroY: number;
  /** From the largest by studentised residual to the smallest. */
  readonly points: readonly PlacedResidual[];
  /** All peers' marks as one path, all of the own company as another: thousands of elements would be slow. */
  readonly peerMarks: string;
  readonly ownMarks: string;
  readonly names: readonly (PlacedText & { readonly isOwn: boolean })[];
  /** Places in `points` from left to right, and from the highest residual to the lowest. */
  readonly byFitted: readonly number[];
  readonly byResidual: readonly number[];
}

const manyPoints = 800;

/** Residuals against fitted values, the largest named by company and year. */
export function residualScatterLayout(
  data: { readonly rows: readonly ResidualRow[]; readonly ownCompany: string },
  axes: { readonly across: Omit<ValueAxis, 'values'>; readonly up: Omit<ValueAxis, 'values'> },
  width: number,
): ResidualScatterLayout {
  const rows = data.rows
    .filter(({ fitted, residual }) => Number.isFinite(fitted) && Number.isFinite(residual))
    .sort((a, b) => descending(sizeOf(a), sizeOf(b)));
  const { x, y, height, plot, ...axisMarks } = valuePlot(
    { ...axes.across, values: rows.map(({ fitted }) => fitted) },
    { ...axes.up, values: [0, ...rows.map(({ residual }) => residual)] },
    { width, right: 20 },
  );
  const points = rows.map((row) => ({
    row,
    isOwn: row.company === data.ownCompany,
    x: x(row.fitted),
    y: y(row.residual),
  }));
  const isMany = points.length > manyPoints;
  const peers = points.filter(({ isOwn }) => !isOwn);
  const own = points.filter(({ isOwn }) => isOwn);
  const largest = points.slice(0, width < 480 ? 3 : width < 800 ? 5 : 8);
  const names = roomForNames(
    largest.map((point) => ({ text: `${point.row.company} ${point.row.year}`, at: point })),
    {
      within: { left: plot.left, right: width, top: 16, bottom: plot.bottom },
      taken: [],
      crowd: points,
      mostCovered: 2,
    },
  );
  return {
    width,
    height,
    plot,
    ...axisMarks,
    zeroY: y(0),
    points,
    peerMarks: peers.map((point) => circleAt(point, isMany ? 2 : 3)).join(''),
    ownMarks: own.map((point) => diamondAt(point, isMany ? 4 : 5)).join(''),
    names: names.flatMap((name, place) =>
      name === null ? [] : [{ ...name, isOwn: largest[place].isOwn }],
    ),
    byFitted: placesBy(points, (point) => point.x),
    byResidual: placesBy(points, (point) => point.y),
  };
}

/** Rows that determine themselves have no studentised residual and stand last. */
function sizeOf({ studentised }: ResidualRow): number {
  return studentised === null || !Number.isFinite(studentised) ? -1 : Math.abs(studentised);
}

function placesBy<T>(points: readonly T[], value: (point: T) => number): number[] {
  return points.map((_, place) => place).sort((a, b) => value(points[a]) - value(points[b]));
}

/** Place of the point nearest to a place in the chart; null where none is within `reach` CSS pixels. */
export function nearestPlace(points: readonly Point[], at: Point, reach: number): number | null {
  let nearest: number | null = null;
  let least = reach * reach;
  for (let place = 0; place < points.length; place++) {
    const [across, up] = [points[place].x - at.x, points[place].y - at.y];
    const distance = across * across + up * up;
    if (distance <= least) [nearest, least] = [place, distance];
  }
  return nearest;
}
