import type { CoverageWindow } from '@panel-data';
import { type PanelEdits, rowKey } from './editing/panel-edits';
import type { PanelRow } from './panel-rows';
import { type RowFocus, isAsked } from './row-focus';

export interface RowsToKeep {
  readonly edits: PanelEdits;
  /** The row that is asked for. */
  readonly asked: RowFocus | null;
}

/**
 * The rows of a window's companies and years; all where there is none. A row with an edit stays, and one that is asked
 * for.
 */
export function rowsWithin(
  rows: readonly PanelRow[],
  window: CoverageWindow | null,
  { edits, asked }: RowsToKeep,
): readonly PanelRow[] {
  if (window === null) return rows;
  const isWithin = withinWindow(window);
  const kept = new Set([
    ...edits.added.keys(),
    ...[...edits.cells.values()].map(({ place }) => rowKey(place)),
  ]);
  return rows.filter((row) => isWithin(row) || kept.has(rowKey(row)) || isAsked(row, asked));
}

/** Tells whether a row is of the window's companies and years. */
export function withinWindow({
  companies,
  firstYear,
  lastYear,
}: CoverageWindow): (row: Pick<PanelRow, 'company' | 'year'>) => boolean {
  const names = new Set(companies);
  return ({ company, year }) => year >= firstYear && year <= lastYear && names.has(company);
}
