import { max } from 'd3';
import type { PlacedText, PlacedTick, Plot, Point } from './figure-types';
import { circleAt, crossAt } from './mark-paths';
import { type PlaneAxisWords, planeAxis } from './plane-axis';
import { roomForNames } from './room-for-names';
import { figuresWidth } from './text-width';

/** Where a company stands: the own one, a peer that is in, or a candidate that is out. */
export type PlaneSide = 'own' | 'in' | 'out';

/** A company by two measures, as they are shown. */
export interface PlaneCompany {
  readonly company: string;
  readonly side: PlaneSide;
  readonly x: number;
  readonly y: number;
}

export interface PlacedCompany extends Point {
  readonly row: PlaneCompany;
}

export interface CompanyPlaneLayout {
  readonly width: number;
  readonly height: number;
  readonly plot: Plot;
  readonly xTicks: readonly PlacedTick[];
  readonly yTicks: readonly PlacedTick[];
  readonly xTitle: PlacedText;
  readonly yTitle: PlacedText;
  /** In the order given. */
  readonly points: readonly PlacedCompany[];
  /** Marks of peers and of candidates as one path each; the own company's mark is drawn over them. */
  readonly peerMarks: string;
  readonly candidateMarks: string;
  readonly own: PlacedCompany | null;
  readonly names: readonly (PlacedText & { readonly isOwn: boolean })[];
  /** Places in `points` from left to right, and from the top down. */
  readonly byX: readonly number[];
  readonly byY: readonly number[];
}

const [top, foot, right] = [32, 44, 20];
const manyPoints = 200;
/** More names than this are not tried: they would find no room. */
const mostNames = 40;

/**
 * Companies on two measures. Those without a place (not finite, or not above 0 on a logarithmic axis) are left out.
 *
 * @param data.companies  the first ones get their names first, after the own company.
 */
export function companyPlaneLayout(
  data: { readonly companies: readonly PlaneCompany[] },
  axes: { readonly across: PlaneAxisWords; readonly up: PlaneAxisWords },
  width: number,
): CompanyPlaneLayout {
  const hasPlace = (value: number, { isLog }: PlaneAxisWords): boolean =>
    Number.isFinite(value) && (!isLog || value > 0);
  const rows = data.companies.filter(
    (row) => hasPlace(row.x, axes.across) && hasPlace(row.y, axes.up),
  );
  const height = Math.round(Math.min(460, Math.max(300, width * 0.56)));
  const bottom = height - foot;
  const up = planeAxis(
    rows.map(({ y }) => y),
    axes.up,
    [bottom, top],
    Math.round((bottom - top) / 56),
  );
  const left = (max(up.ticks, (tick) => figuresWidth(tick.label)) ?? 0) + 16;
  const plot: Plot = { left, right: Math.max(left + 40, width - right), top, bottom };
  const columns = Math.max(2, Math.round((plot.right - plot.left) / 100));
  const across = planeAxis(
    rows.map(({ x }) => x),
    axes.across,
    [plot.left, plot.right],
    columns,
  );
  const points = rows.map((row) => ({ row, x: across.place(row.x), y: up.place(row.y) }));
  const on = (side: PlaneSide) => points.filter(({ row }) => row.side === side);
  const isMany = points.length > manyPoints;
  return {
    width,
    height,
    plot,
    xTicks: across.ticks,
    yTicks: up.ticks,
    xTitle: { text: axes.across.title, x: plot.right, y: height - 6, anchor: 'end' },
    yTitle: { text: axes.up.title, x: 0, y: 14, anchor: 'start' },
    points,
    peerMarks: on('in')
      .map((point) => circleAt(point, isMany ? 3 : 4.5))
      .join(''),
    candidateMarks: on('out')
      .map((point) => crossAt(point, isMany ? 2 : 2.5))
      .join(''),
    own: on('own').at(0) ?? null,
    names: namesOf(points, plot, width),
    byX: placesBy(points, ({ x }) => x),
    byY: placesBy(points, ({ y }) => y),
  };
}

function namesOf(points: readonly PlacedCompany[], plot: Plot, width: number) {
  const own = points.filter(({ row }) => row.side === 'own');
  const others = points.filter(({ row }) => row.side !== 'own');
  const wished = [...own, ...others].slice(0, mostNames);
  const texts = roomForNames(
    wished.map((point) => ({ text: point.row.company, at: point })),
    {
      within: { left: plot.left, right: width, top: 16, bottom: plot.bottom },
      taken: [],
      crowd: points,
      mostCovered: 0,
    },
  );
  return texts.flatMap((text, place) => {
    const isOwn = wished[place].row.side === 'own';
    if (text !== null) return [{ ...text, isOwn }];
    // The own company is named wherever it stands.
    return isOwn ? [{ ...besideOwn(wished[place], plot), isOwn }] : [];
  });
}

function besideOwn({ row, x, y }: PlacedCompany, plot: Plot): PlacedText {
  const isRight = x > (plot.left + plot.right) / 2;
  return {
    text: row.company,
    x: x + (isRight ? -10 : 10),
    y: y + 4,
    anchor: isRight ? 'end' : 'start',
  };
}

function placesBy<T>(points: readonly T[], value: (point: T) => number): number[] {
  return points.map((_, place) => place).sort((a, b) => value(points[a]) - value(points[b]));
}

/** Places of the points within a rectangle given by two of its corners. */
export function placesWithin(points: readonly Point[], from: Point, to: Point): number[] {
  const between = (value: number, one: number, other: number): boolean =>
    value >= Math.min(one, other) && value <= Math.max(one, other);
  return points.flatMap(({ x, y }, place) =>
    between(x, from.x, to.x) && between(y, from.y, to.y) ? [place] : [],
  );
}
