import type { PanelColumn } from './panel-cells';

/** A column of two panels; a position is null in a panel that does not have it. */
export interface MatchedColumn {
  /** As the later panel has it, or the earlier one where the later has it no more. */
  readonly column: PanelColumn;
  readonly before: number | null;
  readonly after: number | null;
}

/**
 * The columns of two panels: those of the model by what they are to it, whatever their headers, further ones by header.
 * Those of the later panel first, in its order.
 */
export function matchedColumns(
  before: readonly PanelColumn[],
  after: readonly PanelColumn[],
): readonly MatchedColumn[] {
  const shared = after.map((column, place) => {
    const found = before.findIndex((other) => isSameColumn(other, column));
    return { column, before: found === -1 ? null : found, after: place };
  });
  const gone = before.flatMap((column, place) =>
    after.some((other) => isSameColumn(other, column))
      ? []
      : [{ column, before: place, after: null }],
  );
  return [...shared, ...gone];
}

export function isSameColumn(one: PanelColumn, other: PanelColumn): boolean {
  return one.role === other.role && (one.role !== 'other' || one.name === other.name);
}
