import { rowsWithGaps, shorterCompanies, span } from './panel-gaps';
import type { PanelRow } from './panel-rows';
import { counted } from '../ui/phrases';

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
  const gaps = rowsWithGaps(rows, titles);
  const [firstYear, lastYear] = span(rows.map(({ year }) => year));
  return {
    companies: new Set(rows.map(({ company }) => company)).size,
    firstYear,
    lastYear,
    rows: rows.length,
    completeRows: rows.length - gaps.length,
    missingCells: gaps.reduce((sum, { missing }) => sum + missing.length, 0),
    yearsWithoutRow: shorterCompanies(rows).reduce(
      (sum, company) => sum + company.yearsWithoutRow.length,
      0,
    ),
  };
}

/**
 * `14 companies, FY2008–FY2025: 5 cells missing, 3 figures to look at`.
 *
 * @param toLookAt  figures that stand out and nobody found to be right.
 */
export function panelFinding(found: PanelCompleteness, toLookAt: number): string {
  const gaps = [
    ...(found.missingCells === 0 ? [] : [`${counted(found.missingCells, 'cell')} missing`]),
    ...(found.yearsWithoutRow === 0
      ? []
      : [`${counted(found.yearsWithoutRow, 'company year')} without a row`]),
  ];
  const state = gaps.length === 0 ? ['no cell missing'] : gaps;
  const standing = toLookAt === 0 ? [] : [`${counted(toLookAt, 'figure')} to look at`];
  return `${companiesAndYears(found)}: ${[...state, ...standing].join(', ')}`;
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
