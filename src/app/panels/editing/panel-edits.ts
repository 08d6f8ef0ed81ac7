import type { SaveCorrections } from '@contract';
import type { PanelRow } from '../panel-rows';

/** A cell by the row's company and year and the position of its column. */
export interface CellPlace {
  readonly company: string;
  readonly year: number;
  readonly column: number;
}

/** A cell with the value that it gets; null makes it missing. */
export interface CellChange {
  readonly place: CellPlace;
  readonly value: number | null;
}

export interface RowPlace {
  readonly company: string;
  readonly year: number;
}

/** What differs from the panel version that is being mended; nothing of it is saved. */
export interface PanelEdits {
  /** By cell key. */
  readonly cells: ReadonlyMap<string, CellChange>;
  /** Rows that the version does not have, by row key. */
  readonly added: ReadonlyMap<string, RowPlace>;
  readonly removed: ReadonlyMap<string, RowPlace>;
}

export const noEdits: PanelEdits = { cells: new Map(), added: new Map(), removed: new Map() };

export function rowKey({ company, year }: RowPlace): string {
  return `${year}\u0000${company}`;
}

export function cellKey(place: CellPlace): string {
  return `${place.column}\u0000${rowKey(place)}`;
}

/** The rows of a version by key, to tell what an edit changes. */
export type SavedRows = ReadonlyMap<string, PanelRow>;

export function savedRows(rows: readonly PanelRow[]): SavedRows {
  return new Map(rows.map((row) => [rowKey(row), row]));
}

/**
 * The edits with further cells set. A cell that gets its saved value back is no edit any more; a cell of a row that
 * neither the version nor the edits have is not set.
 */
export function setCells(
  edits: PanelEdits,
  saved: SavedRows,
  changes: readonly CellChange[],
): PanelEdits {
  const cells = new Map(edits.cells);
  for (const { place, value } of changes) {
    const key = rowKey(place);
    const row = saved.get(key);
    if (edits.removed.has(key) || (row === undefined && !edits.added.has(key))) continue;
    const before = row?.values[place.column] ?? null;
    if (Object.is(before, value)) cells.delete(cellKey(place));
    else cells.set(cellKey(place), { place, value });
  }
  return { ...edits, cells };
}

/** @returns the same edits where the row is there already. */
export function addRow(edits: PanelEdits, saved: SavedRows, row: RowPlace): PanelEdits {
  const key = rowKey(row);
  if (edits.removed.has(key)) {
    const removed = new Map(edits.removed);
    removed.delete(key);
    return { ...edits, removed };
  }
  if (saved.has(key) || edits.added.has(key)) return edits;
  return { ...edits, added: new Map(edits.added).set(key, row) };
}

/** Takes rows out; what was typed into them goes with them. */
export function removeRows(
  edits: PanelEdits,
  saved: SavedRows,
  rows: readonly RowPlace[],
): PanelEdits {
  const [cells, added, removed] = [
    new Map(edits.cells),
    new Map(edits.added),
    new Map(edits.removed),
  ];
  const gone = new Set(rows.map(rowKey));
  for (const row of rows) {
    const key = rowKey(row);
    added.delete(key);
    if (saved.has(key)) removed.set(key, row);
  }
  for (const [key, { place }] of cells) if (gone.has(rowKey(place))) cells.delete(key);
  return { cells, added, removed };
}

/** The version's rows as they would be saved, by company and year; a row without edits is the very same object. */
export function editedRows(
  rows: readonly PanelRow[],
  saved: SavedRows,
  columns: number,
  edits: PanelEdits,
): readonly PanelRow[] {
  if (countEdits(edits) === 0) return rows;
  const empty = Array.from({ length: columns }, () => null);
  const values = valuesByRow(edits, saved, empty);
  const added = [...edits.added].map(([key, row]) => ({
    ...row,
    fileRow: 0,
    values: values.get(key) ?? empty,
  }));
  // By object, not by key: a key for each of 200,000 rows is what takes long.
  const changed = new Map<PanelRow, PanelRow | null>();
  for (const key of edits.removed.keys()) {
    const row = saved.get(key);
    if (row !== undefined) changed.set(row, null);
  }
  for (const [key, now] of values) {
    const row = saved.get(key);
    if (row !== undefined) changed.set(row, { ...row, values: now });
  }
  const kept: PanelRow[] = [];
  for (const row of rows) {
    const now = changed.get(row);
    if (now !== null) kept.push(now ?? row);
  }
  if (added.length === 0) return kept;
  return [...kept, ...added].sort((a, b) =>
    a.company < b.company ? -1 : a.company > b.company ? 1 : a.year - b.year,
  );
}

/** All values of each row that has a changed cell, by row key. */
function valuesByRow(
  edits: PanelEdits,
  saved: SavedRows,
  empty: readonly (number | null)[],
): ReadonlyMap<string, readonly (number | null)[]> {
  const values = new Map<string, (number | null)[]>();
  for (const { place, value } of edits.cells.values()) {
    const key = rowKey(place);
    const row = values.get(key) ?? [...(saved.get(key)?.values ?? empty)];
    row[place.column] = value;
    values.set(key, row);
  }
  return values;
}

export function countEdits({ cells, added, removed }: PanelEdits): number {
  return cells.size + added.size + removed.size;
}

/** Why a cell changes and where its value was found. */
export interface EditGround {
  readonly reason: string;
  readonly source: string;
}

/** The edits as they are sent to be saved. @param groundOf  the reason and source of a cell. */
export function toSaveCorrections(
  edits: PanelEdits,
  note: string,
  groundOf: (place: CellPlace) => EditGround,
): SaveCorrections {
  return {
    note: note.trim(),
    cells: [...edits.cells.values()].map(({ place, value }) => ({
      ...place,
      value,
      ...groundOf(place),
    })),
    addedRows: [...edits.added.values()],
    removedRows: [...edits.removed.values()],
  };
}
