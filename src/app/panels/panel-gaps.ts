import { type PanelRow, missingIn } from './panel-rows';

/** A row that lacks a figure. */
export interface RowWithGap {
  readonly company: string;
  readonly year: number;
  readonly fileRow: number;
  /** The columns without a value, by title. */
  readonly missing: readonly string[];
}

/** A company that has no row in some year of the panel's span. */
export interface ShorterCompany {
  readonly company: string;
  readonly firstYear: number;
  readonly lastYear: number;
  /** Years without a row between its first and its last. */
  readonly yearsWithoutRow: readonly number[];
}

/** Every row that lacks a figure, in the order of the rows. */
export function rowsWithGaps(
  rows: readonly PanelRow[],
  titles: readonly string[],
): readonly RowWithGap[] {
  const found: RowWithGap[] = [];
  for (const row of rows) {
    const missing = missingIn(row, titles);
    if (missing.length === 0) continue;
    const { company, year, fileRow } = row;
    found.push({ company, year, fileRow, missing });
  }
  return found;
}

/** Every company that enters late, leaves early or skips a year. */
export function shorterCompanies(rows: readonly PanelRow[]): readonly ShorterCompany[] {
  const yearsOf = new Map<string, Set<number>>();
  const allYears = new Set<number>();
  for (const { company, year } of rows) {
    allYears.add(year);
    const years = yearsOf.get(company);
    if (years === undefined) yearsOf.set(company, new Set([year]));
    else years.add(year);
  }
  const [first, last] = span(allYears);
  return [...yearsOf].flatMap(([company, years]) => {
    const [firstYear, lastYear] = span(years);
    const yearsWithoutRow = between(firstYear, lastYear).filter((year) => !years.has(year));
    const isWhole = firstYear === first && lastYear === last && yearsWithoutRow.length === 0;
    return isWhole ? [] : [{ company, firstYear, lastYear, yearsWithoutRow }];
  });
}

/** The first and the last of some years; infinite where there are none. */
export function span(years: Iterable<number>): readonly [number, number] {
  let first = Infinity;
  let last = -Infinity;
  for (const year of years) {
    first = Math.min(first, year);
    last = Math.max(last, year);
  }
  return [first, last];
}

function between(first: number, last: number): readonly number[] {
  return Array.from({ length: last - first + 1 }, (_, step) => first + step);
}
