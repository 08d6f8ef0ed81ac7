import type { CoverageWindow } from '@panel-data';
import { listed, yearsText } from '../../ui/phrases';
import type { PanelRow } from '../panel-rows';

/** A company that is not in a window, and what it lacks there. */
export interface LeftOut {
  readonly company: string;
  readonly why: string;
}

/**
 * The companies that a fully covered window leaves out, each with the years of the window that it lacks.
 *
 * @param columns  positions of the columns that the window covers.
 */
export function leftOut(
  window: CoverageWindow,
  rows: readonly PanelRow[],
  columns: readonly number[],
): readonly LeftOut[] {
  const within = new Set(window.companies);
  const complete = new Map<string, Set<number>>();
  const present = new Map<string, Set<number>>();
  for (const { company, year, values } of rows) {
    if (within.has(company)) continue;
    addTo(present, company, year);
    if (columns.every((column) => values[column] !== null)) addTo(complete, company, year);
  }
  return [...present].map(([company, years]) => {
    const lacking = yearsOf(window).filter((year) => complete.get(company)?.has(year) !== true);
    const withoutRow = lacking.filter((year) => !years.has(year));
    const withGap = lacking.filter((year) => years.has(year));
    return {
      company,
      why: listed([
        ...(withoutRow.length === 0 ? [] : [`no row in ${spans(withoutRow)}`]),
        ...(withGap.length === 0 ? [] : [`a figure missing in ${spans(withGap)}`]),
      ]),
    };
  });
}

function addTo(years: Map<string, Set<number>>, company: string, year: number): void {
  years.set(company, (years.get(company) ?? new Set<number>()).add(year));
}

function yearsOf({ firstYear, lastYear }: CoverageWindow): readonly number[] {
  return Array.from({ length: lastYear - firstYear + 1 }, (_, step) => firstYear + step);
}

/** `FY2009–FY2011 and FY2015`. */
function spans(years: readonly number[]): string {
  const runs: [number, number][] = [];
  for (const year of years) {
    const last = runs.at(-1);
    if (last?.[1] === year - 1) last[1] = year;
    else runs.push([year, year]);
  }
  return listed(runs.map(([first, last]) => yearsText(first, last)));
}
