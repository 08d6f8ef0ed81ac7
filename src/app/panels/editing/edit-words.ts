import { counted, listed } from '../../ui/phrases';
import type { PanelEdits } from './panel-edits';

/** `12 cells and 1 row`. */
export function editsWords({ cells, added, removed }: PanelEdits): string {
  return partsWords(cells.size, added.size + removed.size);
}

/** `12 cells and 1 row`; empty for none of either. */
export function partsWords(cells: number, rows: number): string {
  return listed([
    ...(cells === 0 ? [] : [counted(cells, 'cell')]),
    ...(rows === 0 ? [] : [counted(rows, 'row')]),
  ]);
}
