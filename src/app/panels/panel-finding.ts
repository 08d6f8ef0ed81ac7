import { type PanelRow, missingIn } from './panel-rows';

/** How complete a panel is. */
export interface PanelCompleteness {
  readonly companies: number;
  readonly firstYear: number;
  readonly lastYear: number;
  readonly rows: number;
  readonly completeRows: number;
  readonly missingCells: number;
  /** Years without a row between a company's first and last one: a late entry or an early exit is none. */
  readonly yearsWithoutRow: number;
}

/** Counts over all columns of the panel, further ones included. */
export function panelCompleteness(
  rows: readonly PanelRow[],
  titles: readonly string[],
): PanelCompleteness {
  const yearsOf = new Map<string, Set<number>>();
  let missingCells = 0;
  let completeRows = 0;
  for (const row of rows) {
    const missing = missingIn(row, titles).length;
    missingCells += missing;
    if (missing === 0) completeRows += 1;
    const years = yearsOf.get(row.company) ?? new Set<number>();
    yearsOf.set(row.company, years.add(row.year));
  }
  let yearsWithoutRow = 0;
  for (const years of yearsOf.values()) {
    const [first, last] = span(years);
    yearsWithoutRow += last - first + 1 - years.size;
  }
  const [firstYear, lastYear] = span(rows.map(({ year }) => year));
  return {
    companies: yearsOf.size,
    firstYear,
    lastYear,
    rows: rows.length,
    completeRows,
    missingCells,
    yearsWithoutRow,
  };
}

/** `14 companies, FY2008–FY2025: 5 cells missing`. */
export function panelFinding(found: PanelCompleteness): string {
  const gaps = [
    ...(found.missingCells === 0 ? [] : [`${counted(found.missingCells, 'cell')} missing`]),
    ...(found.yearsWithoutRow === 0
      ? []
      : [`${counted(found.yearsWithoutRow, 'company year')} without a row`]),
  ];
  const state = gaps.length === 0 ? 'no cell missing' : gaps.join(', ');
  return `${companiesAndYears(found)}: ${state}`;
}

/** `14 companies, FY2008–FY2025`. */
export function companiesAndYears(found: {
  readonly companies: number;
  readonly firstYear: number;
  readonly lastYear: number;
}): string {
  return `${counted(found.companies, 'company', 'companies')}, ${yearSpan(found.firstYear, found.lastYear)}`;
}

/** `FY2008–FY2025`, or `FY2008` where there is one year. */
export function yearSpan(first: number, last: number): string {
  return first === last ? `FY${first}` : `FY${first}–FY${last}`;
}

/** `1 cell`, `5 cells`, `1,200 cells`. */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${count.toLocaleString('en')} ${count === 1 ? one : many}`;
}

function span(years: Iterable<number>): readonly [number, number] {
  let first = Infinity;
  let last = -Infinity;
  for (const year of years) {
    first = Math.min(first, year);
    last = Math.max(last, year);
  }
  return [first, last];
}
