import type { PanelRow } from '../panel-rows';

/** The rows with other figures than before; null where it is not the same companies and years in the same order. */
export function changedRows(
  before: readonly PanelRow[],
  now: readonly PanelRow[],
): readonly PanelRow[] | null {
  if (before.length !== now.length) return null;
  const changed: PanelRow[] = [];
  for (let at = 0; at < now.length; at++) {
    const [was, is] = [before[at], now[at]];
    if (was === is) continue;
    if (was.company !== is.company || was.year !== is.year) return null;
    changed.push(is);
  }
  return changed;
}
