import { ascending, descending } from 'd3';
import type { FigureFormats, PlacedText, PlacedTick, Plot, Stretch } from './figure-types';
import {
  columnHeads,
  heightOfNamedRows,
  nameSize,
  rowColumns,
  ticksBesideHeads,
  ticksFor,
} from './row-columns';
import { clippedWords } from './text-width';
import { placedTicks, snugScale } from './value-axis';

/** The residuals of one company, or of one year. */
export interface ResidualSpread {
  readonly label: string;
  readonly count: number;
  /** Left out where it is 0 by construction, as within a company. */
  readonly mean?: number;
  /** Null where one row has no spread. */
  readonly standardDeviation: number | null;
  /** The one furthest from 0, with its sign. */
  readonly largest: number | null;
}

export interface ResidualGroupsData {
  readonly groups: readonly ResidualSpread[];
  /** Null where groups are years. */
  readonly ownCompany: string | null;
  /** `widest` first, or as `given`: years stay in their order. */
  readonly order: 'widest' | 'given';
  /** How many are drawn, the widest kept; the table holds all. */
  readonly most: number;
}

export interface ResidualGroupRow {
  readonly label: string;
  readonly name: string;
  readonly isOwn: boolean;
  readonly y: number;
  /** Place of the mean. */
  readonly x: number;
  /** From one standard deviation under the mean to one over it. */
  readonly spread: Stretch | null;
  readonly largestX: number | null;
  readonly deviation: string;
  readonly largest: string;
  /** Empty where the group has none of its own. */
  readonly mean: string;
  /** One a column. */
  readonly figures: readonly string[];
}

export interface ResidualGroupsLayout {
  readonly width: number;
  readonly height: number;
  readonly plot: Plot;
  readonly rowHeight: number;
  readonly nameX: number;
  readonly ticks: readonly PlacedTick[];
  readonly zeroX: number;
  readonly heads: readonly PlacedText[];
  /** Right edges of the columns: the mean where groups have one, standard deviation, largest. Null: no room for it. */
  readonly columnX: readonly (number | null)[];
  /** Baseline of the line that says in full what the columns have no room for; null where they have. */
  readonly readoutY: number | null;
  readonly rows: readonly ResidualGroupRow[];
  readonly more: PlacedText | null;
}

const top = 28;

/** The groups that are drawn: the widest, the own company among them whatever its spread. */
export function drawnGroups({
  groups,
  ownCompany,
  order,
  most,
}: ResidualGroupsData): ResidualSpread[] {
  const places = groups.map((_, place) => place);
  const widest = [...places].sort((a, b) =>
    descending(groups[a].standardDeviation ?? -1, groups[b].standardDeviation ?? -1),
  );
  const kept = widest.slice(0, most);
  const own = places.find((place) => groups[place].label === ownCompany);
  if (own !== undefined && !kept.includes(own) && most > 0) kept[kept.length - 1] = own;
  if (order === 'given') kept.sort(ascending);
  return kept.map((place) => groups[place]);
}

/** How far residuals lie from 0: a row a company or year, a line of one standard deviation to each side of the mean. */
export function residualGroupsLayout(
  data: ResidualGroupsData,
  width: number,
  formats: FigureFormats,
): ResidualGroupsLayout {
  const drawn = drawnGroups(data);
  const written = (value: number | null) => (value === null ? 'n/a' : formats.value(value));
  const texts = drawn.map(({ mean, standardDeviation, largest }) => ({
    mean: mean === undefined ? '' : formats.value(mean),
    deviation: written(standardDeviation),
    largest: written(largest),
  }));
  const columns = [
    ...(drawn.some(({ mean }) => mean !== undefined)
      ? [{ label: 'mean', texts: texts.map(({ mean }) => mean) }]
      : []),
    { label: 'st. dev.', texts: texts.map(({ deviation }) => deviation) },
    { label: 'largest', texts: texts.map(({ largest }) => largest) },
  ];
  const places = rowColumns(
    drawn.map(({ label }) => label),
    columns,
    width,
  );
  const { columnX } = places;
  const isCramped = columnX.includes(null);
  const rowHeight = heightOfNamedRows(drawn.length);
  const plot: Plot = {
    left: places.left,
    right: places.right,
    top,
    bottom: top + rowHeight * drawn.length,
  };
  const seen = drawn.flatMap(({ mean = 0, standardDeviation, largest }) => [
    mean,
    largest,
    mean - (standardDeviation ?? 0),
    mean + (standardDeviation ?? 0),
  ]);
  const scale = snugScale([0, ...seen], [plot.left, plot.right], 0.04);
  const heads = columnHeads(columns, places, 16);
  const left = data.groups.length - drawn.length;
  const foot = plot.bottom + (left > 0 ? 28 : 8);
  return {
    width,
    height: foot + (isCramped ? 20 : 0),
    plot,
    rowHeight,
    nameX: places.nameX,
    ticks: ticksBesideHeads(placedTicks(scale, ticksFor(plot), formats.tick), heads),
    zeroX: scale(0),
    heads,
    columnX,
    readoutY: isCramped ? foot + 12 : null,
    rows: drawn.map(({ label, mean = 0, standardDeviation, largest }, place) => ({
      label,
      name: clippedWords(label, places.nameWidth + 2, nameSize),
      isOwn: label === data.ownCompany,
      y: top + rowHeight * (place + 0.5),
      x: scale(mean),
      spread:
        standardDeviation === null
          ? null
          : { from: scale(mean - standardDeviation), to: scale(mean + standardDeviation) },
      largestX: largest === null ? null : scale(largest),
      ...texts[place],
      figures: columns.map((column) => column.texts[place]),
    })),
    more:
      left > 0
        ? { text: `${left} more in the table`, x: plot.left, y: plot.bottom + 18, anchor: 'start' }
        : null,
  };
}
