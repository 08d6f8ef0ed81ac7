import { rowsByCompany } from './company-rows';
import type { PanelCells } from './panel-cells';

/** Consecutive years in which all of some companies have every figure. */
export interface CoverageWindow {
  readonly firstYear: number;
  readonly lastYear: number;
  /** By name. */
  readonly companies: readonly string[];
  /** Companies times years. */
  readonly rows: number;
}

/** Fewer years than this are no panel to estimate from: standing and intervals need six (STATISTICS §3). */
const fewestYears = 6;
const fewestCompanies = 2;

/**
 * The window of consecutive years with the most rows of companies that have every figure of the named columns in every
 * one of its years; of two with equally many, the one with more years, then the later one.
 *
 * @param columns  positions of the columns that count.
 * @param ownCompany  belongs to the window wherever one can be had with it.
 * @returns null where no window has 6 years of 2 companies.
 */
export function largestWindow(
  panel: PanelCells,
  columns: readonly number[],
  ownCompany: string | null = null,
): CoverageWindow | null {
  const complete = completeYears(panel, columns);
  const own = ownCompany === null ? -1 : panel.companies.indexOf(ownCompany);
  return (own === -1 ? null : largest(panel, complete, own)) ?? largest(panel, complete, -1);
}

interface CompleteYears {
  readonly firstYear: number;
  readonly lastYear: number;
  /** runs[company][year − firstYear]: for how many years up to this one every figure is there. */
  readonly runs: readonly Int32Array[];
}

function completeYears(panel: PanelCells, columns: readonly number[]): CompleteYears {
  let firstYear = Infinity;
  let lastYear = -Infinity;
  for (let row = 0; row < panel.year.length; row++) {
    firstYear = Math.min(firstYear, panel.year[row]);
    lastYear = Math.max(lastYear, panel.year[row]);
  }
  const width = Math.max(0, lastYear - firstYear + 1);
  const runs = rowsByCompany(panel).map((rows) => {
    const run = new Int32Array(width);
    for (const row of rows) {
      if (columns.some((column) => Number.isNaN(panel.values[column][row]))) continue;
      const place = panel.year[row] - firstYear;
      run[place] = (place === 0 ? 0 : run[place - 1]) + 1;
    }
    return run;
  });
  return { firstYear, lastYear, runs };
}

/** @param own  the company that has to be in; −1 for none. */
function largest(
  panel: PanelCells,
  { firstYear, lastYear, runs }: CompleteYears,
  own: number,
): CoverageWindow | null {
  let best: { readonly end: number; readonly years: number; readonly count: number } | null = null;
  for (let end = 0; end <= lastYear - firstYear; end++) {
    const longest = runs.map((run) => run[end]).sort((left, right) => right - left);
    const most = own === -1 ? Infinity : runs[own][end];
    let tried = 0;
    for (let count = fewestCompanies; count <= longest.length; count++) {
      const years = Math.min(longest[count - 1], most);
      if (years < fewestYears) break;
      // As many years as before are the same window: of thousands of companies it is looked at once.
      if (years === tried) continue;
      tried = years;
      // Where the own company's run is the shorter one, more companies fit into the same years.
      const fitting = longest.filter((run) => run >= years).length;
      const size = years * fitting;
      const bestSize = best === null ? 0 : best.years * best.count;
      const isBetter =
        best === null || size > bestSize || (size === bestSize && years >= best.years);
      if (isBetter) best = { end, years, count: fitting };
    }
  }
  if (best === null) return null;
  const { end, years } = best;
  const companies = panel.companies.filter((_, code) => runs[code][end] >= years);
  return {
    firstYear: firstYear + end - years + 1,
    lastYear: firstYear + end,
    companies: [...companies].sort((left, right) => left.localeCompare(right, 'en')),
    rows: years * companies.length,
  };
}
