import { ascending, max } from 'd3';
import type { PlacedText, PlacedTick, Plot, Point } from './figure-types';
import { alongLine, leastCrowded } from './label-places';
import { boxOf, roomForNames } from './room-for-names';
import { wordsWidth } from './text-width';
import { type ValueAxis, valuePlot } from './value-plot';

/** A straight line from its least to its greatest regressor. */
export interface StraightLine {
  readonly from: readonly [x: number, y: number];
  readonly to: readonly [x: number, y: number];
}

export interface CompanyLinesData {
  readonly companies: readonly (StraightLine & { readonly company: string })[];
  readonly pooled: StraightLine | null;
  /** Rows of the panel; those of peers are drawn where there are few enough. */
  readonly points: readonly { readonly company: string; readonly x: number; readonly y: number }[];
  readonly ownCompany: string;
}

export interface PlacedCompanyLine {
  readonly company: string;
  readonly isOwn: boolean;
  readonly path: string;
  readonly from: Point;
  readonly to: Point;
  /** Stands beside the line while it is pointed at; null where its name is written anyway. */
  readonly askedName: PlacedText | null;
}

export interface CompanyLinesLayout {
  readonly width: number;
  readonly height: number;
  readonly plot: Plot;
  readonly xTicks: readonly PlacedTick[];
  readonly yTicks: readonly PlacedTick[];
  readonly xTitle: PlacedText;
  readonly yTitle: PlacedText;
  /** Lines of all peers as one path. */
  readonly peerLines: string;
  readonly ownLine: string;
  readonly pooled: { readonly path: string; readonly label: PlacedText } | null;
  readonly peerPoints: readonly Point[];
  readonly ownPoints: readonly Point[];
  readonly ownName: PlacedText | null;
  readonly peerNames: readonly PlacedText[];
  /** Lines that can be pointed at, the highest at its right end first. */
  readonly lines: readonly PlacedCompanyLine[];
  /** How many rows of peers were left undrawn. */
  readonly hiddenPoints: number;
}

/** Above so many rows their circles would hide the lines. */
const mostPoints = 600;
const mostNamed = 24;
const mostPointable = 300;
const pooledName = 'one line for all';

function isFiniteLine({ from, to }: StraightLine): boolean {
  return [...from, ...to].every(Number.isFinite);
}

/** The outcome against one regressor: a line for each company over its own range, and the one line for all across. */
export function companyLinesLayout(
  data: CompanyLinesData,
  axes: { readonly across: Omit<ValueAxis, 'values'>; readonly up: Omit<ValueAxis, 'values'> },
  width: number,
): CompanyLinesLayout {
  const { ownCompany } = data;
  const companies = data.companies.filter(isFiniteLine);
  const pooled = data.pooled !== null && isFiniteLine(data.pooled) ? data.pooled : null;
  const points = data.points.filter(({ x, y }) => Number.isFinite(x) && Number.isFinite(y));
  const ownRows = points.filter(({ company }) => company === ownCompany);
  const peerRows = points.length > mostPoints ? [] : points.filter((row) => !ownRows.includes(row));
  const isNamed = companies.length <= mostNamed && width >= 480;
  const longestName = max(companies, ({ company }) => wordsWidth(company)) ?? 0;
  const ends = [...companies, ...(pooled === null ? [] : [pooled])].flatMap(({ from, to }) => [
    { x: from[0], y: from[1] },
    { x: to[0], y: to[1] },
  ]);
  const seen = [...ends, ...ownRows, ...peerRows];
  const { x, y, height, plot, ...axisMarks } = valuePlot(
    { ...axes.across, values: seen.map((point) => point.x) },
    { ...axes.up, values: seen.map((point) => point.y) },
    { width, right: isNamed ? Math.min(longestName + 18, width * 0.2) : 20 },
  );
  const placed = ([across, up]: readonly [number, number]): Point => ({ x: x(across), y: y(up) });

  const lines = companies
    .map((line) => ({
      company: line.company,
      isOwn: line.company === ownCompany,
      from: placed(line.from),
      to: placed(line.to),
    }))
    .map((line) => ({ ...line, path: pathOf(line) }))
    .sort((a, b) => ascending(a.to.y, b.to.y));
  const own = lines.find(({ isOwn }) => isOwn);
  const peers = lines.filter(({ isOwn }) => !isOwn);
  const pooledLine = pooled === null ? null : { from: placed(pooled.from), to: placed(pooled.to) };

  const crowd = isNamed || pooledLine !== null ? crowdOf(lines.slice(0, mostPointable)) : [];
  const pooledLabel = pooledLine === null ? null : pooledText(pooledLine, plot, crowd);
  const alongPooled = pooledLine === null ? [] : alongLine([pooledLine.from, pooledLine.to]);
  const within: Plot = { left: plot.left, right: width, top: plot.top - 10, bottom: plot.bottom };
  const byRoom = own === undefined ? peers : [own, ...peers];
  const names = roomForNames(
    (isNamed ? byRoom : byRoom.slice(0, own === undefined ? 0 : 1)).map(({ company, to }) => ({
      text: company,
      at: to,
    })),
    {
      within,
      taken: pooledLabel === null ? [] : [boxOf(pooledLabel)],
      crowd: [...crowd, ...alongPooled],
      mostCovered: 3,
    },
  );
  const named = new Map(byRoom.map(({ company }, place) => [company, names[place] ?? null]));
  // The own company is always named, over other marks if it has to be.
  const ownName =
    own === undefined ? null : (named.get(own.company) ?? besideEnd(own, plot, width));
  const pointable = peers.slice(0, mostPointable - (own === undefined ? 0 : 1));

  return {
    width,
    height,
    plot,
    ...axisMarks,
    peerLines: peers.map(({ path }) => path).join(''),
    ownLine: own?.path ?? '',
    pooled:
      pooledLine === null || pooledLabel === null
        ? null
        : { path: pathOf(pooledLine), label: pooledLabel },
    peerPoints: peerRows.map((row) => placed([row.x, row.y])),
    ownPoints: ownRows.map((row) => placed([row.x, row.y])),
    ownName,
    peerNames: peers.flatMap(({ company }) => named.get(company) ?? []),
    lines: lines
      .filter((line) => line.isOwn || pointable.includes(line))
      .map((line) => ({
        ...line,
        askedName:
          line.isOwn || (named.get(line.company) ?? null) !== null
            ? null
            : besideEnd(line, plot, width),
      })),
    hiddenPoints: points.length - ownRows.length - peerRows.length,
  };
}

/** A line without length still has a place: round ends make it a dot. */
function pathOf({ from, to }: { readonly from: Point; readonly to: Point }): string {
  const at = (value: number) => Number(value.toFixed(2));
  return `M${at(from.x)},${at(from.y)}L${at(to.x)},${at(to.y)}`;
}

function crowdOf(lines: readonly { readonly from: Point; readonly to: Point }[]): Point[] {
  return lines.flatMap(({ from, to }) => alongLine([from, to]));
}

/** A name at a line's right end, turned inwards where the edge is near. */
function besideEnd(
  { company, to }: { readonly company: string; readonly to: Point },
  plot: Plot,
  width: number,
): PlacedText {
  const isInwards = to.x + 9 + wordsWidth(company) > width;
  return {
    text: company,
    x: isInwards ? Math.min(to.x, plot.right) : to.x + 9,
    y: isInwards ? Math.max(to.y - 9, 12) : to.y + 4,
    anchor: isInwards ? 'end' : 'start',
  };
}

/** Over or under the pooled line, where the fewest company lines run. */
function pooledText(
  { from, to }: { readonly from: Point; readonly to: Point },
  plot: Plot,
  crowd: readonly Point[],
): PlacedText {
  const half = wordsWidth(pooledName) / 2;
  const places = [0.85, 0.15, 0.7, 0.3, 0.5].flatMap((share) => {
    const x = Math.min(
      Math.max(from.x + (to.x - from.x) * share, plot.left + half + 4),
      Math.max(plot.left + half + 4, plot.right - half - 4),
    );
    const slope = to.x === from.x ? 0 : (to.y - from.y) / (to.x - from.x);
    const lineY = from.y + slope * (x - from.x);
    const rise = Math.abs(slope) * half;
    return [lineY - rise - 6, lineY + rise + 14]
      .filter((y) => y - 12 >= plot.top - 12 && y <= plot.bottom - 4)
      .map((y): PlacedText => ({ text: pooledName, x, y, anchor: 'middle' }));
  });
  const fallback: PlacedText = {
    text: pooledName,
    x: plot.left + half + 4,
    y: plot.top + 12,
    anchor: 'middle',
  };
  return leastCrowded(
    (places.length === 0 ? [fallback] : places).map((place) => ({ ...boxOf(place), place })),
    crowd,
  ).place;
}
