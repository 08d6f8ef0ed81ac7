import type { PanelRow } from '../panel-rows';
import { changedRows } from './changed-rows';

/** What a grid was given as its rows, and the ones whose figures changed since, to be handed over one by one. */
export interface GivenRows {
  readonly rowData: PanelRow[];
  readonly changed: readonly PanelRow[];
}

/**
 * Comparing 200,000 rows by their ids at each change of a cell would be felt, so the grid keeps what it was given as
 * long as the same rows stand in the same order. A row that changes keeps its place, also where the grid is sorted by it.
 */
export function givenRows(
  rows: readonly PanelRow[],
  previous: { readonly source: readonly PanelRow[]; readonly value: GivenRows } | undefined,
): GivenRows {
  const changed = previous === undefined ? null : changedRows(previous.source, rows);
  return previous === undefined || changed === null
    ? { rowData: [...rows], changed: [] }
    : { rowData: previous.value.rowData, changed };
}
