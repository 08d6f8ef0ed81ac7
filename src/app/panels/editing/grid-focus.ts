import type { GridApi } from 'ag-grid-community';
import { leadingColumns } from '../grid-places';
import type { PanelRow } from '../panel-rows';
import { type RowFocus, isAsked } from '../row-focus';
import type { GridPlace } from './cell-block';
import { rowKey } from './panel-edits';

/**
 * Brings a row into view.
 *
 * @returns the cell that is asked for; null where its row is not there.
 */
export function broughtUp(
  api: GridApi<PanelRow>,
  rows: readonly PanelRow[],
  focus: RowFocus,
): GridPlace | null {
  const asked = rows.find((row) => isAsked(row, focus));
  const node = asked === undefined ? undefined : api.getRowNode(rowKey(asked));
  if (node === undefined) return null;
  // A filter of the grid may hide the row that is asked for: then the filters give way.
  if (node.rowIndex === null) api.setFilterModel(null);
  if (node.rowIndex === null) return null;
  api.redrawRows();
  api.ensureNodeVisible(node, 'middle');
  const { column } = focus;
  return { row: node.rowIndex, column: column === undefined ? 0 : leadingColumns + column };
}

/** Runs what may take the focus into the grid; where it was elsewhere on the page, it goes back there. */
export function sparingFocus(host: HTMLElement, run: () => void): void {
  const before = host.ownerDocument.activeElement;
  run();
  const wasElsewhere = before !== host.ownerDocument.body && !host.contains(before);
  if (wasElsewhere && before instanceof HTMLElement) before.focus({ preventScroll: true });
}
