import { group, max } from 'd3';
import type { PlacedTick } from './figure-types';
import { clippedWords, wordsWidth } from './text-width';

/** A row of the panel, by what it lacks. A company and year without a row lack everything. */
export interface CoverageCell {
  readonly company: string;
  readonly year: number;
  /** Names of the variables without a value. */
  readonly missing: readonly string[];
  /** Names of the variables with a value that someone should look at, and of what else is so in the row. */
  readonly flagged?: readonly string[];
}

/** Consecutive years in which all of some companies have every figure. */
export interface CoverageFrame {
  readonly firstYear: number;
  readonly lastYear: number;
  readonly companies: readonly string[];
}

export interface CoverageData {
  readonly cells: readonly CoverageCell[];
  /** Every variable that is wanted. */
  readonly variables: readonly string[];
  /** Only this variable counts; null counts all. */
  readonly variable: string | null;
  readonly ownCompany: string | null;
  /** Drawn as an outline. */
  readonly frame?: CoverageFrame | null;
}

export type CoverageState = 'complete' | 'some' | 'none';

export interface PlacedCoverageCell {
  readonly year: number;
  readonly x: number;
  readonly state: CoverageState;
  readonly missing: readonly string[];
  readonly flagged: readonly string[];
}

export interface CoverageRow {
  readonly company: string;
  readonly name: string;
  readonly isOwn: boolean;
  readonly y: number;
  readonly cells: readonly PlacedCoverageCell[];
}

export interface CoverageMapLayout {
  readonly width: number;
  readonly height: number;
  readonly cellWidth: number;
  readonly cellHeight: number;
  readonly markSize: number;
  readonly nameX: number;
  readonly left: number;
  readonly top: number;
  readonly years: readonly PlacedTick[];
  /** Own company first, the others in the order of the alphabet. */
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
const yearLabel = 40;
const headHeight = 28;

function stateOf({ missing }: Pick<CoverageCell, 'missing'>, wanted: number): CoverageState {
  if (missing.length === 0) return 'complete';
  return missing.length >= wanted ? 'none' : 'some';
}

/** What is flagged that counts: of one variable alone where one is looked at. */
function flaggedOf(cell: CoverageCell | undefined, variable: string | null): readonly string[] {
  const flagged = cell?.flagged ?? [];
  return variable === null ? flagged : flagged.filter((name) => name === variable);
}

/** One row a company, one column a year of the whole span, and whether the values are there. */
export function coverageMapLayout(data: CoverageData, width: number): CoverageMapLayout {
  const wanted =
    data.variable === null
      ? data.variables
      : data.variables.filter((variable) => variable === data.variable);
  const byCompany = group(data.cells, (cell) => cell.company);
  const companies = [...byCompany.keys()].sort(
    (a, b) =>
      Number(b === data.ownCompany) - Number(a === data.ownCompany) || a.localeCompare(b, 'en'),
  );
  const seen = data.cells.map((cell) => cell.year);
  const first = seen.reduce((least, year) => Math.min(least, year), Infinity);
  const last = seen.reduce((most, year) => Math.max(most, year), -Infinity);
  const years =
    seen.length === 0 ? [] : Array.from({ length: last - first + 1 }, (_, k) => first + k);

  const longest = max(companies, (company) => wordsWidth(company, 13)) ?? 0;
  const nameWidth = Math.min(longest, Math.max(84, width * 0.24));
  const left = 18 + nameWidth + 10;
  const room = (width - left - 8) / Math.max(1, years.length);
  const cellWidth = Math.floor(Math.min(mostCell, Math.max(leastCell, room)));
  const rowHeight = Math.min(cellWidth, 24);
  const step = Math.max(1, Math.ceil(yearLabel / cellWidth));
  const placeOf = (year: number) => left + (year - first + 0.5) * cellWidth;

  return {
    width: Math.max(left + years.length * cellWidth + 14, Math.min(width, left + 60)),
    height: headHeight + companies.length * rowHeight + 6,
    cellWidth,
    cellHeight: rowHeight,
    markSize: rowHeight - 8,
    nameX: 18,
    left,
    top: headHeight,
    years: years
      .filter((year) => (last - year) % step === 0)
      .map((year) => ({ value: year, position: placeOf(year), label: String(year) })),
    rows: companies.map((company, place) => {
      const ofYear = new Map(byCompany.get(company)?.map((cell) => [cell.year, cell]));
      return {
        company,
        name: clippedWords(company, nameWidth + 2, 13),
        isOwn: company === data.ownCompany,
        y: headHeight + (place + 0.5) * rowHeight,
        cells: years.map((year) => {
          const cell = ofYear.get(year);
          const missing = wanted.filter((name) => cell?.missing.includes(name) ?? true);
          return {
            year,
            x: placeOf(year),
            state: stateOf({ missing }, wanted.length),
            missing,
            flagged: flaggedOf(cell, data.variable),
          };
        }),
      };
    }),
    frame: frameBoxes(data.frame ?? null, companies, { first, left, cellWidth, rowHeight }),
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
