import type { Params } from '@angular/router';
import type { FitResult, Lag } from '@contract';
import { lagText, listed, yearsText } from '../ui/phrases';

/** A row of the panel that a fit went without. */
export interface DroppedRow {
  /** `Kesdrin FY2016`. */
  readonly name: string;
  /** Where the panel shows it. */
  readonly address: Params;
  /** `capex and book equity of the year before`. */
  readonly missing: string;
}

type Cell = FitResult['sample']['dropped'][number];

/**
 * The company-years that dropped out, each with all that it lacks. Results stored before cells named their company and
 * year give the line of the file in their place.
 *
 * @param outcome  column of the market value, which no lag moves.
 */
export function droppedRows(cells: readonly Cell[], outcome: string, lag: Lag): DroppedRow[] {
  const byRow = new Map<string, Cell[]>();
  for (const cell of cells) {
    const { name } = placeOf(cell);
    const ofRow = byRow.get(name);
    if (ofRow === undefined) byRow.set(name, [cell]);
    else ofRow.push(cell);
  }
  return [...byRow.values()].map((ofRow) => ({
    ...placeOf(ofRow[0]),
    missing: listed(
      ofRow.map(({ column }) => `${column}${column === outcome ? '' : lagText(lag)}`),
    ),
  }));
}

function placeOf({ company, year, row }: Cell): Pick<DroppedRow, 'name' | 'address'> {
  return company === undefined || year === undefined
    ? { name: `Row ${row}`, address: { row } }
    : { name: `${company} ${yearsText(year, year)}`, address: { company, year } };
}
