import type { PanelRow } from '../panel-rows';

/** The rows with other figures than before; null where not the same lines, companies and years stand in the same order. */
export function changedRows(
  before: readonly PanelRow[],
  now: readonly PanelRow[],
): readonly PanelRow[] | null {
  if (before.length !== now.length) return null;
  const changed: PanelRow[] = [];
  for (let at = 0; at < now.length; at++) {
    const [was, is] = [before[at], now[at]];
    if (was === is) continue;
    if (was.company !== is.company || was.year !== is.year || was.fileRow !== is.fileRow)
      return null;
    if (!areSame(was.values, is.values)) changed.push(is);
  }
  return changed;
}

function areSame(before: readonly unknown[], now: readonly unknown[]): boolean {
  return before.length === now.length && before.every((value, at) => Object.is(value, now[at]));
}
