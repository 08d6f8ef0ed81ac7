import { counted, listed } from '../../ui/phrases';
import type { PanelEdits } from './panel-edits';

/** `12 cells and 1 row`. */
export function editsWords({ cells, added, removed }: PanelEdits): string {
  const rows = added.size + removed.size;
  return listed([
    ...(cells.size === 0 ? [] : [counted(cells.size, 'cell')]),
    ...(rows === 0 ? [] : [counted(rows, 'row')]),
  ]);
}
