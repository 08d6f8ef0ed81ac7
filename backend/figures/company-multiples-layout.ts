import { ascending, max } from 'd3';
import type { PlacedText, Point } from './figure-types';
import { diamondAt } from './mark-paths';
import { clippedWords, figuresWidth, wordsWidth } from './text-width';
import { snugScale } from './value-axis';
import { yearScale } from './year-axis';

/** One variable of one company over time. */
export interface CompanySeries {
  readonly company: string;
  readonly year: number;
  /** In the order of the variables; null where a figure is missing. */
  readonly values: readonly (number | null)[];
  /** Positions of the variables with a value that someone should look at. */
  readonly flagged?: readonly number[];
}

export interface CompanyMultiplesData {
  /** Rows of the companies that are to be drawn. */
  readonly rows: readonly CompanySeries[];
  /** Names with their units: `capex, EUR m`. */
  readonly variables: readonly string[];
  readonly ownCompany: string | null;
  /** First and last year of every line, also where a company has fewer. */
  readonly years: readonly [number, number];
  /** Whether the lines of a variable share their scale; otherwise each has its own. */
  readonly scale: 'common' | 'own';
}

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

export interface MultiplesRow {
  readonly company: string;
  readonly isOwn: boolean;
  readonly name: PlacedText;
  readonly top: number;
  readonly lines: readonly MultiplesLine[];
}

export interface CompanyMultiplesLayout {
  readonly width: number;
  readonly height: number;
  readonly rowHeight: number;
  /** Names of the variables, above their lines. */
  readonly heads: readonly PlacedText[];
  /** First and last year, above each column of lines. */
  readonly ends: readonly PlacedText[];
  /** Own company first, the others in the order of the alphabet. */
  readonly rows: readonly MultiplesRow[];
}

const lineHeight = 40;
const inset = 9;
const headHeight = 46;
/** Narrower than this the lines of a company stand under its name, one below the other. */
const leastSideBySide = 640;
const labelGap = 8;

/** A line a company and variable, all over the same years, with its first and last figure. */
export function companyMultiplesLayout(
  data: CompanyMultiplesData,
  {
    width,
    value,
  }: { readonly width: number; readonly value: (value: number, variable: number) => string },
): CompanyMultiplesLayout {
  const { variables } = data;
  const companies = seriesByCompany(data);
  const isStacked = width < leastSideBySide || variables.length === 1;
  const columns = isStacked ? 1 : variables.length;
  const longest = max(companies, ({ company }) => wordsWidth(company, 13)) ?? 0;
  const isNameAbove = width < leastSideBySide;
  const nameWidth = isNameAbove ? width - 20 : Math.min(longest + 4, width * 0.2);
  const left = isNameAbove ? 0 : 18 + nameWidth + 12;
  const columnWidth = (width - left) / columns;
  const labelWidth = widestLabel(data, value);
  const rowHeight = isNameAbove
    ? 24 + lineHeight * variables.length
    : lineHeight * (isStacked ? variables.length : 1);
  const head = isNameAbove ? 24 : headHeight;

  const span = (column: number): readonly [number, number] => {
    const start = left + column * columnWidth;
    return [
      start + labelWidth + labelGap + 4,
      Math.max(
        start + labelWidth + labelGap + 24,
        start + columnWidth - labelWidth - labelGap - 12,
      ),
    ];
  };
  const common = variables.map((_, variable) =>
    data.rows.map(({ values }) => values[variable] ?? null),
  );

  return {
    width,
    height: head + companies.length * rowHeight + 4,
    rowHeight,
    heads: isNameAbove
      ? []
      : variables.map((text, variable) => ({
          text: clippedWords(text, columnWidth - 12),
          x: span(isStacked ? 0 : variable)[0],
          y: 16,
          anchor: 'start',
        })),
    ends: Array.from({ length: columns }, (_, column) => {
      const [from, to] = span(column);
      const y = head - 8;
      return [
        { text: String(data.years[0]), x: from, y, anchor: 'start' as const },
        { text: String(data.years[1]), x: to, y, anchor: 'end' as const },
      ];
    }).flat(),
    rows: companies.map(({ company, ofYear }, place) => {
      const top = head + place * rowHeight;
      const isOwn = company === data.ownCompany;
      return {
        company,
        isOwn,
        name: {
          text: clippedWords(company, nameWidth, 13),
          x: 18,
          y: top + (isNameAbove ? 16 : lineHeight / 2 + 4),
          anchor: 'start',
        },
        top,
        lines: variables.map((_, variable) => {
          const [from, to] = span(isStacked ? 0 : variable);
          const above = (isNameAbove ? 24 : 0) + (isStacked ? variable * lineHeight : 0);
          const values = data.scale === 'common' ? common[variable] : valuesOf(ofYear, variable);
          return placedLine(
            { variable, years: data.years, ofYear, isOwn },
            {
              x: yearScale([...data.years], [from, to]),
              y: snugScale(values, [top + above + lineHeight - inset, top + above + inset]),
              middle: top + above + lineHeight / 2,
              from,
              to,
              value,
            },
          );
        }),
      };
    }),
  };
}

type YearRows = ReadonlyMap<number, CompanySeries>;

function seriesByCompany({ rows, ownCompany }: CompanyMultiplesData) {
  const byCompany = new Map<string, Map<number, CompanySeries>>();
  for (const row of rows) {
    const known = byCompany.get(row.company);
    if (known === undefined) byCompany.set(row.company, new Map([[row.year, row]]));
    else known.set(row.year, row);
  }
  return [...byCompany]
    .map(([company, ofYear]) => ({ company, ofYear }))
    .sort(
      (a, b) =>
        Number(b.company === ownCompany) - Number(a.company === ownCompany) ||
        a.company.localeCompare(b.company, 'en'),
    );
}

function valuesOf(ofYear: YearRows, variable: number): (number | null)[] {
  return [...ofYear.values()].map(({ values }) => values[variable] ?? null);
}

function widestLabel(
  { rows, variables }: CompanyMultiplesData,
  value: (value: number, variable: number) => string,
): number {
  let widest = 0;
  for (const row of rows)
    for (let variable = 0; variable < variables.length; variable++) {
      const figure = row.values[variable];
      if (figure !== null) widest = Math.max(widest, figuresWidth(value(figure, variable)));
    }
  return widest;
}

interface LinePlace {
  readonly x: (year: number) => number;
  readonly y: (value: number) => number;
  readonly middle: number;
  readonly from: number;
  readonly to: number;
  readonly value: (value: number, variable: number) => string;
}

function placedLine(
  line: {
    readonly variable: number;
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
