import type { PanelBlockRows } from '../../db/repositories/panel-rows-repository';
import type { PanelVersionRow } from '../../db/repositories/panels-repository';
import { type CompanyMeasures, companyMeasures } from '../panel-data';

/** A company of a panel version with what the choice of peers needs; the last present values in the panel's unit. */
export interface CompanySummary {
  readonly name: string;
  readonly rows: number;
  readonly completeRows: number;
  readonly firstYear: number;
  readonly lastYear: number;
  readonly marketValue: number | null;
  readonly capex: number | null;
  readonly bookEquity: number | null;
  /** The texts that describe it, by header of the file. */
  readonly attributes: Readonly<Record<string, string>>;
  readonly measures: Omit<CompanyMeasures, 'company'>;
}

/** The model's three columns come first in a panel's cells. */
const modelColumns = [0, 1, 2] as const;

/**
 * One summary a company, in the order of `rows.companies`.
 *
 * @param rows  in order of company and year, as they are read from the database.
 */
export function companySummaries(
  version: Pick<PanelVersionRow, 'columns'>,
  rows: PanelBlockRows,
  attributes: ReadonlyMap<string, CompanySummary['attributes']>,
): readonly CompanySummary[] {
  const measures = companyMeasures({ ...rows, columns: version.columns });
  let start = 0;
  return rows.companies.map((name, code) => {
    let end = start;
    while (end < rows.company.length && rows.company[end] === code) end++;
    const { company: _, ...measured } = measures[code];
    const described = attributes.get(name) ?? {};
    const summary = { ...summarise(name, rows, start, end), attributes: described };
    start = end;
    return { ...summary, measures: measured };
  });
}

function summarise(
  name: string,
  { year, values }: PanelBlockRows,
  start: number,
  end: number,
): Omit<CompanySummary, 'attributes' | 'measures'> {
  const last = (column: number): number | null => {
    for (let row = end - 1; row >= start; row--)
      if (!Number.isNaN(values[column][row])) return values[column][row];
    return null;
  };
  let completeRows = 0;
  for (let row = start; row < end; row++)
    if (modelColumns.every((column) => !Number.isNaN(values[column][row]))) completeRows++;
  return {
    name,
    rows: end - start,
    completeRows,
    firstYear: year[start],
    lastYear: year[end - 1],
    marketValue: last(0),
    capex: last(1),
    bookEquity: last(2),
  };
}
