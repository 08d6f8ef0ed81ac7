import { type CoverageEntry, type CoverageTable, nameSize } from './coverage-map-table';
import type { PlacedTick } from './figure-types';
import { clippedWords } from './text-width';

/** Consecutive years in which all of some companies have every figure. */
export interface CoverageFrame {
  readonly firstYear: number;
  readonly lastYear: number;
  readonly companies: readonly string[];
}

/** Places of companies in the order of the table. */
export interface CoverageSpan {
  readonly first: number;
  /** Not among them. */
  readonly end: number;
}

export interface CoverageMapOptions {
  /** Of the container, CSS pixels. */
  readonly width: number;
  /** Drawn as an outline. */
  readonly frame?: CoverageFrame | null;
  /** Only these companies are drawn, under the years; all without it. */
  readonly shown?: CoverageSpan;
}

export interface PlacedCoverageCell extends CoverageEntry {
  readonly x: number;
}

export interface CoverageRow {
  readonly company: string;
  readonly name: string;
  readonly isOwn: boolean;
  readonly y: number;
  readonly cells: readonly PlacedCoverageCell[];
}

export interface CoverageSpaces {
  readonly width: number;
  /** Before a name is clipped. */
  readonly nameWidth: number;
  /** Where the cells begin. */
  readonly left: number;
  readonly cellWidth: number;
  readonly cellHeight: number;
}

export interface CoverageMapLayout extends CoverageSpaces {
  /** Of what is drawn. */
  readonly height: number;
  /** Of all companies below one another. */
  readonly fullHeight: number;
  readonly markSize: number;
  readonly nameX: number;
  readonly top: number;
  readonly years: readonly PlacedTick[];
  /** What is drawn of the companies. */
  readonly shown: CoverageSpan;
  readonly rows: readonly CoverageRow[];
  /** Around the frame: one outline for each run of its companies that stand together. */
  readonly frame: readonly FrameBox[];
}

export interface FrameBox {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

const leastCell = 18;
const mostCell = 32;
const mostRow = 24;
const yearLabel = 40;
const nameX = 18;
const headHeight = 28;
const footHeight = 6;

/** How much room names and cells get, whichever companies are drawn. */
export function coverageSpaces(
  { longestName, years }: Pick<CoverageTable, 'longestName' | 'years'>,
  width: number,
): CoverageSpaces {
  const nameWidth = Math.min(longestName, Math.max(84, width * 0.24));
  const left = nameX + nameWidth + 10;
  const room = (width - left - 8) / Math.max(1, years.length);
  const cellWidth = Math.floor(Math.min(mostCell, Math.max(leastCell, room)));
  return {
    width: Math.max(left + years.length * cellWidth + 14, Math.min(width, left + 60)),
    nameWidth,
    left,
    cellWidth,
    cellHeight: Math.min(cellWidth, mostRow),
  };
}

/** One row a company, one column a year of the whole span, and whether the values are there. */
export function coverageMapLayout(
  table: CoverageTable,
  { width, frame = null, shown = { first: 0, end: table.companies.length } }: CoverageMapOptions,
): CoverageMapLayout {
  const { companies, ownCompany, years, entriesOf } = table;
  const spaces = coverageSpaces(table, width);
  const { nameWidth, left, cellWidth, cellHeight } = spaces;
  const step = Math.max(1, Math.ceil(yearLabel / cellWidth));
  const [first, last] = [years.at(0) ?? 0, years.at(-1) ?? 0];
  const placeOf = (year: number) => left + (year - first + 0.5) * cellWidth;
  const drawn = companies.slice(shown.first, shown.end);
  const heightOf = (rows: number) => headHeight + rows * cellHeight + footHeight;

  return {
    ...spaces,
    height: heightOf(drawn.length),
    fullHeight: heightOf(companies.length),
    markSize: cellHeight - 8,
    nameX,
    top: headHeight,
    years: years
      .filter((year) => (last - year) % step === 0)
      .map((year) => ({ value: year, position: placeOf(year), label: String(year) })),
    shown: { first: shown.first, end: shown.first + drawn.length },
    rows: drawn.map((company, place) => ({
      company,
      name: clippedWords(company, nameWidth + 2, nameSize),
      isOwn: company === ownCompany,
      y: headHeight + (place + 0.5) * cellHeight,
      cells: entriesOf(shown.first + place).map((entry) => ({ ...entry, x: placeOf(entry.year) })),
    })),
    frame: frameBoxes(frame, drawn, { first, left, cellWidth, rowHeight: cellHeight }),
  };
}

/** The companies stand by name, those of the frame wherever that puts them. */
function frameBoxes(
  frame: CoverageFrame | null,
  companies: readonly string[],
  {
    first,
    left,
    cellWidth,
    rowHeight,
  }: {
    readonly first: number;
    readonly left: number;
    readonly cellWidth: number;
    readonly rowHeight: number;
  },
): readonly FrameBox[] {
  if (frame === null) return [];
  const within = new Set(frame.companies);
  const boxes: FrameBox[] = [];
  companies.forEach((company, place) => {
    if (!within.has(company)) return;
    const last = boxes.at(-1);
    const y = headHeight + place * rowHeight;
    if (last !== undefined && last.y + last.height === y)
      boxes[boxes.length - 1] = { ...last, height: last.height + rowHeight };
    else
      boxes.push({
        x: left + (frame.firstYear - first) * cellWidth,
        y,
        width: (frame.lastYear - frame.firstYear + 1) * cellWidth,
        height: rowHeight,
      });
  });
  return boxes;
}
