import { counted } from '../../ui/phrases';
import type { PanelEdits } from './panel-edits';

/** As many corrections as one version takes. */
const mostCells = 50_000;
const mostRows = 5_000;

/** Why the edits cannot be saved as one version; empty where they can. @param rows  that the version would have. */
export function obstacleTo({ cells, added, removed }: PanelEdits, rows: number): string {
  if (cells.size > mostCells) return `One version takes at most ${counted(mostCells, 'cell')}.`;
  if (Math.max(added.size, removed.size) > mostRows)
    return `One version takes at most ${counted(mostRows, 'row')} added and as many removed.`;
  return rows === 0 ? 'A panel needs at least one row.' : '';
}
