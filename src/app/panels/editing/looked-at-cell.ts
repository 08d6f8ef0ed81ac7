import type { PanelColumn } from '@contract';
import { type GridSelection, sizeOf } from './grid-selection';
import { type PanelEdits, type SavedRows, cellKey, rowKey } from './panel-edits';

/** A cell that is looked at. */
export interface LookedAtCell {
  readonly company: string;
  readonly year: number;
  /** Line of the file; 0 for a row that was added by hand. */
  readonly fileRow: number;
  /** Null at company, year and line. */
  readonly figure: {
    readonly column: PanelColumn;
    readonly value: number | null;
    /** What the version holds, where that is something else; undefined where nothing is changed. */
    readonly before: number | null | undefined;
  } | null;
  readonly flags: readonly string[];
  /** `3 × 4 cells selected`; empty for one cell. */
  readonly size: string;
}

/** @param flags  of the cell, in words. @returns null where the row is not in the panel any more. */
export function lookedAtCell(
  at: GridSelection,
  { cells, added }: PanelEdits,
  saved: SavedRows,
  columns: readonly PanelColumn[],
  flags: readonly string[],
): LookedAtCell | null {
  const { company, year, column } = at;
  const key = rowKey(at);
  const row = saved.get(key);
  if (row === undefined && !added.has(key)) return null;
  const base = { company, year, fileRow: row?.fileRow ?? 0, size: sizeOf(at) };
  if (column === undefined) return { ...base, figure: null, flags: [] };
  const before = row?.values[column] ?? null;
  const edit = cells.get(cellKey({ company, year, column }));
  return {
    ...base,
    figure: {
      column: columns[column],
      value: edit === undefined ? before : edit.value,
      before: edit === undefined ? undefined : before,
    },
    flags,
  };
}
